import { cpSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { JobFile } from '#backend/job-file.ts'
import { readJobFile } from '#backend/read-job.ts'
import { dbFolder, jobMigrations } from './program-folder.ts'
import { sampleJob } from './sample-job.ts'
import { temporaryFolder } from './temporary-folder.ts'

/** A folder with one closed job in it, and what the folder and the file look like. */
function stored() {
  const folder = temporaryFolder()
  const path = join(folder, 'a.lagjob')
  JobFile.create(path, sampleJob(), dbFolder).close()
  const look = () => ({
    files: readdirSync(folder),
    bytes: readFileSync(path).toString('base64'),
    changedMs: statSync(path).mtimeMs,
  })
  return { folder, path, look }
}

describe('a job that is only read', () => {
  test('is the job, and leaves file and folder as they were', () => {
    const { path, look } = stored()
    const before = look()
    expect(readJobFile(path, dbFolder)).toEqual(sampleJob())
    expect(look()).toEqual(before)
  })

  test('of an older version is read through a copy', () => {
    const { path, look } = stored()
    const later = temporaryFolder()
    mkdirSync(join(later, 'job'), { recursive: true })
    cpSync(jobMigrations, join(later, 'job'), { recursive: true })
    const next = `${String(readdirSync(jobMigrations).length + 1).padStart(4, '0')}_more.sql`
    writeFileSync(
      join(later, 'job', next),
      "ALTER TABLE meta ADD COLUMN more TEXT NOT NULL DEFAULT '';",
    )
    const before = look()
    expect(readJobFile(path, later)).toEqual(sampleJob())
    expect(look()).toEqual(before)
  })

  test('and open in a window is refused', () => {
    const { path } = stored()
    const window = JobFile.open(path, dbFolder)
    try {
      expect(() => readJobFile(path, dbFolder)).toThrow(/open in another Lagwright window/)
    } finally {
      window.close()
    }
  })
})
