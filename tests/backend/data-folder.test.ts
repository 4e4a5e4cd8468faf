import { homedir } from 'node:os'
import { join, resolve } from 'node:path'
import { expect, test } from 'vitest'
import { dataFolder } from '#backend/data-folder.ts'

const home = homedir()

test.each([
  ['linux', {}, join(home, '.local/share/lagwright')],
  ['linux', { XDG_DATA_HOME: '/data' }, join('/data', 'lagwright')],
  // The XDG base directory specification treats an empty variable as one that is not set.
  ['linux', { XDG_DATA_HOME: '' }, join(home, '.local/share/lagwright')],
  ['darwin', { XDG_DATA_HOME: '/data' }, join(home, 'Library/Application Support/Lagwright')],
  ['win32', { LOCALAPPDATA: '/local' }, join('/local', 'Lagwright')],
  ['win32', {}, join(home, 'AppData/Local/Lagwright')],
  ['linux', { LAGWRIGHT_DATA: '/mine', XDG_DATA_HOME: '/data' }, '/mine'],
  ['linux', { LAGWRIGHT_DATA: 'here' }, resolve('here')],
] as const)('on %s with %o it is %s', (platform, env, folder) => {
  expect(dataFolder(env, platform)).toBe(folder)
})
