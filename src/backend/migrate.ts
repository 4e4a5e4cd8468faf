import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import type Database from 'better-sqlite3'

/** The numbered .sql files of a folder, in order; their count is the version of the schema they build. */
export function migrationFiles(folder: string): string[] {
  return readdirSync(folder)
    .filter((name) => /^\d{4}_\w+\.sql$/.test(name))
    .sort()
}

export function schemaVersion(db: Database.Database): number {
  return db.pragma('user_version', { simple: true }) as number
}

/**
 * Brings a database up to date, all or nothing. The version is read again under the lock, so that two windows that
 * start at once do not both migrate. `tooNew` makes the failure for a database from a later program; `upTo` stops at
 * an earlier version.
 */
export function migrate(
  db: Database.Database,
  folder: string,
  tooNew: (found: number, known: number) => Error,
  upTo = Number.POSITIVE_INFINITY,
): void {
  const files = migrationFiles(folder).slice(0, upTo)
  const refuseTooNew = () => {
    const version = schemaVersion(db)
    if (version > files.length) throw tooNew(version, files.length)
    return version
  }
  if (refuseTooNew() === files.length) return
  const applyPending = db.transaction(() => {
    for (const file of files.slice(refuseTooNew())) {
      db.exec(readFileSync(join(folder, file), 'utf8'))
    }
    db.pragma(`user_version = ${files.length}`)
  })
  applyPending.exclusive()
}
