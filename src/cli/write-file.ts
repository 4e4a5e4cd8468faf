/** Writes a result file whole or not at all. */
import {
  closeSync,
  existsSync,
  fsyncSync,
  openSync,
  realpathSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs'
import { basename, dirname, join } from 'node:path'
import { inChunks } from './chunks.ts'

/** Why the file may not be written, as a sentence; null where nothing stands against it. */
export function whyNotWrite(
  path: string,
  { force, input }: { force: boolean; input: string | null },
): string | null {
  if (!existsSync(dirname(path)))
    return `there is no folder ${dirname(path)}; allowed: a folder that is there`
  if (!existsSync(path)) return null
  if (statSync(path).isDirectory()) return `${path} is a folder; allowed: the name of a file`
  if (input !== null && existsSync(input) && realpathSync(input) === realpathSync(path)) {
    return `${path} is the list of runs itself; allowed: another name`
  }
  return force ? null : `${path} is already there; allowed: another name, or --force to replace it`
}

/** Writes beside the target first, so that a stop halfway leaves the old file or none. */
export function writeWhole(path: string, texts: Iterable<string>): void {
  const target = existsSync(path) ? realpathSync(path) : path
  const beside = join(dirname(target), `.${basename(target)}.${process.pid}.part`)
  const file = openSync(beside, 'wx')
  try {
    try {
      for (const chunk of inChunks(texts)) writeFileSync(file, chunk)
      fsyncSync(file)
    } finally {
      closeSync(file)
    }
    renameSync(beside, target)
  } catch (error) {
    rmSync(beside, { force: true })
    throw error
  }
}
