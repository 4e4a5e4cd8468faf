/** The coefficient is remembered, not read: the formula by hand, and what must hold whatever the coefficient. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { clearSkyC, radiantMixC } from '#solver/sky.ts'
import { within } from './arbitraries.ts'

describe('clearSkyC', () => {
  // By hand: 289 K^1.5 = 17³ = 4913; 0.0552 · 4913 = 271.1976 K.
  test('of air at 289 K', () => {
    expect(clearSkyC(289 - 273.15)).toBeCloseTo(271.1976 - 273.15, 9)
  })

  test('is colder than the air, and rises with it', () => {
    fc.assert(
      fc.property(within(-60, 50), within(0.01, 10), (airC, moreK) => {
        expect(clearSkyC(airC)).toBeLessThan(airC)
        expect(clearSkyC(airC + moreK)).toBeGreaterThan(clearSkyC(airC))
      }),
    )
  })
})

describe('radiantMixC', () => {
  // By hand, in K: half of 200 and half of 300 radiate as ((16 + 81)/2 · 1e8)^(1/4) = 263.8962.
  test('mixes T⁴, not T', () => {
    const mixed = radiantMixC({ skyView: 0.5, skyC: 200 - 273.15, surroundingsC: 300 - 273.15 })
    expect(mixed + 273.15).toBeCloseTo(48.5e8 ** 0.25, 9)
    expect(mixed + 273.15).toBeGreaterThan(250)
  })

  test('is either alone at the ends, between them otherwise, and moves towards the sky with its share', () => {
    fc.assert(
      fc.property(
        within(-100, 60),
        within(-60, 60),
        within(0, 1),
        within(0, 1),
        (skyC, surroundingsC, one, other) => {
          const at = (skyView: number) => radiantMixC({ skyView, skyC, surroundingsC })
          expect(at(0)).toBeCloseTo(surroundingsC, 9)
          expect(at(1)).toBeCloseTo(skyC, 9)
          expect(at(one)).toBeGreaterThanOrEqual(Math.min(skyC, surroundingsC) - 1e-9)
          expect(at(one)).toBeLessThanOrEqual(Math.max(skyC, surroundingsC) + 1e-9)
          const [less, more] = one < other ? [one, other] : [other, one]
          expect((at(more) - at(less)) * Math.sign(skyC - surroundingsC)).toBeGreaterThanOrEqual(
            -1e-9,
          )
        },
      ),
    )
  })
})
