/** A run in the words of tables and documents, in either system of units. */
import type { RunValues } from '#model/fields.ts'
import { writeReason } from '#sizing/reason.ts'
import { type Governing, type LimitUnit, limitWords, type RunResult } from '#sizing/result.ts'
import { inchName, type Words } from '#sizing/words.ts'
import { formatQuantity, formatWithUnit } from '#units/format.ts'
import type { QuantityName, UnitSystem } from '#units/quantities.ts'
import { inSentence } from '#units/restate.ts'

/** One run and its answer; the values are those it was sized with, the defaults of the job included. */
export interface SizedRun {
  readonly values: RunValues
  readonly result: RunResult
}

export const governingWords: Readonly<Record<Governing, string>> = {
  ...limitWords,
  money: 'Cost',
  smallest: 'Thinnest',
  fixed: 'Fixed',
  bare: 'Bare',
  unmet: 'Unmet',
}

/** Whether every limit of the run is met by what is chosen. */
export function meetsLimits({ chosen }: RunResult): boolean {
  return chosen?.pass ?? false
}

/** Whether there is a limit at all that the chosen rung was judged by. */
export function isJudged({ limits }: RunResult): boolean {
  return limits.length > 0
}

/** What decided, and whether it is not enough: "Touch", "Unmet", "Fixed, fails". */
export function governedBy(result: RunResult): string {
  const word = governingWords[result.governing]
  return meetsLimits(result) || result.governing === 'unmet' ? word : `${word}, fails`
}

/** The size as it was given, else its measures: "DN 80", "600 × 400", "Ø 500", "26.0 m²". */
export function sizeWords(values: RunValues, system: UnitSystem): string {
  const { size, widthM, heightM, outerDiameterM, areaM2 } = values
  if (size !== undefined) return size
  if (widthM !== undefined && heightM !== undefined) {
    return `${sizeNumber(widthM, system)} × ${sizeNumber(heightM, system)}`
  }
  if (outerDiameterM !== undefined) return `Ø ${sizeNumber(outerDiameterM, system)}`
  return formatWithUnit(areaM2, 'area', system)
}

function sizeNumber(sizeM: number, system: UnitSystem): string {
  return formatQuantity(sizeM, 'size', system, 1).replace(/\.0$/, '')
}

/** The reason in the units of the reader. */
export function reasonWords(result: RunResult, system: UnitSystem): string {
  return system === 'si' ? result.reason : writeReason(result, usWords)
}

/** What a limit is judged in, as a quantity that is shown in either system. */
export const limitQuantities: Readonly<Record<LimitUnit, QuantityName>> = {
  '°C': 'temperature',
  K: 'temperatureDifference',
  'W/m': 'heatLossPerLength',
  'W/m²': 'heatFlux',
  h: 'hours',
  m: 'size',
  'kg/s': 'condensate',
  'm²K/W': 'resistance',
}
/** Inches and resistances tell nothing apart with one decimal. */
const fewestDecimals: Readonly<Partial<Record<QuantityName, number>>> = { size: 2, resistance: 2 }

const usWords: Words = {
  thickness: (thicknessM, nominalThicknessM) => {
    const actual = formatWithUnit(thicknessM, 'thickness', 'us')
    return nominalThicknessM === null ? actual : `${inchName(nominalThicknessM)} (${actual})`
  },
  quantity: (value, unit, digits) => {
    const quantity = limitQuantities[unit]
    // A bound that is round in SI is not so here.
    return inSentence(value, quantity, 'us', Math.max(fewestDecimals[quantity] ?? 1, digits))
  },
}
