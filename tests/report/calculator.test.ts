import { describe, expect, test } from 'vitest'
import { calculate } from './calculator.ts'

describe('the calculator of the tests', () => {
  test.each([
    ['1 + 2 × 3', 7],
    ['(1 + 2) × 3', 9],
    ['8 − 3 − 2', 3],
    ['16 / 4 / 2', 2],
    ['2^3^2', 512],
    ['−2^2', -4],
    ['2^(−1)', 0.5],
    ['3 × (−2)', -6],
    ['(−2)^2', 4],
    ['1e-3 × 2.5e2', 0.25],
    ['max(1, 2 + 3, 4) − min(2, 1)', 4],
    ['sqrt(9) + cbrt(27) + abs(−1) + ln(exp(2))', 9],
    ['4 × π', 4 * Math.PI],
    ['(1 + (0.5 × 2)^(1 / 2))^2', 4],
  ])('%s', (formula, value) => {
    expect(calculate(formula)).toBeCloseTo(value, 12)
  })

  test('puts numbers for symbols', () => {
    const known = new Map([
      ['λ_1', 0.05],
      ['F_1', 0.1],
    ])
    expect(calculate('F_1 / λ_1', known)).toBe(2)
  })

  test.each(['2 +', '(1', '1)', '2 3', 'x + 1', '2 ~ 3', ''])('refuses %j', (formula) => {
    expect(() => calculate(formula)).toThrow()
  })
})
