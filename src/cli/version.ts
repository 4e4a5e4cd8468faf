import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { programFolder } from './place.ts'

/** The version that package.json states. */
export function version(): string {
  const about: unknown = JSON.parse(readFileSync(join(programFolder, 'package.json'), 'utf8'))
  const isStated = typeof about === 'object' && about !== null && 'version' in about
  return isStated ? String(about.version) : 'without a version'
}
