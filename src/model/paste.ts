/** A block of cells from a spreadsheet, put into the schedule where it is pasted. */
import type { CellReader } from './cell-edit.ts'
import { type CellText, type NewId, setCells } from './edits.ts'
import type { FieldKey } from './fields.ts'
import type { Job, Run } from './job.ts'

export interface Block {
  /** Runs as they stand on the screen from the anchor down; rows beyond them become new runs. */
  readonly runIds: readonly string[]
  /** Columns as they stand on the screen from the anchor to the right; null where nothing can be typed. */
  readonly keys: readonly (FieldKey | null)[]
  readonly rows: readonly (readonly string[])[]
}

/** Pastes a block at its anchor. A run that is added for it has only what was pasted: nothing of the run above. */
export function pasteBlock(job: Job, block: Block, newId: NewId, reader: CellReader): Job {
  const { runIds, keys } = block
  // An empty line passes over its run; below the last run it makes none.
  const rows = block.rows.filter(
    (row, index) => index < runIds.length || row.some((cell) => cell.trim() !== ''),
  )
  const shapeAt = keys.indexOf('shape')
  const hasShape = shapeAt >= 0 && rows.some((row) => row.length > shapeAt)
  const added = Array.from(
    { length: Math.max(0, rows.length - runIds.length) },
    (): Run => ({ id: newId(), values: hasShape ? {} : { shape: 'pipe' }, drafts: {} }),
  )
  const at = job.runs.findIndex((run) => run.id === runIds.at(-1))
  const grown =
    added.length === 0
      ? job
      : { ...job, runs: job.runs.toSpliced(at < 0 ? job.runs.length : at + 1, 0, ...added) }
  const targets = [...runIds, ...added.map((run) => run.id)]
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
