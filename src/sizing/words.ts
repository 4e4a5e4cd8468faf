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

/** Units of which one decimal tells enough, however small the number. */
const oneDecimal: ReadonlySet<LimitUnit> = new Set(['°C', 'm'])
const MOST_DIGITS = 6

/** Digits that say enough of a value as it is shown: one, or those of three significant figures. */
export function enoughDigits(shown: number, unit: LimitUnit): number {
  if (shown === 0 || oneDecimal.has(unit)) return 1
  return Math.min(MOST_DIGITS, Math.max(1, 2 - Math.floor(Math.log10(Math.abs(shown)))))
}

/** As many digits as tell a value from its bound, at least one. */
function tellingDigits(shown: number, shownBound: number): number {
  return (
    [1, 2, 3, 4, 5].find((digits) => shown.toFixed(digits) !== shownBound.toFixed(digits)) ??
    MOST_DIGITS
  )
}

/** A bound that somebody wrote down as a whole number, millimetres kept in metres included. */
const isWhole = (value: number): boolean => Math.abs(value - Math.round(value)) < 1e-9

/** A value and its bound, each with its unit. */
export function sides(
  { value, bound, unit }: LimitResult,
  words: Words,
): readonly [string, string] {
  const [shown, shownBound] = [shownValue(value, unit), shownValue(bound, unit)]
  const telling = tellingDigits(shown, shownBound)
  const boundDigits = isWhole(shownBound) ? 0 : Math.max(telling, enoughDigits(shownBound, unit))
  return [
    words.quantity(value, unit, Math.max(telling, enoughDigits(shown, unit))),
    words.quantity(bound, unit, boundDigits),
  ]
}

export const against = (limit: LimitResult, words: Words): string =>
  sides(limit, words).join(' against ')
