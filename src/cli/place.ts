/** Where the user stands: npm runs scripts in the program's own folder and says in INIT_CWD where it was called. */
import { join, resolve } from 'node:path'

/** The program's own folder. */
export const programFolder = join(import.meta.dirname, '../..')

export function fullPath(path: string, env: NodeJS.ProcessEnv = process.env): string {
  const isOurScript = env.npm_lifecycle_event === 'lagwright' && process.cwd() === programFolder
  return resolve((isOurScript && env.INIT_CWD) || process.cwd(), path)
}
