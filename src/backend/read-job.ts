import { copyFileSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { basename, join } from 'node:path'
import type { Job } from '#model/job.ts'
import { JobFile } from './job-file.ts'
import { judgeHeader } from './job-header.ts'
import { judgeContent } from './job-judge.ts'
import { migrationFiles } from './migrate.ts'

/**
 * The job of a file that is only looked at, by a list or a script: never written, so that a file without the right to
 * write will do. A file of an older version is brought up to date on a copy.
 */
export function readJobFile(path: string, dbFolder: string): Job {
  const migrations = join(dbFolder, 'job')
  const version = judgeHeader(path, migrationFiles(migrations).length)
  const judged = judgeContent(path, migrations, version)
  if (judged) return judged.job
  const folder = mkdtempSync(join(tmpdir(), 'lagwright-'))
  try {
    const copy = join(folder, basename(path))
    copyFileSync(path, copy)
    const file = JobFile.open(copy, dbFolder)
    try {
      return file.read().job
    } finally {
      file.close()
    }
  } finally {
    rmSync(folder, { recursive: true, force: true, maxRetries: 3 })
  }
}
