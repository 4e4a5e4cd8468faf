import { describe, expect, test } from 'vitest'
import { evaluate, isSymbol, symbolsOf, tokensOf, withNumbers } from '#sizing/working/formula.ts'

const none = (): number => Number.NaN

describe('evaluate', () => {
  test.each([
    ['1 + 2 × 3', 7],
    ['(1 + 2) × 3', 9],
    ['8 − 3 − 2', 3],
    ['16 / 4 / 2', 2],
    ['2^3^2', 512],
    ['−2^2', -4],
    ['2^(−1)', 0.5],
    ['2^−1', 0.5],
    ['3 × (−2)', -6],
    ['1e-3 × 2.5e2', 0.25],
    ['max(1, 2 + 3, 4) − min(2, 1)', 4],
    ['sqrt(9) + cbrt(27) + abs(−1) + ln(exp(2))', 9],
    ['2 × π', 2 * Math.PI],
  ])('%s', (formula, value) => {
    expect(evaluate(formula, none)).toBeCloseTo(value, 12)
  })

  test('takes the numbers of symbols', () => {
    const known: Readonly<Record<string, number>> = { λ_1: 0.05, F: 0.1 }
    expect(evaluate('F / λ_1', (symbol) => known[symbol] ?? Number.NaN)).toBe(2)
  })
})

describe('the signs of a formula', () => {
  test('are told apart', () => {
    expect(tokensOf('1e-6 × (μ_w / 2.5)^0.4')).toEqual([
      '1e-6',
      '×',
      '(',
      'μ_w',
      '/',
      '2.5',
      ')',
      '^',
      '0.4',
    ])
  })

  test('are refused where they are none', () => {
    expect(() => tokensOf('2 * 3')).toThrow('2 * 3')
  })

  test.each([
    ['θ_s', true],
    ['Ra', true],
    ['e', true],
    ['π', false],
    ['ln', false],
    ['2', false],
    ['(', false],
  ])('%s as a symbol: %s', (text, is) => {
    expect(isSymbol(text)).toBe(is)
  })

  test('symbols are given once, in order', () => {
    expect(symbolsOf('h_c × (θ_s − θ_a) + max(h_c, π, 1e-3)')).toEqual(['h_c', 'θ_s', 'θ_a'])
  })
})

describe('withNumbers', () => {
  const printed: Readonly<Record<string, string>> = {
    a: '2',
    b: '−3',
    ν: '1.5e-5',
    e: '0.2',
  }
  const put = (formula: string): string =>
    withNumbers(formula, (symbol) => printed[symbol] ?? symbol)

  test.each([
    ['a × b', '2 × (−3)'],
    ['a / ν^2 + ν', '2 / (1.5e-5)^2 + 1.5e-5'],
    ['1e-6 × e', '1e-6 × 0.2'],
    ['max(a, 0) × π', 'max(2, 0) × π'],
    ['2.5e2 + a', '2.5e2 + 2'],
  ])('%s becomes %s', (formula, numbers) => {
    expect(put(formula)).toBe(numbers)
  })
})
