/** The schedule by mouse and by clipboard. */
import { clearMarked, copyMarked, pasteText, startEditing } from './actions.ts'
import type { Showing } from './cell-view.ts'
import type { Grid } from './grid.svelte.ts'

/** Row and column of the cell that an event belongs to; null beside them. */
function placeOf({ target }: Event): readonly [number, number] | null {
  const cell = target instanceof Element ? target.closest('td') : null
  const { row, column } = cell?.dataset ?? {}
  return row === undefined || column === undefined ? null : [Number(row), Number(column)]
}

/** Goes to the cell pointed at; with Shift marks up to it. Returns whether there was one. */
export function pointAt(grid: Grid, event: PointerEvent): boolean {
  const place = placeOf(event)
  if (!place || event.target instanceof HTMLInputElement) return false
  grid.goTo(...place, event.shiftKey)
  return true
}

export function dragOver(grid: Grid, event: PointerEvent): void {
  const isDragging = (event.buttons & 1) === 1 && !grid.editing
  const place = isDragging ? placeOf(event) : null
  if (place) grid.goTo(...place, true)
}

export function openAt(grid: Grid, event: MouseEvent): void {
  if (placeOf(event)) startEditing(grid)
}

export function copyFrom(grid: Grid, event: ClipboardEvent, showing: Showing): void {
  event.clipboardData?.setData('text/plain', copyMarked(grid, showing))
  event.preventDefault()
}

export function cutFrom(grid: Grid, event: ClipboardEvent, showing: Showing): void {
  copyFrom(grid, event, showing)
  clearMarked(grid)
}

export function pasteInto(grid: Grid, event: ClipboardEvent): void {
  pasteText(grid, event.clipboardData?.getData('text/plain') ?? '')
  event.preventDefault()
}
