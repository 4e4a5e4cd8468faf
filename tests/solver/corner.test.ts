import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  cornerExcess,
  edgeFactorResistanceMKPerW,
  meanPerimeterResistanceMKPerW,
} from '#solver/corner.ts'
import { spread } from './arbitraries.ts'

const layer = fc.record({
  innerPerimeterM: spread(0.01, 100),
  thicknessM: spread(1e-4, 1),
  conductivityWPerMK: spread(0.005, 5),
})

describe('the two forms', () => {
  // By hand: P 2 m, d 50 mm, λ 0.04: 0.05/(0.04 · 2.2), 0.05/(0.04 · 2.108); without corners 0.05/(0.04 · 2).
  const duct = { innerPerimeterM: 2, thicknessM: 0.05, conductivityWPerMK: 0.04 }

  test('worked by hand', () => {
    expect(meanPerimeterResistanceMKPerW(duct)).toBeCloseTo(0.568182, 6)
    expect(edgeFactorResistanceMKPerW(duct)).toBeCloseTo(0.592979, 6)
    expect(cornerExcess(duct)).toBeCloseTo(2.2 / 2.108 - 1, 12)
  })

  test('lie below the wall without corners, the mean perimeter lowest', () => {
    fc.assert(
      fc.property(layer, (given) => {
        const plain = given.thicknessM / (given.conductivityWPerMK * given.innerPerimeterM)
        expect(meanPerimeterResistanceMKPerW(given)).toBeLessThan(edgeFactorResistanceMKPerW(given))
        expect(edgeFactorResistanceMKPerW(given)).toBeLessThan(plain)
      }),
    )
  })

  test('differ by the excess, which stays within 0 and 0.46/0.54', () => {
    fc.assert(
      fc.property(layer, (given) => {
        const ratio = edgeFactorResistanceMKPerW(given) / meanPerimeterResistanceMKPerW(given)
        expect(cornerExcess(given)).toBeCloseTo(ratio - 1, 9)
        expect(cornerExcess(given)).toBeGreaterThanOrEqual(0)
        expect(cornerExcess(given)).toBeLessThan(0.46 / 0.54)
      }),
    )
  })

  test('agree where there is no layer', () => {
    expect(cornerExcess({ innerPerimeterM: 2, thicknessM: 0 })).toBe(0)
    expect(edgeFactorResistanceMKPerW({ ...duct, thicknessM: 0 })).toBe(0)
  })
})
