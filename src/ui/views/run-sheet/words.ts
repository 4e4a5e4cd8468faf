/** The words of the run sheet: limits, bounds, build-up, and what the drawings say to who cannot see them. */
import type { Catalogue } from '#catalogue/types.ts'
import type { RunValues } from '#model/fields.ts'
import type { Governing, LimitName, LimitResult, Rating } from '#sizing/result.ts'
import { formatNumber, formatWithUnit } from '#units/format.ts'
import type { QuantityName, UnitSystem } from '#units/quantities.ts'

export const limitWords: Readonly<Record<LimitName, string>> = {
  touch: 'Touch',
  loss: 'Loss',
  damp: 'Damp',
  frost: 'Frost',
  arrival: 'Arrival',
  code: 'Code',
  space: 'Space',
  service: 'Service',
}

export const governingWords: Readonly<Record<Governing, string>> = {
  ...limitWords,
  money: 'Cost',
  smallest: 'Thinnest',
  fixed: 'Fixed',
  bare: 'Bare',
  unmet: 'Unmet',
}

/** Quantities of the units in which limits are judged. */
const quantityOfUnit: Readonly<Record<string, QuantityName>> = {
  '°C': 'temperature',
  C: 'temperature',
  K: 'temperatureDifference',
  'W/m': 'heatLossPerLength',
  'W/m²': 'heatFlux',
  'W/m2': 'heatFlux',
  m: 'size',
  h: 'hours',
}

/** Value or bound of a limit with its unit. */
export function limitNumber(value: number, unit: string, system: UnitSystem): string {
  const quantity = quantityOfUnit[unit]
  return quantity
    ? formatWithUnit(value, quantity, system)
    : `${formatNumber(value, 2)} ${unit}`.trim()
}

/** `at most 58.0 °C`. */
export function boundWords(limit: LimitResult, system: UnitSystem): string {
  return `${isCeiling(limit) ? 'at most' : 'at least'} ${limitNumber(limit.bound, limit.unit, system)}`
}

/** Whether the bound is an upper one; for service both exist, and the verdict tells which. */
function isCeiling({ limit, pass, value, bound }: LimitResult): boolean {
  if (limit === 'service' && value !== bound) return pass === value < bound
  return limit !== 'damp' && limit !== 'frost' && limit !== 'code'
}

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

/** `in 2 layers, 40 + 40 mm`; empty for a single piece. */
export function piecesWords({ piecesM }: Rating, system: UnitSystem): string {
  if (piecesM.length < 2) return ''
  const each = piecesM.map((pieceM) => formatWithUnit(pieceM, 'thickness', system))
  return `${piecesM.length} layers: ${each.join(' + ')}`
}

/** What flows: `steam`, else nothing. */
export function mediumWord({ medium }: RunValues): string {
  return medium === undefined || medium === 'other' ? '' : medium
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
