// Builds the program where dist is missing or older than its sources.
import { existsSync, readdirSync, statSync } from 'node:fs'
import { join } from 'node:path'

/** One file of each bundle. */
const bundles = ['ui/index.html', 'preload/preload.cjs', 'main/main.cjs', 'host/host.js']
const sources = ['src', 'electron', 'vite.config.ts', 'package.json']

/** @param {string} program */
export async function buildIfStale(program) {
  if (!isStale(program)) return
  console.log('Building Lagwright, which takes a few seconds and is done after a change only …')
  const { createBuilder } = await import('vite')
  const configFile = join(program, 'vite.config.ts')
  const builder = await createBuilder({ configFile, logLevel: 'warn' }, null)
  await builder.buildApp()
}

/** @param {string} program */
export function isStale(program) {
  const files = bundles.map((bundle) => join(program, 'dist', bundle))
  if (!files.every((file) => existsSync(file))) return true
  const builtMs = Math.min(...files.map((file) => statSync(file).mtimeMs))
  return sources.some((source) => newestMs(join(program, source)) > builtMs)
}

/**
 * @param {string} path
 * @returns {number}
 */
function newestMs(path) {
  const status = statSync(path)
  if (!status.isDirectory()) return status.mtimeMs
  const inside = readdirSync(path).map((name) => newestMs(join(path, name)))
  // The folder's own time tells of files that were removed.
  return Math.max(status.mtimeMs, ...inside)
}
