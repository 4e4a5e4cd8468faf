import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { annuityFactor, presentValueFactor } from '#money/present-value.ts'
import { type PublishedRow, published } from '../published.ts'

const sum = (discount: number, growth: number, lifeYears: number): number => {
  let total = 0
  for (let year = 1; year <= lifeYears; year += 1) total += ((1 + growth) / (1 + discount)) ** year
  return total
}

type Terms = { readonly discount: number; readonly lifeYears: number }
const table = (
  from: string,
  rows: readonly (readonly [discount: number, lifeYears: number, printed: string])[],
): PublishedRow<Terms>[] =>
  rows.map(([discount, lifeYears, printed]) => ({ from, given: { discount, lifeYears }, printed }))

describe('the present value of equal payments', () => {
  published(
    (terms: Terms) => presentValueFactor({ ...terms, growth: 0 }),
    table('compound-interest tables, (P/A, i, n) (from memory)', [
      [0.01, 10, '9.4713'],
      [0.05, 10, '7.7217'],
      [0.05, 20, '12.4622'],
      [0.08, 15, '8.5595'],
      [0.1, 10, '6.1446'],
      [0.1, 20, '8.5136'],
      [0.12, 5, '3.6048'],
      [0.15, 8, '4.4873'],
    ]),
  )
})

describe('the recovery of a capital', () => {
  published(
    annuityFactor,
    table('compound-interest tables, (A/P, i, n) (from memory)', [
      [0.05, 20, '0.08024'],
      [0.08, 15, '0.11683'],
      [0.1, 10, '0.16275'],
      [0.12, 5, '0.27741'],
    ]),
  )
})

describe('a price that grows', () => {
  // Method reference, section 8: [1 − ((1+e)/(1+r))^n]/(r − e), times (1+e) where today's price is meant.
  test.each([
    [0.08, 0.02, 15],
    [0.05, 0.07, 20],
    [0.1, -0.03, 7],
  ])('discount %d, growth %d, %d years: the closed form', (discount, growth, lifeYears) => {
    const closed =
      ((1 - ((1 + growth) / (1 + discount)) ** lifeYears) / (discount - growth)) * (1 + growth)
    expect(presentValueFactor({ discount, growth, lifeYears })).toBeCloseTo(closed, 10)
  })

  test('growth equal to the discount: as many payments as years', () => {
    expect(presentValueFactor({ discount: 0.06, growth: 0.06, lifeYears: 15 })).toBeCloseTo(15, 12)
  })

  test('no interest: the annuity is a share for each year', () => {
    expect(annuityFactor({ discount: 0, lifeYears: 25 })).toBeCloseTo(1 / 25, 12)
  })

  test('is the sum over the years, near equal rates too', () => {
    const rate = fc.double({ min: -0.2, max: 1, noNaN: true })
    const near = fc.double({ min: -1e-5, max: 1e-5, noNaN: true })
    fc.assert(
      fc.property(rate, fc.oneof(rate, near), fc.integer({ min: 1, max: 100 }), (a, b, years) => {
        const growth = Math.abs(b) <= 1e-5 ? Math.min(1, Math.max(-0.2, a + b)) : b
        const expected = sum(a, growth, years)
        const found = presentValueFactor({ discount: a, growth, lifeYears: years })
        expect(Math.abs(found - expected)).toBeLessThan(1e-8 * expected)
      }),
      { seed: 9, numRuns: 1000 },
    )
  })
})
