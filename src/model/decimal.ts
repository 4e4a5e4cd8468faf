/**
 * Numbers as people write them, and moving the decimal point in the text instead of multiplying: 60.3 mm becomes
 * exactly the double nearest to 0.0603, which 60.3 * 0.001 is not, and so the way back gives 60.3 again.
 */

/** Longer than any number needs to be. */
const longestNumber = 400
const spaces = /[ \u00a0\u2007\u2009\u202f]/g
const dashes = /[\u2010-\u2013\u2212]/g
const plainNumber = /^([+-]?)(\d+(?:\.\d*)?|\.\d+)(?:e([+-]?\d+))?$/i
const groupedNumber = /^[+-]?\d{1,3}(?: \d{3})+(?:\.\d+)?$/

/** Whether the text is a number whose one `mark` could as well part thousands: 1.500 or 1,500, but not 0,500. */
export function couldBeThousands(text: string, mark: '.' | ','): boolean {
  if (text.length > longestNumber) return false
  const [whole, ...groups] = text.trim().replace(/^[+-]/, '').split(mark)
  return (
    groups.length > 0 &&
    /^[1-9]\d{0,2}$/.test(whole ?? '') &&
    groups.every((group) => /^\d{3}$/.test(group))
  )
}

/** The number a person wrote, times ten to the power `shift`; null where the text is no finite number. */
export function readDecimal(
  text: string,
  { decimalComma = false, shift = 0 }: { decimalComma?: boolean; shift?: number } = {},
): number | null {
  if (text.length > longestNumber) return null
  let plain = text.trim().replace(spaces, ' ').replace(dashes, '-')
  if (decimalComma && !plain.includes('.')) plain = plain.replace(',', '.')
  if (groupedNumber.test(plain)) plain = plain.replaceAll(' ', '')
  const match = plainNumber.exec(plain)
  if (!match) return null
  const [, sign, digits, exponent = '0'] = match
  const value = Number(`${sign}${digits}e${Number(exponent) + shift}`)
  return Number.isFinite(value) ? value : null
}

/** The shortest decimal text of a finite number times ten to the power `shift`; `readDecimal` gives the number back. */
export function writeDecimal(value: number, shift = 0): string {
  const match = /^(-?)(\d+)(?:\.(\d+))?(?:e([+-]\d+))?$/.exec(String(value))
  if (!match) throw new RangeError(`${value} is not a finite number`)
  const [, sign = '', whole = '', fraction = '', exponent = '0'] = match
  const digits = (whole + fraction).replace(/^0+/, '')
  if (digits === '') return '0'
  // The value is 0.digits * 10^point.
  const point = digits.length - fraction.length + Number(exponent) + shift
  return sign + placePoint(digits.replace(/0+$/, ''), point)
}

function placePoint(digits: string, point: number): string {
  if (point > 21 || point < -6)
    return `${digits[0]}${digits.length > 1 ? '.' : ''}${digits.slice(1)}e${point - 1}`
  if (point <= 0) return `0.${'0'.repeat(-point)}${digits}`
  if (point >= digits.length) return digits + '0'.repeat(point - digits.length)
  return `${digits.slice(0, point)}.${digits.slice(point)}`
}
