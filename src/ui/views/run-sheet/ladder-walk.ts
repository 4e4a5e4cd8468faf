/** Walking the rungs with the keyboard, and what a rung says about itself. */
import { governingWords } from '#report/run-words.ts'
import type { Rating, RunDetail, RunResult } from '#sizing/result.ts'
import { formatWithUnit } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'
import { costQuantity, lossOf, lossQuantity, type Per, perOf } from './per.ts'
import { thicknessWords } from './words.ts'

interface Place {
  readonly shown: number | null
  readonly chosen: number | null
  readonly count: number
}

/** Where a key leads: a rung, null for back to the chosen one, undefined where the key is not ours. */
export function walkedTo(key: string, { shown, chosen, count }: Place): number | null | undefined {
  if (count === 0) return undefined
  const from = shown ?? chosen ?? 0
  switch (key) {
    case 'ArrowRight':
    case 'ArrowUp':
      return Math.min(count - 1, from + 1)
    case 'ArrowLeft':
    case 'ArrowDown':
      return Math.max(0, from - 1)
    case 'Home':
      return 0
    case 'End':
      return count - 1
    case 'Escape':
      return null
    default:
      return undefined
  }
}

/** All that the picture says of one rung, as one sentence for a screen reader. */
export function rungWords(
  rung: Rating,
  isChosen: boolean,
  units: UnitSystem,
  per: Per,
  currency: string,
): string {
  const failed = rung.limits.filter(({ pass }) => !pass).map(({ limit }) => governingWords[limit])
  const verdict = failed.length > 0 ? `fails ${[...new Set(failed)].join(', ')}` : 'passes'
  const cost =
    rung.money === null
      ? []
      : [`life-cycle cost ${moneyWords(rung.money.lifeCycle, per, units)} ${currency}`.trim()]
  return [
    `${thicknessWords(rung.thicknessM, units)}${isChosen ? ', chosen' : ''}`,
    verdict,
    lossWords(rung, units),
    `surface ${formatWithUnit(rung.surfaceTempC, 'temperature', units)}`,
    ...cost,
  ].join('; ')
}

/** Loss of a metre, of a square metre where there is none, or of the whole piece. */
export function lossWords(rung: Rating, units: UnitSystem): string {
  return formatWithUnit(lossOf(rung), lossQuantity[perOf(rung)], units)
}

export function moneyWords(value: number, per: Per, units: UnitSystem): string {
  return formatWithUnit(value, costQuantity[per], units)
}

/** The rungs of a result; where its thickness is fixed by hand, among those it could be instead. */
export function wholeLadder(result: RunResult, detail: RunDetail | null): readonly Rating[] {
  const others = detail?.otherRungs ?? []
  const fixed = result.ladder.filter((rung) => rungIndex(others, rung.thicknessM) === null)
  return [...others, ...fixed].toSorted((a, b) => a.thicknessM - b.thicknessM)
}

/** Index of a thickness on the ladder; null where it is not a rung. */
export function rungIndex(
  ladder: readonly Rating[],
  thicknessM: number | undefined,
): number | null {
  const index = ladder.findIndex((rung) => Math.abs(rung.thicknessM - (thicknessM ?? -1)) < 1e-9)
  return index < 0 ? null : index
}
