import { mkdtemp, readFile, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { listPackage } from '@electron/asar'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { buildIfStale } from '../../electron/build.mjs'
import { packInto } from './pack.ts'

let folder: string
let files: readonly string[]
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'lagwright-pack-'))
  await buildIfStale(join(import.meta.dirname, '..', '..'))
  const asar = await packInto(folder)
  files = listPackage(asar, { isPack: false }).filter((file) => /(\.\w+|LICENSE)$/.test(file))
}, 60_000)
afterAll(() => rm(folder, { recursive: true, force: true }))

/** All that a package holds. */
const expected = {
  'the main process': /^\/dist\/main\/main\.cjs$/,
  'the preload script': /^\/dist\/preload\/preload\.cjs$/,
  'the window': /^\/dist\/ui\/(index\.html|assets\/[\w.-]+\.(js|css|svg|woff2))$/,
  'migrations and seeds': /^\/db\/[\w/-]+\.(sql|csv|md)$/,
  'its own licence': /^\/LICENSE$/,
  'the licences of what it is made of': /^\/dist\/(main|ui)\/licenses\.md$/,
  'the licence of its font': /^\/dist\/ui\/LICENSE$/,
  'its description': /^\/package\.json$/,
  'its icon': /^\/electron\/icons\/icon\.png$/,
  'the database module':
    /^\/node_modules\/better-sqlite3\/(package\.json|LICENSE|README\.md|lib\/[\w/.-]+\.js|prebuilds\/linux-x64\.node)$/,
}

test.each(Object.entries(expected))('a package holds %s', (_what, pattern) => {
  expect(files.some((file) => pattern.test(file))).toBe(true)
})

test('a package holds nothing else', () => {
  const patterns = Object.values(expected)
  expect(files.filter((file) => !patterns.some((pattern) => pattern.test(file)))).toEqual([])
})

test('its fuses are set', async () => {
  const binary = await readFile(join(folder, 'release', 'linux-unpacked', 'lagwright'), 'latin1')
  // In the order of Electron's fuse wire: run as Node, cookie encryption, NODE_OPTIONS, inspection,
  // asar integrity, only from asar.
  const [, fuses] = /dL7pKGdnNz796PbbjQWNKmHXBZaB9tsX..(.{6})/s.exec(binary) ?? []
  expect(fuses).toBe('010011')
})
