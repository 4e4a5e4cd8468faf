/** The words of the run sheet: bounds, build-up, medium, payback. */
import type { Catalogue } from '#catalogue/types.ts'
import type { RunValues } from '#model/fields.ts'
import { limitQuantities } from '#report/run-words.ts'
import type { LimitResult, LimitUnit, Rating } from '#sizing/result.ts'
import {
  formatNumber,
  formatWithUnit,
  shownValue,
  thicknessDecimals,
  unitLabel,
} from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'

/** Units of what people write down as whole numbers. */
const chosenWhole: ReadonlySet<LimitUnit> = new Set(['°C', 'K', 'h', 'm'])

/** Value or bound of a limit with its unit. */
export function limitNumber(
  value: number,
  unit: LimitUnit,
  system: UnitSystem,
  decimals?: number,
): string {
  const quantity = limitQuantities[unit]
  // Sizes are names rather than results.
  const isSize = unit === 'm' && isWhole(shownValue(value, quantity, system) ?? 0)
  return formatWithUnit(value, quantity, system, decimals ?? (isSize ? 0 : undefined))
}

/** `at most 57.6 °C`, and `at most 650 °C`: a bound that somebody wrote down as a whole number is said as one. */
export function boundWords({ rule, bound, unit }: LimitResult, system: UnitSystem): string {
  const shown = shownValue(bound, limitQuantities[unit], system) ?? 0
  const decimals = chosenWhole.has(unit) && isWhole(shown) ? 0 : undefined
  return `${rule} ${limitNumber(bound, unit, system, decimals)}`
}

const isWhole = (shown: number): boolean => Math.abs(shown - Math.round(shown)) < 1e-6

const lowerFirst = (text: string) => text.charAt(0).toLowerCase() + text.slice(1)

/** Lagging and jacket in words: `stone wool pipe section, aluminium sheet`. */
export function buildUpWords(values: RunValues, catalogue: Catalogue | null): string {
  const named = (list: readonly { id: string; name: string }[] | undefined, id: string) =>
    lowerFirst(list?.find((row) => row.id === id)?.name ?? id.replaceAll('_', ' '))
  const material = (id: string) => named(catalogue?.materials, id)
  const layers = values.layers
    ?.split(';')
    .map((layer) => material(layer.split(':')[0]?.trim() ?? layer))
    .join(', ')
  const lagging = layers ?? (values.material === undefined ? 'lagging' : material(values.material))
  const finish = values.finish === undefined ? [] : [named(catalogue?.finishes, values.finish)]
  return [lagging, ...finish].join('; ')
}

/** A thickness with its unit, to the tenth of a millimetre where it has one. */
export function thicknessWords(thicknessM: number, system: UnitSystem): string {
  return formatWithUnit(thicknessM, 'thickness', system, thicknessDecimals([thicknessM], system))
}

/** How the thickness is made up, where that is not one plain piece: layers, or the name an inch series sells it by. */
export function piecesWords({ piecesM, nominalThicknessM }: Rating, system: UnitSystem): string {
  const each = piecesM.map((pieceM) => thicknessWords(pieceM, system))
  const layers = piecesM.length < 2 ? [] : [`${piecesM.length} layers: ${each.join(' + ')}`]
  return [...layers, ...(nominalThicknessM === null ? [] : [soldAs(nominalThicknessM)])].join('; ')
}

/** What an inch series calls a thickness: `sold as 3 in`. */
export function soldAs(nominalThicknessM: number): string {
  return `sold as ${formatWithUnit(nominalThicknessM, 'thickness', 'us').replace(/\.?0+(?=\D)/, '')}`
}

/** Decimals for a temperature that somebody chose: none where it is a whole number. */
export function wholeDegrees(tempC: number, system: UnitSystem): number {
  return isWhole(shownValue(tempC, 'temperature', system) ?? 0) ? 0 : 1
}

/** Without noughts behind the point: sizes are names rather than results. */
const trimmed = (text: string) => text.replace(/\.0+$/, '')

/** The currency that was said; the shipped prices are in none, which the catalogue calls "units". */
export function currencyWord(currency: string | undefined): string {
  return currency === undefined || currency === 'units' ? '' : currency
}

/** What flows: `steam 7 bar g`, `water`; nothing where it is not said. */
export function mediumWord({ medium, pressureGaugePa }: RunValues, system: UnitSystem): string {
  const name = medium === undefined || medium === 'other' ? '' : medium
  if (pressureGaugePa === undefined) return name
  const shown = shownValue(pressureGaugePa, 'gaugePressure', system) ?? 0
  return `${name} ${trimmed(formatNumber(shown, 1))} ${unitLabel('gaugePressure', system)}`.trim()
}

const years = (count: number) => {
  const rounded = formatNumber(count, 1)
  return `${rounded} ${rounded === '1.0' ? 'year' : 'years'}`
}
const months = (count: number) => `${count} ${count === 1 ? 'month' : 'months'}`

/** `7 months` below two years, `4.2 years` above; `never` where nothing is saved. */
export function paybackWords(paybackYears: number | null): string {
  if (paybackYears === null || paybackYears < 0) return 'never'
  if (paybackYears >= 2) return years(paybackYears)
  return months(Math.max(1, Math.round(paybackYears * 12)))
}

/** The first words of the reason, to be set bold, and the rest: up to and with the first full stop. */
export function splitReason(reason: string): readonly [lead: string, rest: string] {
  const first = /^.*?[.:](?=\s|$)/.exec(reason)?.[0] ?? reason
  return [first, reason.slice(first.length)]
}

/** How much of it there is, and where that is not plain, of what: `24.0 m`, `vessel, shell 2.5 m`, `60.0 m, 0.8 m deep`. */
export function extentWords(values: RunValues, system: UnitSystem): string {
  const { shape, lengthM, areaM2, buryDepthM } = values
  const length = lengthM === undefined ? '' : formatWithUnit(lengthM, 'length', system)
  if (shape === 'sphere') return 'sphere'
  if (shape === 'vessel') return length ? `vessel, shell ${length}` : 'vessel'
  const depth =
    buryDepthM === undefined
      ? ''
      : `${formatWithUnit(buryDepthM, 'length', system, system === 'si' ? 2 : 1)} deep`
  const area = areaM2 === undefined ? '' : formatWithUnit(areaM2, 'area', system)
  return [length || area, depth].filter((words) => words !== '').join(', ')
}
