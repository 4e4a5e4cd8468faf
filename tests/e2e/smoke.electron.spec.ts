import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { _electron, expect, test } from '@playwright/test'
import { electronBinary } from '../../electron/binary.mjs'

const program = join(import.meta.dirname, '..', '..')

// Runs where Electron's binary and a display are; elsewhere the runner counts it as not run.
test('Electron itself opens the window, and the window reaches the program', async () => {
  const executablePath = electronBinary()
  if (!executablePath) throw new Error("Electron's binary is not on this machine.")
  const dataFolder = await mkdtemp(join(tmpdir(), 'lagwright-electron-'))
  const app = await _electron.launch({
    executablePath,
    // Chromium's sandbox refuses to start as root.
    args: process.getuid?.() === 0 ? ['--no-sandbox', program] : [program],
    env: { ...process.env, LAGWRIGHT_DATA: dataFolder },
  })
  const page = await app.firstWindow()
  expect(page.url()).toBe('app://lagwright/index.html')
  const reply = await page.evaluate(() => window.shell?.call('host.about', {}))
  expect(reply).toMatchObject({ ok: true, value: { kind: 'desktop' } })
  await app.close()
  await rm(dataFolder, { recursive: true, force: true, maxRetries: 10, retryDelay: 200 })
})
