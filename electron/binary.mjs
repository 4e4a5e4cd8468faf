// Electron's binary: where it is, and how to fetch it without ever hanging. `require('electron')` is no
// way to ask for it: that starts a download without a time limit.
import { spawnSync } from 'node:child_process'
import { existsSync, readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'

const packageFile = createRequire(import.meta.url).resolve('electron/package.json')
const folder = dirname(packageFile)

/** @returns {string | null} */
export function electronBinary() {
  const own = process.env.ELECTRON_OVERRIDE_DIST_PATH
  const note = join(folder, 'path.txt')
  if (!own && !existsSync(note)) return null
  const name = existsSync(note) ? readFileSync(note, 'utf8') : 'electron'
  const file = join(own ?? join(folder, 'dist'), name)
  return existsSync(file) ? file : null
}

/**
 * Downloads Electron into its cache and unpacks it, as its own installer would; gives up after a silence, and when the
 * whole takes too long.
 */
export async function fetchElectron({ silenceMs = 5000, wholeMs = 20_000 } = {}) {
  const load = createRequire(packageFile)
  const { downloadArtifact } = load('@electron/get')
  const stop = new AbortController()
  const giveUp = (/** @type {string} */ why) => stop.abort(new Error(why))
  const whole = setTimeout(giveUp, wholeMs, `not done after ${wholeMs / 1000} s`)
  const quiet = `nothing arrived for ${silenceMs / 1000} s`
  let silence = setTimeout(giveUp, silenceMs, quiet)
  try {
    const download = downloadArtifact({
      version: load('./package.json').version,
      artifactName: 'electron',
      platform: process.platform,
      arch: process.arch,
      checksums: load('./checksums.json'),
      cacheRoot: process.env.electron_config_cache,
      downloadOptions: {
        quiet: true,
        signal: stop.signal,
        getProgressCallback: async () => {
          clearTimeout(silence)
          silence = setTimeout(giveUp, silenceMs, quiet)
        },
      },
    })
    // Raced, since retries between two attempts would not hear the signal.
    await Promise.race([download, aborted(stop.signal)])
  } finally {
    clearTimeout(whole)
    clearTimeout(silence)
  }
  spawnSync(process.execPath, [join(folder, 'install.js')], { stdio: 'ignore', timeout: 60_000 })
}

/**
 * @param {AbortSignal} signal
 * @returns {Promise<never>}
 */
function aborted(signal) {
  return new Promise((_resolve, reject) => {
    signal.addEventListener('abort', () => reject(signal.reason))
  })
}
