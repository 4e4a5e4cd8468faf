/** What changed between two jobs, row by row: all that has to be written. */
import type { Job, JobDefaults, Run } from './job.ts'

export interface JobDifference {
  name?: string
  site?: string
  defaults?: JobDefaults
  /** New and changed runs. */
  putRuns: Run[]
  removeRuns: string[]
  /** Ids of all runs in their new order; absent where new runs only follow the old ones. */
  order?: string[]
}

/** Null where nothing changed. Unchanged runs are told by their identity, so this is fast on long jobs. */
export function diffJob(previous: Job, next: Job): JobDifference | null {
  const parts = {
    ...(previous.name !== next.name && { name: next.name }),
    ...(previous.site !== next.site && { site: next.site }),
    ...(previous.defaults !== next.defaults && { defaults: next.defaults }),
  }
  const rows = previous.runs === next.runs ? noRows : diffRuns(previous.runs, next.runs)
  const isSame =
    Object.keys(parts).length === 0 &&
    rows.putRuns.length === 0 &&
    rows.removeRuns.length === 0 &&
    !rows.order
  return isSame ? null : { ...parts, ...rows }
}

type Rows = Pick<JobDifference, 'putRuns' | 'removeRuns' | 'order'>
const noRows: Rows = { putRuns: [], removeRuns: [] }

function diffRuns(previous: readonly Run[], next: readonly Run[]): Rows {
  const before = new Map(previous.map((run) => [run.id, run]))
  const after = new Set(next.map((run) => run.id))
  const putRuns = next.filter((run) => before.get(run.id) !== run)
  const removeRuns = previous.filter((run) => !after.has(run.id)).map((run) => run.id)
  const kept = previous.filter((run) => after.has(run.id)).map((run) => run.id)
  const appended = putRuns.filter((run) => !before.has(run.id)).map((run) => run.id)
  const unsorted = [...kept, ...appended]
  const isInOrder = next.every((run, index) => run.id === unsorted[index])
  return { putRuns, removeRuns, ...(!isInOrder && { order: next.map((run) => run.id) }) }
}

/** The previous job with a difference applied: the next job. */
export function applyDifference(job: Job, difference: JobDifference): Job {
  const { putRuns, removeRuns, order } = difference
  const removed = new Set(removeRuns)
  const put = new Map(putRuns.map((run) => [run.id, run]))
  const kept = job.runs.filter((run) => !removed.has(run.id)).map((run) => put.get(run.id) ?? run)
  const known = new Set(kept.map((run) => run.id))
  const all = [...kept, ...putRuns.filter((run) => !known.has(run.id))]
  const byId = new Map(all.map((run) => [run.id, run]))
  const runs = order ? order.flatMap((id) => byId.get(id) ?? []) : all
  return {
    name: difference.name ?? job.name,
    site: difference.site ?? job.site,
    defaults: difference.defaults ?? job.defaults,
    runs,
  }
}
