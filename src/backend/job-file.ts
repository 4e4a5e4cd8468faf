/**
 * A `.lagjob` file: one SQLite database that holds one job. Whoever opens it holds it until it is closed, so that a
 * second window is told; every commit is on the disk when it returns.
 */
import { copyFileSync, existsSync, rmSync, statSync } from 'node:fs'
import { dirname, extname, join } from 'node:path'
import Database from 'better-sqlite3'
import { AppError } from '#contract/failures.ts'
import type { JobChange } from '#contract/host.ts'
import type { Job } from '#model/job.ts'
import { applicationId, judgeHeader } from './job-header.ts'
import { harden, judgeContent } from './job-judge.ts'
import { readJob, type StoredJob, writeChange, writeJob } from './job-rows.ts'
import { migrate, migrationFiles } from './migrate.ts'
import { replaceFile } from './replace-file.ts'
import { readFailure, writeFailure } from './storage-failure.ts'

export const jobEnding = '.lagjob'

export interface Committed {
  readonly revision: number
  /** ISO 8601, UTC. */
  readonly savedAt: string
}

export class JobFile {
  readonly path: string
  readonly #db: Database.Database
  readonly #migrations: string
  /** The system's number of the file, to notice when another takes its place. */
  readonly #fileNumber: bigint
  #positions: Map<string, number>
  #revision: number
  #job: Job | null

  private constructor(path: string, db: Database.Database, migrations: string, stored: StoredJob) {
    this.path = path
    this.#db = db
    this.#migrations = migrations
    this.#fileNumber = fileNumber(path)
    this.#positions = stored.positions
    this.#revision = stored.revision
    this.#job = stored.job
  }

  /** Opens a job for work. A file that is not a whole job of this program is refused and never changed. */
  static open(path: string, dbFolder: string): JobFile {
    requireEnding(path)
    const migrations = join(dbFolder, 'job')
    const known = migrationFiles(migrations).length
    const version = judgeHeader(path, known)
    const judged = judgeContent(path, migrations, version)
    if (!judged) keepCopy(path, version)
    return JobFile.#hold(path, migrations, judged)
  }

  /** Makes a new file with this job in it; one that exists is replaced only with `overwrite`. */
  static create(path: string, job: Job, dbFolder: string, overwrite = false): JobFile {
    const migrations = join(dbFolder, 'job')
    placeJob(path, overwrite, (temporary) => {
      const db = new Database(temporary)
      try {
        db.pragma('synchronous = FULL')
        db.pragma(`application_id = ${applicationId}`)
        migrate(db, migrations, tooNew(path))
        db.transaction(() => writeJob(db, job, new Date().toISOString()))()
      } finally {
        db.close()
      }
    })
    return JobFile.#hold(path, migrations)
  }

  /** Counts the commits. */
  get revision(): number {
    return this.#revision
  }

  /** The job as the file holds it. */
  read(): { readonly job: Job; readonly revision: number } {
    this.#job ??= readJob(this.#db, this.path).job
    return { job: this.#job, revision: this.#revision }
  }

  /** Writes the rows of one edit in one transaction. */
  commit(change: JobChange): Committed {
    if (change.revision !== this.#revision)
      throw new AppError({
        code: 'job/stale',
        found: change.revision,
        expected: this.#revision,
      })
    const revision = this.#revision + 1
    const savedAt = new Date().toISOString()
    const write = this.#db.transaction(() => {
      const positions = writeChange(this.#db, change, this.#positions)
      this.#db.prepare('UPDATE meta SET revision = ?, saved_at = ?').run(revision, savedAt)
      return positions
    })
    try {
      this.#requirePlace()
      this.#positions = write()
    } catch (error) {
      throw writeFailure(this.path, error)
    }
    this.#revision = revision
    // Read again only if someone asks: the window has its own copy.
    this.#job = null
    return { revision, savedAt }
  }

  /** Writes a copy under another name and opens that; this file stays as it is and stays open. */
  saveAs(path: string, overwrite: boolean): JobFile {
    placeJob(path, overwrite, (temporary) => {
      this.#db.prepare('VACUUM INTO ?').run(temporary)
    })
    return JobFile.#hold(path, this.#migrations)
  }

  close(): void {
    this.#db.close()
  }

  /** A file that was deleted or replaced under us would take commits and lose them. */
  #requirePlace(): void {
    const why = !existsSync(this.path)
      ? 'the file is no longer there'
      : fileNumber(this.path) !== this.#fileNumber
        ? 'another file took its place'
        : null
    if (why) throw new AppError({ code: 'job/not-writable', path: this.path, why })
  }

  static #hold(path: string, migrations: string, judged: StoredJob | null = null): JobFile {
    let db: Database.Database | null = null
    try {
      db = new Database(path, { fileMustExist: true, timeout: 250 })
      harden(db)
      // From the first lock on it is held until the file is closed; the system lets go of it if the program dies.
      db.pragma('locking_mode = EXCLUSIVE')
      db.pragma('journal_mode = DELETE')
      db.pragma('synchronous = FULL')
      db.exec('BEGIN EXCLUSIVE; COMMIT')
      migrate(db, migrations, tooNew(path))
      const revision = db.prepare<[], number>('SELECT revision FROM meta').pluck().get()
      const stored = judged?.revision === revision ? judged : null
      return new JobFile(path, db, migrations, stored ?? readJob(db, path))
    } catch (error) {
      db?.close()
      throw writeFailure(path, error)
    }
  }
}

const fileNumber = (path: string): bigint => statSync(path, { bigint: true }).ino

function requireEnding(path: string): void {
  if (extname(path).toLowerCase() !== jobEnding)
    throw new AppError({ code: 'job/wrong-ending', path })
}

const tooNew = (path: string) => (found: number, known: number) =>
  new AppError({ code: 'job/too-new', path, found, known })

/** The file as it was before this program brings it up to date, so that an older program can still read it. */
function keepCopy(path: string, version: number): void {
  const copy = `${path.slice(0, -jobEnding.length)} (before update, version ${version})${jobEnding}`
  try {
    if (!existsSync(copy)) copyFileSync(path, copy)
  } catch (error) {
    throw writeFailure(copy, error)
  }
}

function placeJob(path: string, overwrite: boolean, write: (temporary: string) => void): void {
  requireEnding(path)
  if (existsSync(path)) {
    if (!overwrite) throw new AppError({ code: 'job/exists', path })
    requireFree(path)
  } else if (!existsSync(dirname(path))) {
    // SQLite would only say that it cannot open the file.
    const why = 'there is no such folder'
    throw new AppError({ code: 'job/not-writable', path, why })
  }
  try {
    replaceFile(path, (temporary) => {
      try {
        write(temporary)
      } catch (error) {
        rmSync(`${temporary}-journal`, { force: true })
        throw error
      }
      // The journal of a file that is replaced would be taken for that of the new one.
      rmSync(`${path}-journal`, { force: true })
    })
  } catch (error) {
    throw writeFailure(path, error)
  }
}

/** Refuses to replace a job that another window has open. What is no database may be replaced. */
function requireFree(path: string): void {
  try {
    const db = new Database(path, { readonly: true, fileMustExist: true, timeout: 250 })
    try {
      db.pragma('schema_version')
    } finally {
      db.close()
    }
  } catch (error) {
    const failure = readFailure(path, error)
    if (failure instanceof AppError && failure.failure.code === 'job/in-use') throw failure
  }
}
