/** How many digits the numbers of a working need so that each line can be repeated from the lines before it. */
import { MINUS } from './formula.ts'

/** A number as a pocket calculator takes it: plain from 0.0001 to ten millions, else with a power of ten. */
export function printNumber(value: number, digits: number): string {
  const rounded = Number(value.toPrecision(digits))
  if (rounded === 0) return '0'
  const size = Math.abs(rounded)
  const isPlain = size >= 1e-4 && size < 1e7
  const text = isPlain ? plain(size) : exponential(size)
  return rounded < 0 ? MINUS + text : text
}

const plain = (size: number): string =>
  String(size).includes('e') ? size.toFixed(20) : String(size)
const exponential = (size: number): string => size.toExponential().replace('e+', 'e')

export function readNumber(printed: string): number {
  return Number(printed.replace(MINUS, '-'))
}

/** Digits to begin with. */
export const USUAL_DIGITS = 5
/** As many as a floating-point number holds. */
export const MOST_DIGITS = 15

/** A line repeats when it comes out within this share of what is printed, or within nothing at all. */
const REPEATS = 1e-4
const NOTHING = 1e-10

export function repeats(again: number, printed: number): boolean {
  return Math.abs(again - printed) <= Math.max(REPEATS * Math.abs(printed), NOTHING)
}
