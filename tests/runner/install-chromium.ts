import { existsSync, readFileSync } from 'node:fs'
import { findChromium } from '../chromium.ts'
import { runCommand } from './tool.ts'

/** On Debian, as root, installs the Chromium that browser tests need; why there is still none, or null. */
export async function installChromium(): Promise<string | null> {
  if (process.env.CHROMIUM) return `there is no Chromium at CHROMIUM=${process.env.CHROMIUM}`
  if (!isDebian() || process.getuid?.() !== 0) return 'no Chromium on PATH or in CHROMIUM'
  console.log('\nNo Chromium here; installing it: apt-get update && apt-get install -y chromium')
  const options = { env: { DEBIAN_FRONTEND: 'noninteractive' } }
  const isInstalled =
    (await runCommand('apt-get', ['-qq', 'update'], options)) === 0 &&
    (await runCommand('apt-get', ['-qq', 'install', '-y', 'chromium'], options)) === 0
  return isInstalled && findChromium() ? null : 'no Chromium, and apt-get could not install it'
}

function isDebian(): boolean {
  const file = '/etc/os-release'
  return existsSync(file) && /^ID=debian$/m.test(readFileSync(file, 'utf8'))
}
