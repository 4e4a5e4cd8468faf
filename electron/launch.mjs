import { spawn } from 'node:child_process'
import { fileURLToPath } from 'node:url'
import { electronBinary, fetchElectron } from './binary.mjs'
import { hasDisplay, openInBrowser } from './browser.mjs'
import { buildIfStale } from './build.mjs'

const program = fileURLToPath(new URL('..', import.meta.url))

/** An Electron that ends this soon with an error never showed its window. */
const QUICK_MS = 10_000

/** @param {readonly string[]} options */
export async function start(options) {
  await buildIfStale(program)
  if (options.includes('--browser')) return startInBrowser(options)
  if (!hasDisplay()) return fallBack('there is no display', options)
  try {
    if (!electronBinary()) await fetchElectron()
  } catch (error) {
    return fallBack(`its download failed: ${reasonOf(error)}`, options)
  }
  const binary = electronBinary()
  if (!binary) return fallBack('its download could not be unpacked', options)
  const failure = await runElectron(binary)
  if (failure) await fallBack(failure, options)
}

/**
 * @param {string} binary
 * @returns {Promise<string | null>} why it never came up, or null once the user is done
 */
function runElectron(binary) {
  const began = Date.now()
  const child = spawn(binary, [program], { stdio: 'inherit' })
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM'])) {
    process.on(signal, () => child.kill(signal))
  }
  return new Promise((resolve) => {
    child.once('error', (error) => resolve(reasonOf(error)))
    child.once('exit', (code, signal) => {
      const isQuick = Date.now() - began < QUICK_MS
      if (code && isQuick) return resolve(`it ended at once with code ${code}`)
      if (signal && signal !== 'SIGINT' && signal !== 'SIGTERM' && isQuick)
        return resolve(`it ended at once by ${signal}`)
      process.exitCode = code ?? 1
      resolve(null)
    })
  })
}

/**
 * @param {string} why
 * @param {readonly string[]} options
 */
async function fallBack(why, options) {
  console.error(`The desktop shell cannot run here (${why}), so Lagwright runs in the browser.`)
  await startInBrowser(options)
}

/** @param {readonly string[]} options */
async function startInBrowser(options) {
  const { url } = await import(new URL('../dist/host/host.js', import.meta.url).href)
  if (!options.includes('--no-open') && !process.env.CI && hasDisplay()) openInBrowser(url)
}

/** @param {unknown} error */
function reasonOf(error) {
  if (!(error instanceof Error)) return String(error)
  const cause = /** @type {{ code?: string } | undefined} */ (error.cause)
  return cause?.code ?? error.message
}
