/** The figures that only some runs have: of fittings, months, what arrives and what freezes. */
import type { RunValues } from '#model/fields.ts'
import type { Rating } from '#sizing/result.ts'
import { formatWithUnit } from '#units/format.ts'
import type { QuantityName, UnitSystem } from '#units/quantities.ts'
import { perOf, wholeWord } from './per.ts'

export interface NumberRow {
  readonly name: string
  readonly value: string
  /** What the value is, or what its parts are, in more words. */
  readonly hint?: string
}

export function besides(values: RunValues, shown: Rating, units: UnitSystem): NumberRow[] {
  const whole = wholeWord(values)
  const hasFittings = (shown.fittingsLossW ?? 0) !== 0
  const row = (
    name: string,
    value: number | null,
    quantity: QuantityName,
    hint: string,
  ): NumberRow[] =>
    value === null ? [] : [{ name, value: formatWithUnit(value, quantity, units), hint }]
  return [
    // Of a piece the loss of the whole stands first in the list already.
    ...(perOf(shown) === 'piece'
      ? row('Mean flux', shown.heatFluxWPerM2, 'heatFlux', 'on the outer surface')
      : hasFittings
        ? row(`Whole ${whole}`, shown.heatLossW, 'power', 'with its fittings and supports')
        : []),
    ...(hasFittings
      ? row('Of it, fittings', shown.fittingsLossW, 'power', 'valves, flanges, supports and ends')
      : []),
    ...row(
      'Mean of the year',
      values.monthlyAirC === undefined ? null : shown.yearlyMeanLossW,
      'power',
      `the whole ${whole}, mean of its twelve months`,
    ),
    ...row('Arrives at', shown.arrivalTempC, 'temperature', 'the medium at the end of the run'),
    ...row(
      'Condensate',
      shown.condensateKgPerS,
      'condensate',
      'steam that condenses along the run',
    ),
    ...row('Time to freeze', shown.timeToFreezeH, 'hours', 'standing water, on the coldest day'),
  ]
}
