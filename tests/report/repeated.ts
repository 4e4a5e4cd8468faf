/** Repeats the lines of a printed section with a calculator that knows only the page. */
import type { Section } from '#sizing/working/types.ts'
import { calculate } from './calculator.ts'
import { numberOf, type PageSection } from './working-page.ts'

/** A line repeats within so much of what is printed, or comes to nothing as it does. */
const REPEATS = 5e-4
const NOTHING = 1e-9

export const agrees = (again: number, printed: number): boolean =>
  Math.abs(again - printed) <= Math.max(REPEATS * Math.abs(printed), NOTHING)

export interface Repeated {
  /** Lines that do not come out as printed, or use other numbers than those above them, in words. */
  readonly wrong: readonly string[]
  /** How many lines had a formula. */
  readonly formulas: number
}

export function repeated({ title, lines }: PageSection): Repeated {
  const known = new Map<string, number>()
  const wrong: string[] = []
  let formulas = 0
  for (const { symbol, parts, text } of lines) {
    const printed = numberOf(parts.at(-1) ?? '')
    if (!Number.isFinite(printed)) wrong.push(`${title}: ${text}: not a number`)
    if (known.has(symbol)) wrong.push(`${title}: ${symbol} stands twice`)
    const [formula, numbers] = parts.slice(0, -1)
    if (formula !== undefined) {
      formulas += 1
      const fromSymbols = calculate(formula, known)
      const fromNumbers = numbers === undefined ? fromSymbols : calculate(numbers)
      const isSame = Math.abs(fromSymbols - fromNumbers) <= 1e-12 * Math.abs(fromNumbers)
      if (!isSame) wrong.push(`${title}: ${text}: other numbers than printed above`)
      if (!agrees(fromNumbers, printed)) wrong.push(`${title}: ${text}: comes to ${fromNumbers}`)
    }
    known.set(symbol, printed)
  }
  return { wrong, formulas }
}

/** Rounding apart, a formula is the program's own: with unrounded numbers it comes to the value much nearer than print. */
const EXACT = 1e-7

/** Lines whose formula does not come to their value with unrounded numbers, in words. */
export function inexact({ title, steps }: Section): string[] {
  return steps.flatMap(({ symbol, formula, inputs, value }) => {
    if (formula === null) return []
    const known = new Map(inputs.map((input) => [input.symbol, input.value]))
    const again = calculate(formula, known)
    const isExact = Math.abs(again - value) <= Math.max(EXACT * Math.abs(value), NOTHING)
    return isExact ? [] : [`${title}: ${symbol} = ${formula}: ${again}, not ${value}`]
  })
}
