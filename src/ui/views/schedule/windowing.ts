/** Which lines of a long list are drawn: those in view and a few beyond, with room kept for the rest. */

export interface Window {
  readonly first: number
  readonly end: number
  readonly abovePx: number
  readonly belowPx: number
}

/** Lines drawn beyond the view, so that none is missing while it scrolls. */
const beyond = 10

export function windowOf(count: number, linePx: number, scrollPx: number, viewPx: number): Window {
  const first = Math.min(
    Math.max(0, Math.floor(scrollPx / linePx) - beyond),
    Math.max(0, count - 1),
  )
  const end = Math.min(count, Math.ceil((scrollPx + viewPx) / linePx) + beyond)
  return { first, end, abovePx: first * linePx, belowPx: (count - end) * linePx }
}

/** Where to scroll so that a line is seen below the head of the table; the place it has if it is seen already. */
export function scrollToSee(
  line: number,
  linePx: number,
  scrollPx: number,
  viewPx: number,
  headPx: number,
): number {
  const top = line * linePx
  if (top < scrollPx) return top
  const lowest = top + linePx + headPx - viewPx
  return Math.max(lowest, scrollPx)
}
