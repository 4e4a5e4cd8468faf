/** The rows of a job file: read as a job and checked by its schema, written row by row. */
import { crc32 } from 'node:zlib'
import type Database from 'better-sqlite3'
import type { z } from 'zod'
import { AppError } from '#contract/failures.ts'
import type { JobChange } from '#contract/host.ts'
import { type Job, jobSchema, maxRuns, type Run, runSchema } from '#model/job.ts'

interface JobRow {
  readonly name: string
  readonly site: string
  readonly defaults: string
  readonly checksum: number
}
interface RunRow {
  readonly id: string
  readonly position: number
  readonly values: string
  readonly drafts: string
  readonly checksum: number
}

export interface StoredJob {
  readonly job: Job
  readonly revision: number
  /** Where each run stands; commits write only the positions that change. */
  readonly positions: Map<string, number>
}

/** Reads everything. One bad value refuses the file, by name: a schedule with a run missing would be quoted. */
export function readJob(db: Database.Database, path: string): StoredJob {
  const damaged = (why: string) => new AppError({ code: 'job/damaged', path, why })
  const head = db
    .prepare<[], JobRow>('SELECT name, site, defaults_json AS defaults, checksum FROM job')
    .get()
  const revision = db.prepare<[], number>('SELECT revision FROM meta').pluck().get()
  if (!head || revision === undefined) throw damaged('its head row is missing')
  const rows = db
    .prepare<[], RunRow>(
      `SELECT id, position, values_json AS "values", drafts_json AS drafts, checksum
       FROM run ORDER BY position, rowid`,
    )
    .all()
  const parsed = jobSchema.safeParse({
    name: head.name,
    site: head.site,
    defaults: json(head.defaults),
    runs: [],
  })
  if (!parsed.success) throw damaged(`the head of the job: ${issueText(parsed.error)}`)
  if (head.checksum !== sumOf(head.name, head.site, head.defaults))
    throw damaged('the head of the job does not fit its checksum')
  const runs = rows.map((row, index): Run => {
    const values = json(row.values)
    const run = runSchema.safeParse({ id: row.id, values, drafts: json(row.drafts) })
    const isWhole = row.checksum === sumOf(row.id, row.values, row.drafts) + row.position
    if (run.success && isWhole) return run.data
    const tag = (values as { tag?: unknown } | undefined)?.tag
    const name = typeof tag === 'string' ? `run ${index + 1} (${tag})` : `run ${index + 1}`
    throw damaged(
      run.success ? `${name} does not fit its checksum` : `${name}: ${issueText(run.error)}`,
    )
  })
  return {
    job: { ...parsed.data, runs },
    revision,
    positions: new Map(rows.map((row) => [row.id, row.position])),
  }
}

const sumOf = (...texts: string[]): number => crc32(texts.join('\0'))

/** Undefined where the text is no JSON, which no schema takes. */
function json(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    return undefined
  }
}

function issueText(error: z.ZodError): string {
  const issue = error.issues[0]
  if (!issue) return 'not as a job stores it'
  const place = issue.path.join('.')
  return place === '' ? issue.message : `${place}: ${issue.message}`
}

/** Fills the tables of a new file. */
export function writeJob(db: Database.Database, job: Job, now: string): void {
  db.prepare('INSERT INTO meta (id, revision, created_at, saved_at) VALUES (1, 0, ?, ?)').run(
    now,
    now,
  )
  db.prepare(
    `INSERT INTO job (id, name, site, defaults_json, checksum) VALUES (1, '', '', '{}', 0)`,
  ).run()
  writeHead(db, job)
  const put = putRun(db)
  job.runs.forEach((run, index) => {
    put(run, index)
  })
}

/** What is absent stays as it is. */
function writeHead(db: Database.Database, head: Partial<Pick<Job, 'name' | 'site' | 'defaults'>>) {
  const before = db
    .prepare<[], JobRow>('SELECT name, site, defaults_json AS defaults, checksum FROM job')
    .get()
  const name = head.name ?? before?.name ?? ''
  const site = head.site ?? before?.site ?? ''
  const defaults = head.defaults ? JSON.stringify(head.defaults) : (before?.defaults ?? '{}')
  db.prepare('UPDATE job SET name = ?, site = ?, defaults_json = ?, checksum = ?').run(
    name,
    site,
    defaults,
    sumOf(name, site, defaults),
  )
}

/** Writes what the change names and nothing else; gives the positions after it. To be called in a transaction. */
export function writeChange(
  db: Database.Database,
  change: JobChange,
  positions: ReadonlyMap<string, number>,
): Map<string, number> {
  const { name, site, defaults } = change
  if (name !== undefined || site !== undefined || defaults !== undefined)
    writeHead(db, {
      ...(name !== undefined && { name }),
      ...(site !== undefined && { site }),
      ...(defaults !== undefined && { defaults }),
    })

  const next = new Map(positions)
  const remove = db.prepare('DELETE FROM run WHERE id = ?')
  for (const id of change.removeRuns) {
    remove.run(id)
    next.delete(id)
  }
  let last = [...next.values()].reduce((highest, position) => Math.max(highest, position), -1)
  const put = putRun(db)
  for (const run of change.putRuns) {
    const position = next.get(run.id) ?? ++last
    put(run, position)
    next.set(run.id, position)
  }
  if (next.size > maxRuns) throw new AppError({ code: 'job/too-many-runs', max: maxRuns })
  if (change.order) reorder(db, change.order, next)
  return next
}

function reorder(db: Database.Database, order: readonly string[], positions: Map<string, number>) {
  const isWhole =
    order.length === positions.size &&
    new Set(order).size === order.length &&
    order.every((id) => positions.has(id))
  if (!isWhole)
    throw new AppError({
      code: 'request/invalid',
      issues: `order: it must name each of the ${positions.size} runs once`,
    })
  const move = db.prepare(
    'UPDATE run SET checksum = checksum - position + @position, position = @position WHERE id = @id',
  )
  order.forEach((id, index) => {
    if (positions.get(id) === index) return
    move.run({ position: index, id })
    positions.set(id, index)
  })
}

function putRun(db: Database.Database): (run: Run, position: number) => void {
  const put = db.prepare(
    `INSERT INTO run (id, position, values_json, drafts_json, checksum) VALUES (?, ?, ?, ?, ?)
     ON CONFLICT (id) DO UPDATE SET values_json = excluded.values_json, drafts_json = excluded.drafts_json,
       checksum = excluded.checksum`,
  )
  return ({ id, values, drafts }, position) => {
    const texts = [JSON.stringify(values), JSON.stringify(drafts)] as const
    put.run(id, position, ...texts, sumOf(id, ...texts) + position)
  }
}
