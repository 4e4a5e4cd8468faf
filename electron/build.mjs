// Builds the program where dist is missing or older than its sources.
import { existsSync, readdirSync, statSync } from 'node:fs'
import { join } from 'node:path'

/** The four bundles, the last one built last. */
const bundles = ['ui/index.html', 'preload/preload.cjs', 'main/main.cjs', 'host/host.js']
const sources = ['src', 'electron', 'vite.config.ts', 'package.json']

/** @param {string} program */
export async function buildIfStale(program) {
  const files = bundles.map((bundle) => join(program, 'dist', bundle))
  const isBuilt = files.every((file) => existsSync(file))
  const builtMs = isBuilt ? statSync(files.at(-1) ?? '').mtimeMs : 0
  if (isBuilt && sources.every((source) => newestMs(join(program, source)) <= builtMs)) return
  const { createBuilder } = await import('vite')
  const configFile = join(program, 'vite.config.ts')
  const builder = await createBuilder({ configFile, logLevel: 'warn' }, null)
  await builder.buildApp()
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
