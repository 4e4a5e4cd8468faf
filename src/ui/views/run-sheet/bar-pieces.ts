/** One stretch of a limit's bar: where it lies, what it says and where the words have room. */
import { formatNumber, shownValue, unitLabel } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'
import type { PassStretch } from './limit-bars.ts'

/** Mean width of a letter at the size of the words [px]. */
const LETTER = 6
const PADDING = 6

export interface BarPiece {
  readonly x: number
  readonly width: number
  readonly words: string
  readonly wordsX: number
  /** Words that do not fit stand before the bar, or after it where it begins at the very left. */
  readonly isBefore: boolean
}

interface Field {
  readonly x: (thicknessM: number) => number
  readonly left: number
  readonly right: number
  /** Uprights the words should not cross. */
  readonly uprights: readonly number[]
  readonly units: UnitSystem
}

export function barPiece({ fromM, toM }: PassStretch, field: Field): BarPiece {
  const start = fromM === null ? field.left : Math.max(field.left, field.x(fromM))
  const end = toM === null ? field.right : Math.min(field.right, field.x(toM))
  const words = stretchWords(fromM, toM, field.units)
  const width = Math.max(3, end - start)
  const length = words.length * LETTER
  const wordsX = clearOf(field.uprights, start + PADDING, length)
  const isOutside = width < length + PADDING
  const isBefore = isOutside && start - PADDING - length >= field.left
  const afterX = clearOf(field.uprights, start + width + PADDING, length)
  const insideX = wordsX + length <= end ? wordsX : start + PADDING
  return {
    x: start,
    width,
    words,
    isBefore,
    wordsX: isBefore ? start - PADDING : isOutside ? afterX : insideX,
  }
}

/** Moves words to the right of any upright that would run through them. */
function clearOf(uprights: readonly number[], x: number, length: number): number {
  return uprights
    .toSorted((a, b) => a - b)
    .reduce(
      (at, upright) => (upright > at - 3 && upright < at + length ? upright + PADDING : at),
      x,
    )
}

function stretchWords(fromM: number | null, toM: number | null, units: UnitSystem): string {
  const from = fromM === null ? '' : inwards(fromM, Math.ceil, units)
  const to = toM === null ? '' : inwards(toM, Math.floor, units)
  if (from && to) return `${from} to ${to}`
  if (from) return `passes from ${from}`
  return to ? `passes to ${to}` : 'passes throughout'
}

/** Rounded into the stretch, so that the figure itself passes: tenths of a millimetre, hundredths of an inch. */
function inwards(thicknessM: number, round: (value: number) => number, units: UnitSystem): string {
  const scale = units === 'si' ? 10 : 100
  const shown = (shownValue(thicknessM, 'thickness', units) ?? 0) * scale
  // A rung is exact but for the last bits of its binary number.
  const inside =
    (Math.abs(shown - Math.round(shown)) < 1e-6 ? Math.round(shown) : round(shown)) / scale
  const decimals = units === 'us' ? 2 : Number.isInteger(inside) ? 0 : 1
  return `${formatNumber(inside, decimals)}\u00a0${unitLabel('thickness', units)}`
}
