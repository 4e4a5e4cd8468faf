/** What can be done in the schedule, whichever way it is asked for. */
import { addRun, clearCells, duplicateRuns, moveRuns, removeRuns, setCell } from '#model/edits.ts'
import type { FieldKey } from '#model/fields.ts'
import type { Run } from '#model/job.ts'
import { pasteBlock } from '#model/paste.ts'
import { pasteTakeOff, type TakeOff, takeOffOf } from '#model/take-off.ts'
import { editText } from '#ui/state/cell-text.ts'
import type { UnitSystem } from '#units/quantities.ts'
import { copyText, type Showing } from './cell-view.ts'
import type { Column } from './columns.ts'
import type { Grid } from './grid.svelte.ts'
import { readTsv, writeTsv } from './tsv.ts'

const newId = () => crypto.randomUUID()

/** Adds a run below the active one and goes to its tag. */
export function addRunBelow(grid: Grid): void {
  const { session } = grid.workspace
  const id = newId()
  // A filter would hide the new run at once.
  grid.filterText = ''
  grid.onlyNeedy = false
  // The first run is told by a form; later ones are like the one above.
  if (session.job.runs.length === 0) grid.panel = 'inputs'
  session.edit(addRun, id, session.activeRunId)
  grid.goToRun(id, 'tag')
}

export function duplicateMarked(grid: Grid): void {
  const ids = markedIds(grid)
  if (ids.size > 0) grid.workspace.session.edit(duplicateRuns, ids, newId)
}

export function removeMarked(grid: Grid): void {
  const { session } = grid.workspace
  const ids = markedIds(grid)
  if (ids.size === 0) return
  const { top, bottom } = grid.extent
  const next = grid.rows[bottom + 1] ?? grid.rows[top - 1]
  session.edit(removeRuns, ids)
  if (next) grid.goToRun(next.id, 'tag')
  else session.activeRunId = null
}

/** Moves the marked runs one line up or down among the runs of their service. */
export function moveMarked(grid: Grid, step: 1 | -1): void {
  const { session } = grid.workspace
  const { top, bottom } = grid.extent
  const last = grid.rows[bottom]
  const passed = grid.rows[step < 0 ? top - 1 : bottom + 1]
  if (!last || !passed || passed.values.service !== last.values.service) return
  const { runs } = session.job
  const before = step < 0 ? passed : runs[runs.indexOf(passed) + 1]
  session.edit(moveRuns, markedIds(grid), before?.id ?? null)
}

/** Empties what can be typed in the marked cells. */
export function clearMarked(grid: Grid): void {
  const keys = grid.markedColumns().flatMap(({ key }) => (key ? [key] : []))
  grid.workspace.session.edit(clearCells, markedIds(grid), keys)
}

/** Opens the active cell; `typed` replaces what stands in it. */
export function startEditing(grid: Grid, typed?: string): void {
  const run = grid.rows[grid.activeRow]
  const column = grid.columns[grid.activeColumn]
  if (!run || !column?.key) return
  const { key } = column
  const text = typed ?? standingText(grid, run, key)
  grid.editing = { runId: run.id, columnId: column.id, key, text }
}

export function commitEditing(grid: Grid, text: string): void {
  const { editing } = grid
  grid.editing = null
  // Among all runs: a filter may have hidden this one while it was typed in.
  const run = grid.workspace.session.job.runs.find(({ id }) => id === editing?.runId)
  if (!editing || !run || text === standingText(grid, run, editing.key)) return
  grid.workspace.session.edit(setCell, run.id, editing.key, text, grid.workspace.reader)
}

/** What an open cell begins with. */
function standingText(grid: Grid, run: Run, key: FieldKey): string {
  const { words, preferences } = grid.workspace
  const value = run.values[key]
  const draft = run.drafts[key]
  if (draft !== undefined) return draft
  if (value === undefined) return key === 'size' ? sidesText(run, preferences.units) : ''
  if (typeof value === 'string' && words.isListed(key)) return words.nameOf(key, value)
  return editText(key, value, preferences.units)
}

function sidesText({ values: { widthM, heightM } }: Run, units: UnitSystem): string {
  if (widthM === undefined || heightM === undefined) return ''
  return `${editText('widthM', widthM, units)} x ${editText('heightM', heightM, units)}`
}

export function copyMarked(grid: Grid, showing: Showing): string {
  const columns = grid.markedColumns()
  const { briefs } = grid.workspace.sizing
  grid.copied = writeTsv(
    grid
      .markedRuns()
      .map((run) => columns.map((column) => copyText(run, briefs.get(run.id), column, showing))),
  )
  return grid.copied
}

/**
 * Pastes a list with its own header as new runs, asking first what its columns are where some are not ours; anything
 * else where the marked cells begin.
 */
export function pasteText(grid: Grid, text: string): void {
  if (text.trim() === '') return
  const rows = readTsv(text)
  // What was copied here are cells, whatever their words.
  const takeOff = writeTsv(rows) === grid.copied ? null : takeOffOf(rows)
  if (!takeOff) pasteCells(grid, rows)
  else if (takeOff.rows.length === 0)
    grid.workspace.failure =
      'Only the names of columns were pasted, so there is no run to add. Copy the lines below them as well.'
  else if (takeOff.isKnown) addTakeOff(grid, takeOff)
  else grid.asked = { takeOff, rows }
}

export function addTakeOff(grid: Grid, takeOff: TakeOff): void {
  const { session } = grid.workspace
  const before = session.job.runs.length
  session.edit(pasteTakeOff, takeOff, newId, (units) => grid.workspace.readerIn(units))
  const added = session.job.runs[before]
  // A filter would hide what was added.
  grid.filterText = ''
  grid.onlyNeedy = false
  if (added) grid.goToRun(added.id, 'tag')
}

/** Pastes at the top left of what is marked; one line or cell fills all lines and cells that are marked. */
export function pasteCells(grid: Grid, pasted: Rows): void {
  const { session, reader } = grid.workspace
  const { top, left, bottom, right } = grid.extent
  const rows = filling(pasted, bottom - top + 1, right - left + 1)
  const runIds = top < 0 ? [] : grid.rows.slice(top).map(({ id }) => id)
  const columns = grid.columns.slice(Math.max(0, left))
  const keys = columns.map(({ result, key }) => (result ? null : key))
  session.edit(pasteBlock, { runIds, keys, rows }, newId, reader)
  grid.workspace.failure = leftOutOf(pasted, grid.copied, columns)
}

/** Says which cells had no column to go to; of what was copied here the results are known to stay behind. */
function leftOutOf(pasted: Rows, copied: string, columns: readonly Column[]): string | null {
  const width = pasted.reduce((widest, row) => Math.max(widest, row.length), 0)
  const onResults = columns.slice(0, width).filter(({ result }) => result).length
  const beyond = Math.max(0, width - columns.length)
  const leftOut = beyond + (writeTsv(pasted) === copied ? 0 : onResults)
  if (leftOut === 0) return null
  const columnsOut = leftOut === 1 ? 'One column' : `${leftOut} columns`
  return `${columnsOut} of what was pasted met no column that can be typed in, and ${leftOut === 1 ? 'was' : 'were'} left out. Pasted with a row of names on top, each column goes where it belongs.`
}

type Rows = readonly (readonly string[])[]

function filling(rows: Rows, height: number, width: number): Rows {
  const [only] = rows
  if (rows.length !== 1 || !only || height <= 1) return rows
  const line = only.length === 1 ? Array.from({ length: width }, () => only[0] ?? '') : only
  return Array.from({ length: height }, () => line)
}

function markedIds(grid: Grid): ReadonlySet<string> {
  return new Set(grid.markedRuns().map(({ id }) => id))
}
