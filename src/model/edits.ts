/** Edits: pure functions from one job to the next. What does not change keeps its identity. */
import {
  type CellReader,
  columnReader,
  isSameRun,
  withCell,
  without,
  withValue,
} from './cell-edit.ts'
import { type FieldKey, fieldOf, type RunValues } from './fields.ts'
import type { Job, JobDefaults, Run } from './job.ts'

/** Makes the id of a new run; given by the caller, so that edits stay pure. */
export type NewId = () => string

/** One cell and what was typed into it. */
export interface CellText {
  readonly runId: string
  readonly key: FieldKey
  readonly text: string
}

/** What a run added to the schedule has in common with the one above it. */
const handedDown = [
  'place',
  'service',
  'group',
  'shape',
  'pipeMaterial',
  'medium',
  'mediumC',
  'mediumMaxC',
  'mediumMinC',
  'pressureGaugePa',
  'airC',
  'surroundingsC',
  'windMPerS',
  'humidity',
  'altitudeM',
  'touchAirC',
  'dampAirC',
  'material',
  'finish',
  'steps',
  'method',
  'maxSurfaceC',
  'reach',
  'reachReason',
  'contactS',
  'maxLossWPerM',
  'maxLossWPerM2',
  'dewMarginK',
  'money',
  'fuel',
  'hoursPerYear',
  'fuelPricePerKWh',
  'efficiency',
  'cop',
] as const satisfies readonly FieldKey[]

/** A run like another one, but for what makes it this run: tag, name, size and length. */
function runLike(above: Run | undefined, id: string): Run {
  const values = Object.fromEntries(
    handedDown.flatMap((key) =>
      above?.values[key] === undefined ? [] : [[key, above.values[key]]],
    ),
  )
  return { id, values: above ? values : { shape: 'pipe' }, drafts: {} }
}

/** Puts a new run below the named one, or at the end; it takes over what the run above it has in common. */
export function addRun(job: Job, id: string, belowId: string | null): Job {
  const at = belowId === null ? -1 : job.runs.findIndex((run) => run.id === belowId)
  const place = at < 0 ? job.runs.length : at + 1
  return { ...job, runs: job.runs.toSpliced(place, 0, runLike(job.runs[place - 1], id)) }
}

/** Copies runs, in the order they have, to below the last of them, each with the next free tag. */
export function duplicateRuns(job: Job, ids: ReadonlySet<string>, newId: NewId): Job {
  const last = job.runs.findLastIndex((run) => ids.has(run.id))
  if (last < 0) return job
  const nextTag = tagGiver(job.runs)
  const copies = job.runs.flatMap((run) => {
    if (!ids.has(run.id)) return []
    const { tag } = run.values
    const values = tag === undefined ? run.values : { ...run.values, tag: nextTag(tag) }
    return [{ ...run, id: newId(), values }]
  })
  return { ...job, runs: [...job.runs.slice(0, last + 1), ...copies, ...job.runs.slice(last + 1)] }
}

export function removeRuns(job: Job, ids: ReadonlySet<string>): Job {
  const runs = job.runs.filter((run) => !ids.has(run.id))
  return runs.length === job.runs.length ? job : { ...job, runs }
}

/** Moves runs, in the order they have, to before the named run; null moves them to the end. */
export function moveRuns(job: Job, ids: ReadonlySet<string>, beforeId: string | null): Job {
  if (beforeId !== null && ids.has(beforeId)) return job
  const moved = job.runs.filter((run) => ids.has(run.id))
  const rest = job.runs.filter((run) => !ids.has(run.id))
  const at = beforeId === null ? -1 : rest.findIndex((run) => run.id === beforeId)
  const runs = rest.toSpliced(at < 0 ? rest.length : at, 0, ...moved)
  return runs.every((run, index) => run === job.runs[index]) ? job : { ...job, runs }
}

/** Reads what was typed into one cell: a valid value, nothing, or text that is kept until it is mended. */
export function setCell(
  job: Job,
  runId: string,
  key: FieldKey,
  text: string,
  reader: CellReader,
): Job {
  return setCells(job, [{ runId, key, text }], reader)
}

/** The same for many cells at once. */
export function setCells(job: Job, cells: readonly CellText[], reader: CellReader): Job {
  const byRun = Map.groupBy(cells, (cell) => cell.runId)
  let changed = false
  const runs = job.runs.map((run) => {
    const next = (byRun.get(run.id) ?? []).reduce(
      (now, cell) => withCell(now, cell.key, cell.text, reader),
      run,
    )
    changed ||= next !== run
    return next
  })
  return changed ? { ...job, runs } : job
}

export function clearCells(job: Job, ids: ReadonlySet<string>, keys: readonly FieldKey[]): Job {
  const cells = [...ids].flatMap((runId) => keys.map((key) => ({ runId, key, text: '' })))
  return setCells(job, cells, columnReader)
}

/** Sets one value that is known to be valid, as a list or a switch gives it; undefined takes it away. */
export function setValue<K extends FieldKey>(
  job: Job,
  runId: string,
  key: K,
  value: RunValues[K],
): Job {
  const index = job.runs.findIndex((run) => run.id === runId)
  const run = job.runs[index]
  if (!run) return job
  const next = {
    ...run,
    values: withValue(run.values, key, value),
    drafts: without(run.drafts, key),
  }
  return isSameRun(run, next) ? job : { ...job, runs: job.runs.with(index, next) }
}

export function setJobName(job: Job, name: string): Job {
  return name === job.name ? job : { ...job, name }
}

export function setSite(job: Job, site: string): Job {
  return site === job.site ? job : { ...job, site }
}

/** Sets what every run takes unless it has its own. */
export function setDefault<K extends FieldKey>(job: Job, key: K, value: JobDefaults[K]): Job {
  return job.defaults[key] === value
    ? job
    : { ...job, defaults: withValue(job.defaults, key, value) }
}

/** Gives tags that nobody has: ST-104 becomes ST-105 or the next number that is free; one without a number gets one. */
function tagGiver(runs: readonly Run[]): (tag: string) => string {
  const taken = new Set(runs.map((run) => run.values.tag))
  // Where to look on from, so that ten thousand copies do not each count from the start.
  const lastByStem = new Map<string, number>()
  return (tag) => {
    // More digits than these are no longer counted exactly.
    const [, stem = tag, digits = ''] = /^(.*?)(\d{0,9})$/.exec(tag) ?? []
    const start = digits === '' ? 1 : Number(digits)
    const key = `${digits.length} ${stem}`
    for (let number = Math.max(start, lastByStem.get(key) ?? 0) + 1; ; number++) {
      const ending = digits === '' ? ` ${number}` : String(number).padStart(digits.length, '0')
      const next = stem.slice(0, longestTag - ending.length) + ending
      if (taken.has(next)) continue
      taken.add(next)
      lastByStem.set(key, number)
      return next
    }
  }
}

const tagField = fieldOf('tag')
const longestTag = tagField.kind === 'text' ? tagField.maxLength : 0
