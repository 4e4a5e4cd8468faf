/** Files that are no whole job: each gets its sentence and stays as it was, byte by byte. */
import { createHash } from 'node:crypto'
import { mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import Database from 'better-sqlite3'
import { describe, expect, test } from 'vitest'
import { JobFile } from '#backend/job-file.ts'
import { AppError, type Failure } from '#contract/failures.ts'
import type { Job } from '#model/job.ts'
import { dbFolder } from './program-folder.ts'
import { sampleJob } from './sample-job.ts'
import { temporaryFolder } from './temporary-folder.ts'

/** Opens and closes the file; null where it opened. Fails if the folder is not what it was. */
function judged(path: string): Failure | null {
  const before = fingerprint(path)
  let failure: Failure | null = null
  let job: Job | null = null
  try {
    const file = JobFile.open(path, dbFolder)
    job = file.read().job
    file.close()
  } catch (error) {
    if (!(error instanceof AppError)) throw error
    failure = error.failure
  }
  expect(fingerprint(path)).toEqual(before)
  // What opens is the job that was written, never one that is nearly it.
  if (job) expect(job).toEqual(sampleJob(60))
  return failure
}

function fingerprint(path: string): string[] {
  const folder = join(path, '..')
  return readdirSync(folder, { withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map(({ name }) => {
      const hash = createHash('sha256').update(readFileSync(join(folder, name)))
      return `${name} ${hash.digest('hex')}`
    })
}

function written(bytes: string | Uint8Array, name = 'a.lagjob'): string {
  const path = join(temporaryFolder(), name)
  writeFileSync(path, bytes)
  return path
}

function wholeJob(change: (db: Database.Database) => void = () => {}): Buffer {
  const path = join(temporaryFolder(), 'whole.lagjob')
  JobFile.create(path, sampleJob(60), dbFolder).close()
  const db = new Database(path)
  change(db)
  db.close()
  return readFileSync(path)
}

describe('files that are no job', () => {
  test('a path without a file', () => {
    const path = join(temporaryFolder(), 'none.lagjob')
    expect(judged(path)).toEqual({ code: 'job/not-found', path })
  })

  test('a folder', () => {
    const path = join(temporaryFolder(), 'a.lagjob')
    mkdirSync(path)
    expect(judged(path)).toMatchObject({ code: 'job/not-a-job', why: 'it is a folder' })
  })

  test('a name that does not end in .lagjob, even of a job', () => {
    const path = written(wholeJob(), 'a.db')
    expect(judged(path)).toEqual({ code: 'job/wrong-ending', path })
  })

  test.each([
    { what: 'an empty file', bytes: '', why: 'it is empty' },
    {
      what: 'a text',
      bytes: 'tag,shape\nP-1,pipe\n',
      why: 'it is text, as a list of runs is; its name should end in .csv then',
    },
    { what: 'one letter', bytes: 'S', why: '' },
    { what: 'noise', bytes: Buffer.alloc(5000, 0xa5), why: 'it is not a SQLite database' },
  ])('$what', ({ bytes, why }) => {
    const failure = judged(written(bytes))
    expect(failure?.code).toMatch(/^job\/(not-a-job|damaged)$/)
    expect(failure).toMatchObject(why === '' ? {} : { why })
  })

  test('a database of another program', () => {
    const path = join(temporaryFolder(), 'a.lagjob')
    const db = new Database(path)
    db.exec('CREATE TABLE job (id INTEGER PRIMARY KEY)')
    db.close()
    expect(judged(path)).toMatchObject({
      code: 'job/not-a-job',
      why: 'it is a database of another program',
    })
  })

  test('a job of a later program', () => {
    const path = written(wholeJob((db) => db.pragma('user_version = 40')))
    expect(judged(path)).toMatchObject({ code: 'job/too-new', found: 40 })
  })

  test('a job with a write-ahead log', () => {
    const path = written(wholeJob((db) => db.pragma('journal_mode = WAL')))
    expect(judged(path)?.code).toBe('job/damaged')
  })
})

describe('jobs with something wrong inside', () => {
  const refused = (change: (db: Database.Database) => void) => judged(written(wholeJob(change)))

  test.each([
    {
      what: 'an unknown key',
      sql: `UPDATE run SET values_json = '{"tag":"P-3","colour":"red"}' WHERE id = 'run-3'`,
      why: 'run 4 (P-3): values: Unrecognized key: "colour"',
    },
    {
      what: 'a value out of range',
      sql: `UPDATE run SET values_json = '{"tag":"P-3","airC":1e9}' WHERE id = 'run-3'`,
      why: 'run 4 (P-3): values.airC: ',
    },
    {
      what: 'a list in place of values',
      sql: `UPDATE run SET values_json = '[]' WHERE id = 'run-3'`,
      why: 'run 4: values: ',
    },
    {
      what: 'a wrong default',
      sql: `UPDATE job SET defaults_json = '{"airC":"warm"}'`,
      why: 'the head of the job: defaults.airC: ',
    },
    {
      what: 'a value that turned into another',
      sql: `UPDATE run SET values_json = replace(values_json, '120', '160') WHERE id = 'run-3'`,
      why: 'run 4 (P-3) does not fit its checksum',
    },
    {
      what: 'a run that moved',
      sql: `UPDATE run SET position = 70 WHERE id = 'run-3'`,
      why: 'run 60 (P-3) does not fit its checksum',
    },
    {
      what: 'another name',
      sql: `UPDATE job SET name = 'Harrowmere Dreamery'`,
      why: 'the head of the job does not fit its checksum',
    },
    { what: 'no head', sql: 'DELETE FROM job', why: 'its head row is missing' },
    { what: 'no revision', sql: 'DELETE FROM meta', why: 'its head row is missing' },
    {
      what: 'a table more',
      sql: 'CREATE TABLE more (id)',
      why: 'its tables are not those of a job',
    },
    { what: 'a table less', sql: 'DROP TABLE run', why: 'its tables are not those of a job' },
    {
      what: 'a trigger',
      sql: 'CREATE TRIGGER evil AFTER UPDATE ON meta BEGIN DELETE FROM run; END',
      why: 'its tables are not those of a job',
    },
  ])('$what is named', ({ sql, why }) => {
    const failure = refused((db) => db.exec(sql))
    expect(failure?.code).toBe('job/damaged')
    expect(failure && 'why' in failure ? failure.why.slice(0, why.length) : '').toBe(why)
  })
})

/** Random numbers that are the same every time (mulberry32). */
function seeded(seed: number): () => number {
  let state = seed
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let t = Math.imul(state ^ (state >>> 15), 1 | state)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32
  }
}

describe('damage', () => {
  const known = ['job/not-a-job', 'job/damaged', 'job/too-new']

  test('a file cut off anywhere is refused', () => {
    const whole = wholeJob()
    const random = seeded(1)
    const lengths = Array.from({ length: 24 }, () => Math.floor(random() * whole.length))
    for (const length of [...lengths, 15, 16, 99, 100, 4096, whole.length - 1]) {
      const failure = judged(written(whole.subarray(0, length)))
      expect.soft(known, `cut to ${length}`).toContain(failure?.code)
    }
  })

  test('a bit turned over is noticed or harmless, never crashes and never leads to a write', () => {
    const whole = wholeJob()
    const random = seeded(2)
    const codes = Array.from({ length: 70 }, () => {
      const bytes = Buffer.from(whole)
      // Half of them where damage hurts most: the header and the schema.
      const at = Math.floor(random() * (random() < 0.5 ? 200 : whole.length))
      bytes[at] = (bytes[at] ?? 0) ^ (1 << Math.floor(random() * 8))
      return judged(written(bytes))?.code ?? 'opened'
    })
    expect([...new Set(codes)].filter((code) => ![...known, 'opened'].includes(code))).toEqual([])
    // Where the bit lies in unused space, the job opens and is the same.
    expect(codes.filter((code) => code !== 'opened').length).toBeGreaterThan(10)
  })

  test('a page count that does not fit the file is refused', () => {
    const whole = wholeJob()
    for (const off of [-2, -1, 1, 2]) {
      const bytes = Buffer.from(whole)
      bytes.writeUInt32BE(whole.length / 4096 + off, 28)
      expect(judged(written(bytes))?.code).toBe('job/damaged')
    }
    expect(judged(written(Buffer.concat([whole, Buffer.alloc(4096)])))?.code).toBe('job/damaged')
  })

  test('a page of zeros or noise is refused or the job is whole', () => {
    const whole = wholeJob()
    const random = seeded(3)
    for (let page = 0; page * 4096 < whole.length; page += 1)
      for (const noise of [0, 255, Math.floor(random() * 256)]) {
        const bytes = Buffer.from(whole)
        bytes.fill(noise, page * 4096, (page + 1) * 4096)
        expect.soft(known, `page ${page} of ${noise}`).toContain(judged(written(bytes))?.code)
      }
  })
})
