/** The keys of the schedule while no cell is open. Returns whether the key was for it. */
import {
  addRunBelow,
  clearMarked,
  duplicateMarked,
  moveMarked,
  removeMarked,
  startEditing,
} from './actions.ts'
import type { Grid } from './grid.svelte.ts'

/** Lines that Page Up and Page Down go. */
const pageLines = 15

export function gridKey(grid: Grid, event: KeyboardEvent): boolean {
  if (event.isComposing) return false
  if (event.altKey) return altKey(grid, event)
  const hasControl = event.ctrlKey || event.metaKey
  return (
    (hasControl ? controlKey(grid, event) : move(grid, event) || plainKey(grid, event)) === true
  )
}

function altKey(grid: Grid, { key }: KeyboardEvent): boolean {
  if (key !== 'ArrowUp' && key !== 'ArrowDown') return false
  moveMarked(grid, key === 'ArrowUp' ? -1 : 1)
  return true
}

function move(grid: Grid, { key, shiftKey }: KeyboardEvent): boolean {
  const { activeRow: row, activeColumn: column } = grid
  const steps: Readonly<Record<string, readonly [number, number]>> = {
    ArrowUp: [row - 1, column],
    ArrowDown: [row + 1, column],
    ArrowLeft: [row, column - 1],
    ArrowRight: [row, column + 1],
    PageUp: [row - pageLines, column],
    PageDown: [row + pageLines, column],
    Home: [row, 0],
    End: [row, grid.columns.length - 1],
  }
  const to = steps[key]
  if (to) grid.goTo(to[0], to[1], shiftKey)
  return to !== undefined
}

function plainKey(grid: Grid, { key, shiftKey }: KeyboardEvent): boolean {
  switch (key) {
    case 'Tab':
      return moveAlong(grid, shiftKey ? -1 : 1)
    case 'Enter':
    case 'F2':
      startEditing(grid)
      return true
    case 'Delete':
    case 'Backspace':
      clearMarked(grid)
      return true
    case 'Insert':
      addRunBelow(grid)
      return true
    case 'Escape':
      grid.goTo(grid.activeRow, grid.activeColumn)
      return true
    case ' ':
      if (shiftKey) grid.markLines()
      else startEditing(grid)
      return true
    default:
      if (key.length !== 1) return false
      startEditing(grid, key)
      return true
  }
}

function controlKey(grid: Grid, { key, shiftKey }: KeyboardEvent): boolean {
  switch (key) {
    case 'Home':
      grid.goTo(0, 0, shiftKey)
      return true
    case 'End':
      grid.goTo(grid.rows.length - 1, grid.columns.length - 1, shiftKey)
      return true
    case 'a':
      grid.markAll()
      return true
    case 'd':
      duplicateMarked(grid)
      return true
    case 'Delete':
      removeMarked(grid)
      return true
    default:
      return false
  }
}

/** Along the line; at its end Tab leaves the schedule, so that the keyboard is never caught in it. */
function moveAlong(grid: Grid, step: 1 | -1): boolean {
  const next = grid.activeColumn + step
  if (next < 0 || next >= grid.columns.length) return false
  grid.goTo(grid.activeRow, next)
  return true
}

/** After an open cell was closed by Tab: the next cell that can be typed in, on the next line if need be. */
export function moveAfterTab(grid: Grid, step: 1 | -1): void {
  const last = grid.columns.length - 1
  for (let row = grid.activeRow, column = grid.activeColumn + step; ; column += step) {
    if (column < 0 || column > last) {
      row += step
      column = step > 0 ? 0 : last
    }
    if (!grid.rows[row]) return
    if (grid.columns[column]?.key) {
      grid.goTo(row, column)
      return
    }
  }
}
