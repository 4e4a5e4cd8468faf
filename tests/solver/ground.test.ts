import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { soilResistanceMKPerW } from '#solver/ground.ts'
import { spread } from './arbitraries.ts'

const orNaN = (value: number | null): number => value ?? Number.NaN

describe('soilResistanceMKPerW', () => {
  // The identity arcosh(x) = ln(x + √(x² − 1)): 2H/D = 1.25 gives ln 2, 2H/D = 5/3 gives ln 3.
  test.each([
    [1.25, Math.LN2],
    [5 / 3, Math.log(3)],
  ])('with 2H/D = %d', (ratio, expected) => {
    const soil = soilResistanceMKPerW({ depthM: ratio / 2, outerDiameterM: 1, soilWPerMK: 0.5 })
    expect(soil).toBeCloseTo(expected / Math.PI, 12)
  })

  test('falls to nothing for a pipe that touches the surface, and is not told for one that stands out', () => {
    expect(soilResistanceMKPerW({ depthM: 0.5, outerDiameterM: 1, soilWPerMK: 1 })).toBe(0)
    expect(soilResistanceMKPerW({ depthM: 0.49, outerDiameterM: 1, soilWPerMK: 1 })).toBeNull()
    expect(soilResistanceMKPerW({ depthM: 0, outerDiameterM: 1, soilWPerMK: 1 })).toBeNull()
  })

  test('is ln(4H/D)/(2πλ) for a thin pipe, within 1 % from H/D 2 on, and never above it', () => {
    fc.assert(
      fc.property(
        spread(0.001, 2),
        spread(2, 1e4),
        spread(0.1, 5),
        (outerDiameterM, deep, soilWPerMK) => {
          const soil = orNaN(
            soilResistanceMKPerW({ depthM: deep * outerDiameterM, outerDiameterM, soilWPerMK }),
          )
          const thin = Math.log(4 * deep) / (2 * Math.PI * soilWPerMK)
          expect(soil / thin).toBeGreaterThan(0.99)
          expect(soil / thin).toBeLessThanOrEqual(1 + 1e-12)
        },
      ),
    )
  })

  test('rises with depth and falls with diameter', () => {
    fc.assert(
      fc.property(spread(0.01, 2), spread(1, 100), spread(1.001, 3), (diameterM, deep, more) => {
        const at = (depthM: number, outerDiameterM: number) =>
          orNaN(soilResistanceMKPerW({ depthM, outerDiameterM, soilWPerMK: 1 }))
        const depthM = deep * diameterM
        expect(at(depthM * more, diameterM)).toBeGreaterThan(at(depthM, diameterM))
        expect(at(depthM, diameterM / more)).toBeGreaterThan(at(depthM, diameterM))
      }),
    )
  })
})
