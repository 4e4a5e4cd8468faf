/** A block of cells from a spreadsheet, put into the schedule. */
import type { CellReader } from './cell-edit.ts'
import { type CellText, type NewId, runLike, setCells } from './edits.ts'
import { type FieldKey, fields } from './fields.ts'
import type { Job } from './job.ts'

export interface Block {
  /** Runs as they stand on the screen from the anchor down; rows beyond them become new runs. */
  readonly runIds: readonly string[]
  /** Columns as they stand on the screen from the anchor to the right; null where nothing can be typed. */
  readonly keys: readonly (FieldKey | null)[]
  readonly rows: readonly (readonly string[])[]
}

/**
 * Pastes a block at its anchor. If the first row names columns of ours, the block is read by these names instead,
 * wherever it is put; columns it does not name, and results, are left alone.
 */
export function pasteBlock(job: Job, block: Block, newId: NewId, reader: CellReader): Job {
  const named = headerKeys(block.rows[0] ?? [])
  const keys = named ?? block.keys
  const rows = (named ? block.rows.slice(1) : block.rows).filter((row) =>
    row.some((cell) => cell.trim() !== ''),
  )
  // A list pasted with its header into an empty place is a take-off of its own: what stands above has no say in it.
  const missing = Math.max(0, rows.length - block.runIds.length)
  const above = named ? undefined : job.runs.find((run) => run.id === block.runIds.at(-1))
  const added = Array.from({ length: missing }, () => {
    const run = runLike(above, newId())
    return named?.includes('shape') ? { ...run, values: {} } : run
  })
  const at = job.runs.findIndex((run) => run.id === block.runIds.at(-1))
  const grown =
    added.length === 0
      ? job
      : { ...job, runs: job.runs.toSpliced(at < 0 ? job.runs.length : at + 1, 0, ...added) }
  const targets = [...block.runIds, ...added.map((run) => run.id)]
  return setCells(grown, cellsOf(rows, targets, keys), reader)
}

function cellsOf(
  rows: Block['rows'],
  targets: readonly string[],
  keys: readonly (FieldKey | null)[],
): readonly CellText[] {
  return rows.flatMap((row, index) => {
    const runId = targets[index]
    if (runId === undefined) return []
    return row.flatMap((text, column) => {
      const key = keys[column]
      return key ? [{ runId, key, text }] : []
    })
  })
}

/** The fields that a header row names, or null where the row is not a header. */
export function headerKeys(row: readonly string[]): (FieldKey | null)[] | null {
  const keys = row.map((cell) => keyByHeader.get(normal(cell)) ?? null)
  const found = keys.filter((key) => key !== null)
  // One word alone may as well be a tag or a place; two that both name a column are a header.
  const isHeader = found.length >= 2 && new Set(found).size === found.length
  return isHeader ? keys : null
}

const normal = (header: string) =>
  header
    .trim()
    .toLowerCase()
    .replaceAll(/[\s_]+/g, ' ')

/** CSV headers, and the words on the screen with their unit as copied from here. */
const keyByHeader = new Map<string, FieldKey>([
  ...fields.map((field) => [normal(field.label), field.key] as const).toReversed(),
  ...fields.map((field) => [normal(field.column), field.key] as const),
])
