/** Puts files in their place whole: whoever looks sees the old file or the new one, also after a crash. */
import { randomUUID } from 'node:crypto'
import { closeSync, fsyncSync, openSync, renameSync, rmSync } from 'node:fs'
import { basename, dirname, join } from 'node:path'

/** `write` fills a temporary file beside the place; only then it moves there. */
export function replaceFile(path: string, write: (temporary: string) => void): void {
  const temporary = join(dirname(path), `.${basename(path)}.${randomUUID().slice(0, 8)}.tmp`)
  try {
    write(temporary)
    syncFile(temporary)
    renameSync(temporary, path)
    syncFolder(dirname(path))
  } catch (error) {
    rmSync(temporary, { force: true })
    throw error
  }
}

/** Waits until the bytes of a file are on the disk. */
function syncFile(path: string): void {
  const file = openSync(path, 'r+')
  try {
    fsyncSync(file)
  } finally {
    closeSync(file)
  }
}

/** Waits until a new name in a folder is on the disk. */
function syncFolder(path: string): void {
  try {
    const folder = openSync(path, 'r')
    try {
      fsyncSync(folder)
    } finally {
      closeSync(folder)
    }
  } catch {
    // Some systems open no folders and keep their names safe by themselves.
  }
}
