/** Sentences that were written in SI, said again in the units on the screen. */
import { formatQuantity, formatWithUnit } from './format.ts'
import type { QuantityName, UnitSystem } from './quantities.ts'

/** Units as they are written after numbers in reasons and notes; the longest first, so that `W/m²K` is not `W/m`. */
const written: readonly (readonly [unit: string, quantity: QuantityName])[] = [
  ['m²K/W', 'resistance'],
  ['W/m²K', 'filmCoefficient'],
  ['W/mK', 'conductivity'],
  ['W/m²', 'heatFlux'],
  ['W/m', 'heatLossPerLength'],
  ['J/kgK', 'heatCapacity'],
  ['kg/s', 'massFlow'],
  ['kg/h', 'condensate'],
  ['m/s', 'speed'],
  ['bar g', 'gaugePressure'],
  ['°C', 'temperature'],
  ['mm', 'thickness'],
  ['m²', 'area'],
  ['K', 'temperatureDifference'],
  ['m', 'length'],
]
const quantityOf = new Map(written)

const number = '[\\u2212-]?\\d(?:[\\d\\u2009\\u202f]*\\d)?(?:\\.\\d+)?'
const joint = '(?: and | to | or | \\+ |–)'
const units = written.map(([unit]) => unit).join('|')
/** One number or several that share a unit: `52.7 °C`, `40 and 60 mm`. */
const measured = new RegExp(
  `(?<![\\w.])((?:${number}${joint})*${number})[ \\u00a0](${units})(?![\\w²/])`,
  'g',
)
const eachNumber = new RegExp(`${number}(${joint})?`, 'g')

/** In SI only the space before a unit is made unbreakable; in US units every number with a unit is converted. */
export function restated(text: string, system: UnitSystem): string {
  return text.replace(measured, (all: string, numbers: string, unit: string) => {
    const quantity = quantityOf.get(unit)
    if (!quantity || system === 'si') return `${numbers}\u00a0${unit}`
    return numbers.replace(eachNumber, (match: string, joint = '') => {
      const value = Number(
        match
          .slice(0, match.length - joint.length)
          .replaceAll(/[\u2009\u202f]/g, '')
          .replace('\u2212', '-'),
      )
      return Number.isFinite(value)
        ? `${inSentence(value * siSize(unit), quantity, system)}${joint}`
        : all
    })
  })
}

/** A quantity in running text, which says by itself that a difference of temperatures is one. */
export function inSentence(
  value: number,
  quantity: QuantityName,
  system: UnitSystem,
  decimals?: number,
): string {
  return system === 'us' && quantity === 'temperatureDifference'
    ? `${formatQuantity(value, quantity, system, decimals)}\u00a0°F`
    : formatWithUnit(value, quantity, system, decimals)
}

function siSize(unit: string): number {
  return sizes.get(unit) ?? 1
}

const sizes: ReadonlyMap<string, number> = new Map([
  ['mm', 0.001],
  ['bar g', 1e5],
  ['kg/h', 1 / 3600],
])
