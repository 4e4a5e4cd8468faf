// The Chromium that browser tests run in: the one named by CHROMIUM, else the first on PATH.
import { existsSync } from 'node:fs'
import { delimiter, join } from 'node:path'

const names = ['chromium', 'chromium-browser', 'google-chrome-stable', 'google-chrome', 'chrome']

/** Path of a Chromium on this machine, or null. */
export function findChromium(): string | null {
  const named = process.env.CHROMIUM
  if (named) return existsSync(named) ? named : null
  const folders = (process.env.PATH ?? '').split(delimiter)
  const files = names.flatMap((name) => folders.map((folder) => join(folder, name)))
  return files.find((file) => existsSync(file)) ?? null
}

export const chromiumLaunch = {
  executablePath: findChromium() ?? 'chromium',
  args: [
    '--no-sandbox', // tests run as root in containers, where Chromium's sandbox refuses to start
    '--disable-gpu',
    '--disable-quic',
    '--no-first-run',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
  ],
}
