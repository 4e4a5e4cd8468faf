/** Judges what is inside a job file without writing to it. */
import { copyFileSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { basename, join } from 'node:path'
import Database from 'better-sqlite3'
import { AppError } from '#contract/failures.ts'
import { missingBytes } from './job-header.ts'
import { readJob, type StoredJob } from './job-rows.ts'
import { migrate, migrationFiles } from './migrate.ts'
import { readFailure } from './storage-failure.ts'

/** A file from elsewhere may carry triggers or views: nothing of its schema is trusted to run. */
export function harden(db: Database.Database): void {
  db.pragma('trusted_schema = OFF')
  db.pragma('cell_size_check = ON')
  db.pragma('mmap_size = 0')
}

/**
 * Reads the whole file without the right to write it; throws where it is not a whole job. Null for a file of an older
 * version, which can only be read once it was brought up to date.
 */
export function judgeContent(path: string, migrations: string, version: number): StoredJob | null {
  try {
    return judgeReadOnly(path, path, migrations, version)
  } catch (error) {
    // A program died while it wrote: SQLite must roll back before anyone can read. Judge that on a copy first.
    if (!isInterrupted(error)) throw readFailure(path, error)
    const folder = mkdtempSync(join(tmpdir(), 'lagwright-'))
    try {
      const copy = join(folder, basename(path))
      copyFileSync(path, copy)
      copyFileSync(`${path}-journal`, `${copy}-journal`)
      const db = new Database(copy)
      db.pragma('schema_version')
      db.close()
      return judgeReadOnly(copy, path, migrations, version)
    } catch (copyError) {
      throw readFailure(path, copyError)
    } finally {
      rmSync(folder, { recursive: true, force: true, maxRetries: 3 })
    }
  }
}

const isInterrupted = (error: unknown): boolean =>
  error instanceof Database.SqliteError && /^SQLITE_READONLY_/.test(error.code)

/** `path` is the name to report; `file` may be a copy of it. */
function judgeReadOnly(
  file: string,
  path: string,
  migrations: string,
  version: number,
): StoredJob | null {
  const damaged = (why: string) => new AppError({ code: 'job/damaged', path, why })
  const db = new Database(file, { readonly: true, fileMustExist: true, timeout: 250 })
  try {
    harden(db)
    const schema = schemaOf(db)
    const missing = missingBytes(file)
    if (missing > 0) throw damaged(`${missing} bytes at its end are missing`)
    // SQLite would cut them off when it opens the file for writing.
    if (missing < 0) throw damaged(`it is ${-missing} bytes longer than its header says`)
    const check = db.pragma('quick_check(1)', { simple: true })
    if (check !== 'ok') throw damaged(String(check).replaceAll(/\s+/g, ' '))
    if (schema !== expectedSchema(migrations, version))
      throw damaged('its tables are not those of a job')
    return version === migrationFiles(migrations).length ? readJob(db, path) : null
  } finally {
    db.close()
  }
}

function schemaOf(db: Database.Database): string {
  const rows = db
    .prepare<[], string>(
      `SELECT type || ' ' || name || ' ' || ifnull(sql, '') FROM sqlite_schema ORDER BY 1`,
    )
    .pluck()
    .all()
  // SQLite keeps the text of each CREATE; its comments and line breaks may change between releases.
  return rows.map((sql) => sql.replaceAll(/--[^\n]*/g, '').replaceAll(/\s+/g, ' ')).join('\n')
}

function expectedSchema(migrations: string, version: number): string {
  const db = new Database(':memory:')
  try {
    migrate(db, migrations, () => new Error('A fresh database has no version.'), version)
    return schemaOf(db)
  } finally {
    db.close()
  }
}
