import { join } from 'node:path'
import { openCatalogue, readCatalogue } from '#backend/catalogue-db.ts'
import { dataFolder } from '#backend/data-folder.ts'
import type { Catalogue } from '#catalogue/types.ts'
import { programFolder } from './place.ts'

/** The user's catalogue; the shipped one where there is no place to keep one, as on a read-only machine. */
export function openedCatalogue(): Catalogue {
  const seeds = join(programFolder, 'db')
  try {
    return read(dataFolder(), seeds)
  } catch (error) {
    if (!isNoPlace(error)) throw error
    return read(':memory:', seeds)
  }
}

function read(folder: string, seeds: string): Catalogue {
  const database = openCatalogue(folder, seeds)
  try {
    return readCatalogue(database)
  } finally {
    database.close()
  }
}

function isNoPlace(error: unknown): boolean {
  const code = error instanceof Error && 'code' in error ? String(error.code) : ''
  return /^(EACCES|EPERM|EROFS|ENOTDIR|ENOENT|EEXIST|ENOSPC|SQLITE_CANTOPEN|SQLITE_READONLY)/.test(
    code,
  )
}
