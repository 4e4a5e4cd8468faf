/** Numbers as people read them: fixed decimals, true minus, thin spaces between thousands, a dash for what is absent. */
import { displayUnit, type QuantityName, type UnitSystem } from './quantities.ts'

/** Stands where there is no value. */
export const ABSENT = '–'

const MINUS = '\u2212'
/** Narrow no-break space: a thin space at which no line breaks. */
const THIN_SPACE = '\u202f'
/** Between a number and its unit. */
const UNIT_SPACE = '\u00a0'

type Maybe = number | null | undefined

/** A number with fixed decimals: `−1 234.5`; `–` for null, undefined and what is not finite. */
export function formatNumber(value: Maybe, decimals: number): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return ABSENT
  const [whole = '', fraction] = Math.abs(value).toFixed(decimals).split('.')
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE)
  const digits = fraction === undefined ? grouped : `${grouped}.${fraction}`
  // What rounds to nought has no sign.
  return value < 0 && /[1-9]/.test(digits) ? MINUS + digits : digits
}

/** The number alone, for columns whose header carries the unit. */
export function formatQuantity(
  value: Maybe,
  quantity: QuantityName,
  system: UnitSystem,
  decimals = displayUnit(quantity, system).decimals,
): string {
  return formatNumber(shownValue(value, quantity, system), decimals)
}

/** The number with its unit, which never part at the end of a line; the dash alone where the value is absent. */
export function formatWithUnit(
  value: Maybe,
  quantity: QuantityName,
  system: UnitSystem,
  decimals?: number,
): string {
  const number = formatQuantity(value, quantity, system, decimals)
  const label = unitLabel(quantity, system)
  return number === ABSENT || label === '' ? number : `${number}${UNIT_SPACE}${label}`
}

export function unitLabel(quantity: QuantityName, system: UnitSystem): string {
  return displayUnit(quantity, system).label
}

/** The value in the unit it is shown in; absent stays absent. */
export function shownValue(
  value: Maybe,
  quantity: QuantityName,
  system: UnitSystem,
): number | null {
  if (value === null || value === undefined) return null
  const { size, zero } = displayUnit(quantity, system)
  return value / size + zero
}

/** The stored value of what is shown: the way back of `shownValue`. */
export function storedValue(shown: number, quantity: QuantityName, system: UnitSystem): number {
  const { size, zero } = displayUnit(quantity, system)
  return (shown - zero) * size
}

/** Decimals for a column of thicknesses: one where an inch series in millimetres would lose its tenths. */
export function thicknessDecimals(thicknessesM: readonly Maybe[], system: UnitSystem): number {
  const { decimals } = displayUnit('thickness', system)
  const hasTenths = thicknessesM.some((thicknessM) => {
    const tenths = Math.round((shownValue(thicknessM, 'thickness', 'si') ?? 0) * 10)
    return tenths % 10 !== 0
  })
  return system === 'si' && hasTenths ? decimals + 1 : decimals
}
