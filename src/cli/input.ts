/** Reads the list of runs: a CSV file, standard input, or a job. */
import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { readJobFile } from '#backend/read-job.ts'
import type { FieldKey, RunValues } from '#model/fields.ts'
import type { Job } from '#model/job.ts'
import { doubledTags, localIssues } from '#model/local-issues.ts'
import { parseRunsCsv, type ReadList, sentence } from '#report/runs-csv.ts'
import type { Issue } from '#sizing/result.ts'
import { isJobPath } from './arguments.ts'
import { fullPath, programFolder } from './place.ts'

export interface InputRun {
  /** Its row in a list; its place in a job. */
  readonly at: number
  readonly values: RunValues
  /** Fields whose problem is known already. */
  readonly faulty: ReadonlySet<FieldKey>
  /** A problem of this run as a line of text. */
  readonly problem: (issue: Issue) => string
}

/** A problem as a line of text, and where it belongs among the others. */
export interface Problem {
  readonly at: number
  readonly text: string
}

export interface ReadInput {
  readonly ok: true
  readonly runs: readonly InputRun[]
  readonly defaults: RunValues
  /** Of a list; a job has none. */
  readonly header: ReadList['header'] | null
  /** What could not be read; the runs are read as far as they could be. */
  readonly problems: readonly Problem[]
}

export type Input = ReadInput | Refused
export interface Refused {
  readonly ok: false
  readonly problems: readonly string[]
}

export async function readInput(path: string): Promise<Input> {
  if (isJobPath(path)) return jobInput(path)
  const source = path === '-' ? await readStandardInput() : readListFile(path)
  return typeof source === 'string' ? refused([source]) : listInput(source)
}

/** The values that a job gives to every run. */
export function readJobDefaults(
  path: string,
): { readonly ok: true; readonly defaults: RunValues } | Refused {
  const job = readJob(path)
  return typeof job === 'string' ? refused([job]) : { ok: true, defaults: job.defaults }
}

function listInput(source: Uint8Array): Input {
  const read = parseRunsCsv(source)
  const runs = read.list.rows.map(({ row, values, faulty }) => ({
    at: row,
    values,
    faulty,
    problem: (issue: Issue) => sentence({ row, ...issue }),
  }))
  const issues = read.ok ? [] : read.issues
  const problems = issues.map((issue) => ({ at: issue.row, text: sentence(issue) }))
  return { ok: true, runs, defaults: {}, header: read.list.header, problems }
}

function jobInput(path: string): Input {
  const job = readJob(path)
  if (typeof job === 'string') return refused([job])
  if (job.runs.length === 0) return refused([`${path}: found no runs; allowed: a job with runs`])
  const doubled = doubledTags(job.runs)
  const problems: Problem[] = []
  const runs = job.runs.map((run, at) => {
    const problem = (issue: Issue) => jobSentence(at, run.values, issue)
    for (const issue of localIssues(run, doubled)) problems.push({ at, text: problem(issue) })
    return {
      at,
      values: run.values,
      faulty: new Set(Object.keys(run.drafts) as FieldKey[]),
      problem,
    }
  })
  return { ok: true, runs, defaults: job.defaults, header: null, problems }
}

function jobSentence(index: number, { tag }: RunValues, { column, found, allowed }: Issue): string {
  const run = tag === undefined ? `run ${index + 1}` : `run ${index + 1} (${tag})`
  return `${run}, column ${column}: found ${found}; allowed: ${allowed}`
}

/** The job, or what stands against reading it. */
function readJob(path: string): Job | string {
  try {
    return readJobFile(fullPath(path), join(programFolder, 'db'))
  } catch (error) {
    if (error instanceof Error && error.name === 'AppError') return error.message
    throw error
  }
}

function refused(problems: readonly string[]): Refused {
  return { ok: false, problems }
}

async function readStandardInput(): Promise<Uint8Array> {
  const chunks: Uint8Array[] = []
  for await (const chunk of process.stdin) chunks.push(chunk)
  return Buffer.concat(chunks)
}

/** The bytes of the file, or what stands against reading them. */
function readListFile(path: string): Uint8Array | string {
  try {
    return readFileSync(fullPath(path))
  } catch (error) {
    return `${path}: ${whyNotRead(error)}; allowed: a list of runs as CSV, a job that ends in .lagjob, or -`
  }
}

function whyNotRead(error: unknown): string {
  const code = error instanceof Error && 'code' in error ? String(error.code) : ''
  const known: Readonly<Record<string, string>> = {
    ENOENT: 'there is no such file',
    EISDIR: 'this is a folder',
    EACCES: 'this file may not be read',
    EPERM: 'this file may not be read',
  }
  return known[code] ?? `the file cannot be read (${code || String(error)})`
}
