import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { conductivityAtWPerMK, layerDifferenceK } from '#solver/conductivity.ts'
import type { Conductivity } from '#solver/types.ts'
import { constantConductivity, meanCurve, pointCurve, spread, within } from './arbitraries.ts'
import { lambdaAt, meanConductivity } from './oracle.ts'

const outerC = within(-200, 1000)
/** Heat flux times conduction form [W/m], either way. */
const flow = fc
  .tuple(spread(1e-3, 200), fc.boolean())
  .map(([size, isOut]) => (isOut ? size : -size))

const curve = (
  basis: 'point' | 'mean',
  pointsC: readonly number[],
  valuesWPerMK: readonly number[],
): Conductivity => ({ kind: 'curve', basis, pointsC, valuesWPerMK })

describe('conductivityAtWPerMK', () => {
  const rising = curve('point', [0, 100, 200], [0.03, 0.04, 0.06])

  test.each([
    ['on a point', 100, 0.04],
    ['between points', 150, 0.05],
    ['flat below the cold end', -80, 0.03],
    ['with the last slope above the hot end', 300, 0.08],
  ])('reads a curve %s', (_, tempC, expected) => {
    expect(conductivityAtWPerMK(rising, tempC)).toBeCloseTo(expected, 12)
  })

  test('stays flat above the hot end where the last slope falls, and on a curve of one point', () => {
    expect(conductivityAtWPerMK(curve('point', [0, 100], [0.05, 0.04]), 500)).toBe(0.04)
    for (const tempC of [-100, 20, 900]) {
      expect(conductivityAtWPerMK(curve('mean', [20], [0.035]), tempC)).toBe(0.035)
    }
  })

  test('agrees with the second reading of the rules, everywhere', () => {
    fc.assert(
      fc.property(fc.oneof(constantConductivity, pointCurve, meanCurve), outerC, (λ, tempC) => {
        expect(conductivityAtWPerMK(λ, tempC) / lambdaAt(λ, tempC)).toBeCloseTo(1, 9)
      }),
    )
  })
})

describe('layerDifferenceK', () => {
  test('of a constant conductivity is flow over λ', () => {
    expect(layerDifferenceK({ kind: 'constant', conductivityWPerMK: 0.05 }, 123, 5)).toBeCloseTo(
      100,
      12,
    )
  })

  test('is nothing without flow', () => {
    fc.assert(
      fc.property(fc.oneof(constantConductivity, pointCurve, meanCurve), outerC, (λ, tempC) => {
        expect(layerDifferenceK(λ, tempC, 0)).toBe(0)
      }),
    )
  })

  test('of a point curve inverts the integral of λ, by Simpson’s rule', () => {
    fc.assert(
      fc.property(pointCurve, outerC, flow, (λ, tempC, given) => {
        const differenceK = layerDifferenceK(λ, tempC, given)
        const carried = meanConductivity(λ, tempC + differenceK, tempC) * differenceK
        expect(Math.abs(carried - given)).toBeLessThan(1e-10 * Math.abs(given))
      }),
      { numRuns: 1000 },
    )
  })

  test('of a mean curve carries λ at the mean temperature times the difference', () => {
    fc.assert(
      fc.property(
        meanCurve,
        outerC,
        fc.tuple(within(1, 1200), fc.boolean()),
        (λ, tempC, [k, isOut]) => {
          const sought = isOut ? k : -k
          const given = lambdaAt(λ, tempC + sought / 2) * sought
          expect(Math.abs(layerDifferenceK(λ, tempC, given) - sought)).toBeLessThan(1e-9 * k)
        },
      ),
      { numRuns: 1000 },
    )
  })

  // Two straight pieces worked by hand: from 0 °C up, ∫ to 100 °C = 3.5, from 100 to 200 °C = 5, so 8.5 W/m need 200 K.
  test.each([
    [3.5, 0, 100],
    [8.5, 0, 200],
    [-8.5, 200, -200],
    [-3.5, 100, -100],
    [-1.5, 0, -50],
    [1.5, -50, 50],
    // Above 200 °C: 0.06 δ + 0.0001 δ² = 7 at δ = 100.
    [7, 200, 100],
    [-7, 300, -100],
  ])('a flow of %d W/m from %d °C outside takes %d K', (given, tempC, expected) => {
    const λ = curve('point', [0, 100, 200], [0.03, 0.04, 0.06])
    expect(layerDifferenceK(λ, tempC, given)).toBeCloseTo(expected, 9)
  })

  // The same curve as a mean series: between 0 and 100 °C its mean is 50 °C, λ 0.035, flow 3.5 W/m; from 100 to
  // 300 °C mean 200 °C, λ 0.06, flow 12 W/m; from 0 to -100 °C mean -50 °C, flat, 0.03, flow -3 W/m.
  test.each([
    [3.5, 0, 100],
    [12, 100, 200],
    [-12, 300, -200],
    [-3, 0, -100],
  ])('as a mean series, a flow of %d W/m from %d °C takes %d K', (given, tempC, expected) => {
    const λ = curve('mean', [0, 100, 200], [0.03, 0.04, 0.06])
    expect(layerDifferenceK(λ, tempC, given)).toBeCloseTo(expected, 9)
  })

  test('where λ is straight, point and mean are the same', () => {
    fc.assert(
      fc.property(within(0, 400), within(0.1, 20), (tempC, given) => {
        const points: [readonly number[], readonly number[]] = [
          [-500, 2000],
          [0.01, 0.26],
        ]
        const byPoint = layerDifferenceK(curve('point', ...points), tempC, given)
        const byMean = layerDifferenceK(curve('mean', ...points), tempC, given)
        expect(byMean / byPoint).toBeCloseTo(1, 10)
      }),
    )
  })
})
