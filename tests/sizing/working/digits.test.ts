import { describe, expect, test } from 'vitest'
import { printNumber, readNumber, repeats } from '#sizing/working/digits.ts'

describe('printNumber', () => {
  test.each([
    [37.40623, 5, '37.406'],
    [20, 5, '20'],
    [-3.25, 5, '−3.25'],
    [0, 5, '0'],
    [-0, 5, '0'],
    [101325, 6, '101325'],
    [101325, 5, '101330'],
    [9_999_999, 7, '9999999'],
    [12_345_678, 5, '1.2346e7'],
    [0.0001, 5, '0.0001'],
    [0.00009, 5, '9e-5'],
    [1.5e-5, 5, '1.5e-5'],
    [-2e-9, 3, '−2e-9'],
  ])('%d with %d digits', (value, digits, printed) => {
    expect(printNumber(value, digits)).toBe(printed)
    expect(readNumber(printed)).toBeCloseTo(Number(value.toPrecision(digits)), 12)
  })
})

describe('repeats', () => {
  test.each([
    [100.009, 100, true],
    [100.011, 100, false],
    [-100.009, -100, true],
    [100, -100, false],
    [1e-11, 0, true],
    [1e-9, 0, false],
  ])('%d for %d: %s', (again, printed, is) => {
    expect(repeats(again, printed)).toBe(is)
  })
})
