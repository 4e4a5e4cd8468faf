/** How numbers are said in a reason, in the units of the reader. */
import type { LimitResult, LimitUnit, Rating } from './result.ts'

/** How numbers are said; the window and the documents pass their own units. */
export interface Words {
  /** A thickness, and what an inch series calls it where it is one of those. */
  thickness(thicknessM: number, nominalThicknessM: number | null): string
  /** A number with its unit; `digits` after the point in SI. */
  quantity(value: number, unit: LimitUnit, digits: number): string
}

/** What reads better than the SI unit: millimetres and kilograms an hour. */
const shownUnits: Readonly<Partial<Record<LimitUnit, { unit: string; per: number }>>> = {
  m: { unit: 'mm', per: 0.001 },
  'kg/s': { unit: 'kg/h', per: 1 / 3600 },
}

/** A value in the unit that it is said in. */
export const shownValue = (value: number, unit: LimitUnit): number =>
  value / (shownUnits[unit]?.per ?? 1)

/** What an inch series calls a thickness: "1.5 in"; the thickness itself differs by pipe. */
export const inchName = (nominalThicknessM: number): string =>
  `${Number((nominalThicknessM / 0.0254).toFixed(3))} in`

export const siWords: Words = {
  thickness: (thicknessM, nominalThicknessM) => {
    const mm = `${Number((thicknessM * 1000).toFixed(1))} mm`
    return nominalThicknessM === null ? mm : `${inchName(nominalThicknessM)} (${mm})`
  },
  quantity: (value, unit, digits) =>
    `${minus(shownValue(value, unit).toFixed(digits))} ${shownUnits[unit]?.unit ?? unit}`,
}

/** A true minus sign, and no sign on a zero. */
function minus(text: string): string {
  return /^-0(\.0*)?$/.test(text) ? text.slice(1) : text.replace('-', '−')
}

export const said = (rung: Rating, words: Words): string =>
  words.thickness(rung.thicknessM, rung.nominalThicknessM)

/** As many digits as tell a value from its bound, at least one. */
function tellingDigits({ value, bound, unit }: LimitResult): number {
  const [shown, shownBound] = [shownValue(value, unit), shownValue(bound, unit)]
  return (
    [1, 2, 3, 4, 5, 6].find((digits) => shown.toFixed(digits) !== shownBound.toFixed(digits)) ?? 6
  )
}

/** A bound that somebody wrote down as a whole number, millimetres kept in metres included. */
const isWhole = (value: number): boolean => Math.abs(value - Math.round(value)) < 1e-9

export function against(limit: LimitResult, words: Words): string {
  const { value, bound, unit } = limit
  const digits = tellingDigits(limit)
  const boundDigits = isWhole(shownValue(bound, unit)) ? 0 : digits
  return `${words.quantity(value, unit, digits)} against ${words.quantity(bound, unit, boundDigits)}`
}
