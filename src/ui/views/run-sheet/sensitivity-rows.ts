/** What each input does to the answer, as lines of a table: one for each end of its range. */
import type { Rating, Sensitivity, SensitivityEnd, SensitivityInput } from '#sizing/result.ts'
import { formatNumber, formatQuantity } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'
import { inSentence } from '#units/restate.ts'
import { lossOf } from './per.ts'
import { thicknessWords } from './words.ts'

export interface SensitivityLine {
  /** `+5 K`. */
  readonly moved: string
  /** Of the yearly cost, or of the loss where no cost is weighed: `+3.1 %`. */
  readonly share: string
  /** The same from -1 to 1, of the largest change in the table. */
  readonly bar: number
  readonly surface: string
  /** What would be taken then. */
  readonly taken: string
  readonly isOther: boolean
  /** What is laid as chosen fails then. */
  readonly fails: boolean
}

export interface SensitivityGroup {
  readonly name: string
  readonly lines: readonly SensitivityLine[]
}

const names: Readonly<Record<SensitivityInput, string>> = {
  medium: 'Medium',
  air: 'Air',
  wind: 'Wind',
  emissivity: 'Emissivity',
  conductivity: 'Conductivity',
  thickness: 'Thickness laid',
  'fuel price': 'Fuel price',
  hours: 'Hours a year',
  humidity: 'Humidity',
}

/** Whether the changes are told of the yearly cost of the energy; else of the loss. */
export function isOfCost(base: Rating): boolean {
  return (base.money?.energyPerYear ?? 0) !== 0
}

export function sensitivityGroups(
  sensitivity: readonly Sensitivity[],
  base: Rating,
  units: UnitSystem,
): readonly SensitivityGroup[] {
  const share = (end: SensitivityEnd) => shareOf(end, base)
  const largest = Math.max(
    1e-9,
    ...sensitivity.flatMap(({ ends }) => ends.map((end) => Math.abs(share(end)))),
  )
  return sensitivity.map(({ input, unit, ends }) => ({
    name: names[input],
    lines: ends.map((end) => ({
      moved: movedWords(end.change, unit, units),
      share: `${signed(share(end) * 100, 1)}\u00a0%`,
      bar: share(end) / largest,
      surface: signedText(formatQuantity(end.surfaceChangeK, 'temperatureDifference', units)),
      taken: takenWords(end, units),
      isOther: !isSame(end.chosenThicknessM, base.thicknessM),
      fails: !end.passes,
    })),
  }))
}

/** Of nothing, no share can be told. */
function shareOf(end: SensitivityEnd, base: Rating): number {
  const { energyPerYearChange, heatFlowChangeWPerUnit } = end
  const ofCost = isOfCost(base) && energyPerYearChange !== null
  const change = ofCost ? energyPerYearChange : heatFlowChangeWPerUnit
  const whole = ofCost ? (base.money?.energyPerYear ?? 0) : (lossOf(base) ?? 0)
  // Of a gain, more of it is more.
  return whole === 0 ? 0 : change / whole
}

const isSame = (a: number | null, b: number): boolean => a !== null && Math.abs(a - b) < 1e-9

function takenWords({ chosenThicknessM }: SensitivityEnd, units: UnitSystem): string {
  if (chosenThicknessM === null) return 'none passes'
  return chosenThicknessM === 0 ? 'bare' : thicknessWords(chosenThicknessM, units)
}

function movedWords(change: number, unit: Sensitivity['unit'], units: UnitSystem): string {
  switch (unit) {
    case 'K':
      return signedText(inSentence(change, 'temperatureDifference', units, 0))
    case 'm/s':
      return signedText(inSentence(change, 'speed', units))
    case 'share':
      return `${signed(change * 100, 0)}\u00a0%`
    case 'fraction':
      return signed(change, 2)
  }
}

const signed = (value: number, decimals: number): string =>
  signedText(formatNumber(value, decimals))
const signedText = (text: string): string =>
  /^[\d]/.test(text) && /[1-9]/.test(text) ? `+${text}` : text
