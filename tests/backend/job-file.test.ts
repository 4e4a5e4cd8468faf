import {
  copyFileSync,
  cpSync,
  existsSync,
  mkdirSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs'
import { join } from 'node:path'
import Database from 'better-sqlite3'
import fc from 'fast-check'
import { describe, expect, onTestFinished, test } from 'vitest'
import { JobFile } from '#backend/job-file.ts'
import { AppError, type Failure } from '#contract/failures.ts'
import type { JobChange } from '#contract/host.ts'
import type { Job } from '#model/job.ts'
import { dbFolder, jobMigrations } from './program-folder.ts'
import { sampleJob, sampleRun } from './sample-job.ts'
import { quickFolder, temporaryFolder } from './temporary-folder.ts'

const nothing = { putRuns: [], removeRuns: [] }

function closing(file: JobFile): JobFile {
  onTestFinished(() => file.close())
  return file
}
function created(path: string, job: Job = sampleJob()): JobFile {
  return closing(JobFile.create(path, job, dbFolder))
}
function failureOf(act: () => unknown): Failure {
  try {
    act()
  } catch (error) {
    if (error instanceof AppError) return error.failure
    throw error
  }
  throw new Error('It did not fail.')
}
const opening = (path: string) => failureOf(() => JobFile.open(path, dbFolder))

test('a job takes no more runs than can be read back in one piece', () => {
  const file = created(join(quickFolder(), 'long.lagjob'))
  const runs = (from: number) =>
    Array.from({ length: 60_000 }, (_, index) => sampleRun(from + index))
  file.commit({ revision: 0, putRuns: runs(1000), removeRuns: [] })
  const more = { revision: 1, putRuns: runs(100_000), removeRuns: [] }
  expect(failureOf(() => file.commit(more))).toEqual({ code: 'job/too-many-runs', max: 100_000 })
  expect(file.revision).toBe(1)
})

describe('round trip', () => {
  test('what was written is read', () => {
    const path = join(temporaryFolder(), 'a.lagjob')
    const file = created(path)
    expect(file.read()).toEqual({ job: sampleJob(), revision: 0 })
    file.close()
    expect(closing(JobFile.open(path, dbFolder)).read()).toEqual({ job: sampleJob(), revision: 0 })
  })

  test('a file of the first version is opened, and its runs are as they were', () => {
    const olderDb = temporaryFolder()
    mkdirSync(join(olderDb, 'job'))
    copyFileSync(join(jobMigrations, '0001_job.sql'), join(olderDb, 'job', '0001_job.sql'))
    const path = join(temporaryFolder(), 'old.lagjob')
    JobFile.create(path, sampleJob(), olderDb).close()
    expect(closing(JobFile.open(path, dbFolder)).read()).toEqual({ job: sampleJob(), revision: 0 })
    expect(failureOf(() => JobFile.open(path, olderDb)).code).toBe('job/too-new')
  })

  test('an empty job, and every kind of text', () => {
    const path = join(temporaryFolder(), 'Straße 1 – 蒸気.LAGJOB')
    const job: Job = {
      name: '“Quoted” \u0000 \n',
      site: '日本 🏭 \ud800',
      defaults: {},
      runs: [
        { id: "it's", values: { description: '\\"\'; DROP TABLE run;--' }, drafts: { airC: '2O' } },
      ],
    }
    created(path, job).close()
    const read = closing(JobFile.open(path, dbFolder)).read().job
    expect(read.runs).toEqual(job.runs)
    expect(read.name).toBe(job.name)
  })

  test('the file that earlier programs wrote still opens', () => {
    const path = join(temporaryFolder(), 'version-1.lagjob')
    copyFileSync(join(import.meta.dirname, '..', 'fixtures', 'version-1.lagjob'), path)
    const { job, revision } = closing(JobFile.open(path, dbFolder)).read()
    expect(job).toEqual(sampleJob(3))
    expect(revision).toBe(1)
  })

  test('the file is a rollback-journal database that names itself', () => {
    const path = join(temporaryFolder(), 'a.lagjob')
    created(path).close()
    const db = new Database(path, { readonly: true })
    onTestFinished(() => void db.close())
    expect(db.pragma('application_id', { simple: true })).toBe(0x4c41474a)
    expect(db.pragma('user_version', { simple: true })).toBe(readdirSync(jobMigrations).length)
    expect(db.pragma('journal_mode', { simple: true })).toBe('delete')
  })
})

describe('commits', () => {
  test('count up and are there when the file is opened again', () => {
    const path = join(temporaryFolder(), 'a.lagjob')
    const file = created(path, sampleJob(3))
    const mended = { ...sampleRun(1), drafts: {}, values: { tag: 'P-1a', reach: false } }
    const first = file.commit({
      revision: 0,
      name: 'New name',
      putRuns: [mended],
      removeRuns: ['run-0'],
    })
    expect(first.revision).toBe(1)
    expect(new Date(first.savedAt).toISOString()).toBe(first.savedAt)
    file.commit({
      revision: 1,
      defaults: { airC: 5 },
      putRuns: [sampleRun(9)],
      removeRuns: [],
      order: ['run-9', 'run-2', 'run-1'],
    })
    const expected = {
      name: 'New name',
      site: 'Boiler house',
      defaults: { airC: 5 },
      runs: [sampleRun(9), sampleRun(2), mended],
    }
    expect(file.read()).toEqual({ job: expected, revision: 2 })
    file.close()
    expect(closing(JobFile.open(path, dbFolder)).read()).toEqual({ job: expected, revision: 2 })
  })

  test('one built on an older revision is refused', () => {
    const file = created(join(temporaryFolder(), 'a.lagjob'))
    file.commit({ revision: 0, site: 'A', ...nothing })
    expect(failureOf(() => file.commit({ revision: 0, site: 'B', ...nothing }))).toEqual({
      code: 'job/stale',
      found: 0,
      expected: 1,
    })
    expect(file.read().job.site).toBe('A')
  })

  test('one whose order is not whole changes nothing at all', () => {
    const file = created(join(temporaryFolder(), 'a.lagjob'), sampleJob(3))
    for (const order of [
      ['run-0', 'run-1'],
      ['run-0', 'run-1', 'run-1'],
      ['run-0', 'run-1', 'run-8'],
    ]) {
      const change = { revision: 0, name: 'Half', ...nothing, removeRuns: [], order }
      expect(failureOf(() => file.commit(change)).code).toBe('request/invalid')
    }
    expect(file.read()).toEqual({ job: sampleJob(3), revision: 0 })
    expect(file.commit({ revision: 0, name: 'Whole', ...nothing }).revision).toBe(1)
  })

  test('only the rows that changed are written', () => {
    const path = join(temporaryFolder(), 'a.lagjob')
    const file = created(path, sampleJob(5000))
    const before = readFileSync(path)
    file.commit({ revision: 0, putRuns: [{ ...sampleRun(2500), drafts: {} }], removeRuns: [] })
    const after = readFileSync(path)
    const pages = Array.from({ length: before.length / 4096 }, (_, i) => i * 4096).filter(
      (at) => !before.subarray(at, at + 4096).equals(after.subarray(at, at + 4096)),
    )
    // The head with the change counter, the row of `meta`, the leaf of the run.
    expect(pages.length).toBeLessThanOrEqual(3)
  })

  test('a file that was deleted or replaced under the program is noticed', () => {
    const path = join(temporaryFolder(), 'a.lagjob')
    const file = created(path)
    renameSync(path, `${path}.away`)
    expect(failureOf(() => file.commit({ revision: 0, site: 'A', ...nothing }))).toEqual({
      code: 'job/not-writable',
      path,
      why: 'the file is no longer there',
    })
    writeFileSync(path, 'another')
    expect(failureOf(() => file.commit({ revision: 0, site: 'A', ...nothing }))).toMatchObject({
      why: 'another file took its place',
    })
    // Nothing is lost: the job can still be saved elsewhere.
    const copy = closing(file.saveAs(join(temporaryFolder(), 'b.lagjob'), false))
    expect(copy.read().job).toEqual(sampleJob())
  })
})

describe('a thousand random edits', () => {
  type Edit = (job: Job, at: number) => Omit<JobChange, 'revision'>
  const pick = (job: Job, at: number) => job.runs[at % Math.max(1, job.runs.length)]
  let made = 0
  const edits: Record<string, Edit> = {
    put: (job, at) => {
      const run = pick(job, at)
      return {
        putRuns: run ? [{ ...run, values: { ...run.values, lengthM: at } }] : [],
        removeRuns: [],
      }
    },
    add: () => {
      made += 1
      return { putRuns: [sampleRun(1000 + made)], removeRuns: [] }
    },
    remove: (job, at) => ({ putRuns: [], removeRuns: [pick(job, at)?.id ?? 'none'] }),
    draft: (job, at) => {
      const run = pick(job, at)
      return { putRuns: run ? [{ ...run, drafts: { airC: `typed ${at}` } }] : [], removeRuns: [] }
    },
    turn: (job, at) => {
      const ids = job.runs.map(({ id }) => id)
      const cut = at % Math.max(1, ids.length)
      return { ...nothing, order: [...ids.slice(cut), ...ids.slice(0, cut).reverse()] }
    },
    insert: (job, at) => {
      made += 1
      const run = sampleRun(1000 + made)
      const ids = job.runs.map(({ id }) => id)
      return {
        putRuns: [run],
        removeRuns: [],
        order: ids.toSpliced(at % (ids.length + 1), 0, run.id),
      }
    },
    rename: (_, at) => ({ ...nothing, name: `Job ${at}`, site: `Site ${at}` }),
    defaults: (_, at) => ({ ...nothing, defaults: { airC: at % 40, fuel: `fuel ${at}` } }),
  }

  /** What the file must hold, worked out without it. */
  function changed(job: Job, change: Omit<JobChange, 'revision'>): Job {
    const put = new Map(change.putRuns.map((run) => [run.id, run]))
    const kept = job.runs
      .filter(({ id }) => !change.removeRuns.includes(id))
      .map((run) => put.get(run.id) ?? run)
    const fresh = change.putRuns.filter(({ id }) => !kept.some((run) => run.id === id))
    const all = [...kept, ...fresh]
    const order = change.order ?? all.map(({ id }) => id)
    return {
      name: change.name ?? job.name,
      site: change.site ?? job.site,
      defaults: change.defaults ?? job.defaults,
      runs: order.flatMap((id) => all.filter((run) => run.id === id)),
    }
  }

  test('leave in the file what they leave in memory', { timeout: 120_000 }, () => {
    const folder = quickFolder()
    let round = 0
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.constantFrom(...Object.keys(edits)), fc.nat(999)), {
          minLength: 100,
          maxLength: 100,
        }),
        (list) => {
          round += 1
          const path = join(folder, `${round}.lagjob`)
          let job = sampleJob(12)
          let file = JobFile.create(path, job, dbFolder)
          try {
            list.forEach(([kind, at], revision) => {
              const change = (edits[kind] as Edit)(job, at)
              file.commit({ revision, ...change })
              job = changed(job, change)
              if (revision % 25 === 24) {
                expect(file.read()).toEqual({ job, revision: revision + 1 })
                file.close()
                file = JobFile.open(path, dbFolder)
                expect(file.read()).toEqual({ job, revision: revision + 1 })
              }
            })
          } finally {
            file.close()
          }
        },
      ),
      { numRuns: 10, seed: 1203 },
    )
  })
})

describe('saving under another name', () => {
  test('copies what is committed and leaves the first file as it was', () => {
    const folder = temporaryFolder()
    const file = created(join(folder, 'a.lagjob'))
    file.commit({ revision: 0, site: 'Moved', ...nothing })
    const bytes = readFileSync(file.path)
    const copy = closing(file.saveAs(join(folder, 'b.lagjob'), false))
    expect(copy.read()).toEqual({ job: { ...sampleJob(), site: 'Moved' }, revision: 1 })
    copy.commit({ revision: 1, site: 'Only in b', ...nothing })
    expect(readFileSync(file.path).equals(bytes)).toBe(true)
    expect(readdirSync(folder).filter((name) => name.endsWith('.tmp'))).toEqual([])
  })

  test('replaces an existing file only when told to', () => {
    const folder = temporaryFolder()
    const file = created(join(folder, 'a.lagjob'))
    const path = join(folder, 'b.lagjob')
    writeFileSync(path, 'something else')
    expect(failureOf(() => file.saveAs(path, false))).toEqual({ code: 'job/exists', path })
    expect(readFileSync(path, 'utf8')).toBe('something else')
    closing(file.saveAs(path, true))
    expect(readFileSync(path).subarray(0, 15).toString()).toBe('SQLite format 3')
  })

  test('never replaces a job that a window has open', () => {
    const folder = temporaryFolder()
    const file = created(join(folder, 'a.lagjob'))
    const other = created(join(folder, 'b.lagjob'), sampleJob(2))
    expect(failureOf(() => file.saveAs(other.path, true)).code).toBe('job/in-use')
    expect(other.commit({ revision: 0, site: 'Still mine', ...nothing }).revision).toBe(1)
  })

  test('a place that takes no file is said, and the job stays open', () => {
    const folder = temporaryFolder()
    const file = created(join(folder, 'a.lagjob'))
    writeFileSync(join(folder, 'file'), '')
    for (const path of [join(folder, 'none', 'b.lagjob'), join(folder, 'file', 'b.lagjob')]) {
      const failure = failureOf(() => file.saveAs(path, false))
      expect(failure.code).toBe('job/not-writable')
    }
    expect(failureOf(() => file.saveAs(join(folder, 'none', 'b.lagjob'), false))).toMatchObject({
      why: 'there is no such folder',
    })
    const longName = join(folder, `${'x'.repeat(300)}.lagjob`)
    expect(failureOf(() => file.saveAs(longName, false)).code).toBe('job/not-writable')
    expect(file.commit({ revision: 0, site: 'Still open', ...nothing }).revision).toBe(1)
  })

  test('the name must end in .lagjob', () => {
    const folder = temporaryFolder()
    const file = created(join(folder, 'a.lagjob'))
    const path = join(folder, 'b.db')
    expect(failureOf(() => file.saveAs(path, true))).toEqual({ code: 'job/wrong-ending', path })
    expect(existsSync(path)).toBe(false)
  })

  test('the journal of a file that is gone does not reach into the new one', () => {
    const folder = temporaryFolder()
    const path = join(folder, 'b.lagjob')
    writeFileSync(`${path}-journal`, readFileSync(join(dbFolder, 'schema.sql')))
    const copy = closing(created(join(folder, 'a.lagjob')).saveAs(path, false))
    expect(copy.read().job).toEqual(sampleJob())
  })
})

describe('a second window', () => {
  test('is told, and can open the job once the first has closed it', () => {
    const path = join(temporaryFolder(), 'a.lagjob')
    const first = created(path)
    expect(opening(path)).toEqual({ code: 'job/in-use', path })
    first.commit({ revision: 0, site: 'Mine', ...nothing })
    expect(opening(path)).toEqual({ code: 'job/in-use', path })
    first.close()
    expect(closing(JobFile.open(path, dbFolder)).read().job.site).toBe('Mine')
  })
})

describe('an older file', () => {
  test('is brought up to date after a copy was kept', () => {
    const folder = temporaryFolder()
    const path = join(folder, 'a.lagjob')
    created(path).close()
    const bytes = readFileSync(path)

    const later = join(folder, 'db')
    mkdirSync(later)
    cpSync(jobMigrations, join(later, 'job'), { recursive: true })
    const next = `${String(readdirSync(jobMigrations).length + 1).padStart(4, '0')}_more.sql`
    writeFileSync(
      join(later, 'job', next),
      "ALTER TABLE meta ADD COLUMN more TEXT NOT NULL DEFAULT '';",
    )

    const file = closing(JobFile.open(path, later))
    expect(file.read().job).toEqual(sampleJob())
    const kept = join(
      folder,
      `a (before update, version ${readdirSync(jobMigrations).length}).lagjob`,
    )
    expect(readFileSync(kept).equals(bytes)).toBe(true)
    file.close()
    expect(opening(path)).toMatchObject({ code: 'job/too-new' })
    rmSync(path)
    expect(closing(JobFile.open(kept, dbFolder)).read().job).toEqual(sampleJob())
  })
})
