/** Reads twelve monthly means of the air, January first: `2;3;6;9;…`. */

export type MonthlyAir = readonly number[]

export type MonthlyAirText =
  | { readonly ok: true; readonly monthsC: MonthlyAir }
  | { readonly ok: false; readonly allowed: string }

const MONTHS = 12
const COLDEST_C = -70
const HOTTEST_C = 200

/** Separators are spaces or semicolons; a comma is a decimal comma where no point stands, else a separator. */
export function parseMonthlyAir(text: string): MonthlyAirText {
  const parts =
    text.includes(';') || /\d\s+[-−\d]/.test(text) ? text.split(/[;\s]+/) : text.split(',')
  const monthsC = parts
    .map((part) => part.trim().replace('−', '-').replace(',', '.'))
    .filter((part) => part !== '')
    .map((part) => (/^[-+]?\d+(\.\d+)?$/.test(part) ? Number(part) : Number.NaN))
  const isRight =
    monthsC.length === MONTHS && monthsC.every((tempC) => tempC >= COLDEST_C && tempC <= HOTTEST_C)
  if (isRight) return { ok: true, monthsC }
  return {
    ok: false,
    allowed: `twelve mean temperatures of the air in °C, January first, separated by semicolons, each from −70 to ${HOTTEST_C}, e.g. 2;3;6;9;13;16;18;18;15;10;6;3`,
  }
}
