/** Jobs that were never given a file: which of them the data folder still holds. */
import { readdirSync } from 'node:fs'
import { extname, join, resolve } from 'node:path'
import Database from 'better-sqlite3'
import { z } from 'zod'
import type { Draft } from '#contract/host.ts'
import { jobEnding } from './job-file.ts'

const rowSchema = z.object({ name: z.string(), runs: z.int(), savedAt: z.string() })

/** The drafts somebody worked on, the last saved first; one that is open, here or in another window, is left out. */
export function listDrafts(folder: string, openPath: string | null): readonly Draft[] {
  return namesIn(folder)
    .filter((name) => extname(name) === jobEnding)
    .map((name) => resolve(join(folder, name)))
    .filter((path) => openPath === null || path !== resolve(openPath))
    .flatMap((path) => draftAt(path) ?? [])
    .sort((a, b) => b.savedAt.localeCompare(a.savedAt))
}

function namesIn(folder: string): readonly string[] {
  try {
    return readdirSync(folder)
  } catch {
    // No draft was ever made.
    return []
  }
}

/** Null where nothing was changed since it was made, and where it cannot be read just now. */
function draftAt(path: string): Draft | null {
  let db: Database.Database | null = null
  try {
    // Not only to read: a draft that a power cut left half written is put right first.
    db = new Database(path, { fileMustExist: true, timeout: 0 })
    const row = db
      .prepare(
        `SELECT job.name, meta.saved_at AS savedAt, (SELECT count(*) FROM run) AS runs
         FROM meta, job WHERE meta.revision > 0`,
      )
      .get()
    const read = rowSchema.safeParse(row)
    return read.success ? { path, ...read.data } : null
  } catch {
    return null
  } finally {
    db?.close()
  }
}
