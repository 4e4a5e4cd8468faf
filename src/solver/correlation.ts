import type { SourceKey } from './sources.ts'

/** Closed range of one input, in the input's own unit. */
export type Range = readonly [from: number, to: number]

/** Where an empirical formula comes from and where it holds; data, so that others can read it. */
export interface Pedigree<Inputs> {
  readonly name: string
  readonly source: SourceKey
  readonly equation: string
  readonly valid: { readonly [I in keyof Inputs]?: Range }
}

export type Correlation<Inputs> = ((inputs: Inputs) => number) & {
  readonly pedigree: Pedigree<Inputs>
}

/** Binds a formula to its source and range. The formula itself never clamps, rounds, warns or throws. */
export function correlation<Inputs extends object>(
  pedigree: Pedigree<Inputs>,
  evaluate: (inputs: Inputs) => number,
): Correlation<Inputs> {
  return Object.assign(evaluate, { pedigree })
}

/** One sentence for each input outside the range of a formula; empty inside. */
export function outOfRange<Inputs extends object>(
  formula: Correlation<Inputs>,
  inputs: Inputs,
): string[] {
  const { name, valid } = formula.pedigree
  const sentences: string[] = []
  for (const key of Object.keys(valid) as (keyof Inputs & string)[]) {
    const range = valid[key]
    const value = inputs[key]
    if (!range || typeof value !== 'number') continue
    if (value < range[0] || value > range[1]) {
      sentences.push(
        `${name}: ${symbols[key] ?? key} ${short(value)} is outside its range ${short(range[0])} to ${short(range[1])}; the formula was used beyond it.`,
      )
    }
  }
  return sentences
}

const symbols: Readonly<Record<string, string>> = {
  rayleigh: 'Rayleigh number',
  reynolds: 'Reynolds number',
  prandtl: 'Prandtl number',
  peclet: 'Re·Pr',
  differenceK: 'temperature difference in K',
  windMPerS: 'wind in m/s',
  airC: 'air temperature in °C',
}

/** To three digits, for a sentence: 0.71, −10, 8 × 10⁶. */
export function short(value: number): string {
  const [mantissa = '', exponent = '0'] = value.toExponential(2).split('e')
  const power = Number(exponent)
  const text =
    value !== 0 && Math.abs(power) >= 6
      ? `${Number(mantissa)} × 10${superscript(power)}`
      : String(Number(value.toPrecision(3)))
  return text.replace('-', '−')
}

const superscript = (power: number): string =>
  [...String(power)].map((digit) => superscripts[digit] ?? digit).join('')
const superscripts: Readonly<Record<string, string>> = Object.fromEntries(
  [...'-0123456789'].map((digit, index) => [digit, [...'⁻⁰¹²³⁴⁵⁶⁷⁸⁹'][index] ?? digit]),
)
