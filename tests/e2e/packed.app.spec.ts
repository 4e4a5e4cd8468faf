import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { extractAll } from '@electron/asar'
import { packInto } from '../electron/pack.ts'
import { launchApp } from '../standin/launch.ts'
import { expect, test } from './fixture.ts'

test('the packed program runs from nothing but its package', async ({ dataFolder }) => {
  const folder = await mkdtemp(join(tmpdir(), 'lagwright-packed-'))
  const unpacked = join(folder, 'app')
  extractAll(await packInto(folder), unpacked)
  const app = await launchApp(dataFolder, join(unpacked, 'dist', 'main', 'main.cjs'))
  await expect(app.page).toHaveTitle(/Lagwright/)
  const reply = await app.page.evaluate(() => window.shell?.call('catalogue.read', {}))
  expect(reply).toMatchObject({ ok: true })
  expect(await app.close()).toBe(0)
  await rm(folder, { recursive: true, force: true })
})
