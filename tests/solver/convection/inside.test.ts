import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  insideFilmWPerM2K,
  nusseltInside,
  nusseltTurbulentInside,
  smoothPipeFriction,
} from '#solver/convection/inside.ts'
import { published } from '../../published.ts'
import { spread, within } from '../arbitraries.ts'

describe('nusseltTurbulentInside', () => {
  published(nusseltTurbulentInside, [
    {
      from: 'check value of a public heat-transfer library, Gnielinski, Darcy friction 0.0185',
      given: { reynolds: 1e5, prandtl: 1.2, friction: 0.0185 / 4 },
      printed: '254.6268274936',
    },
  ])
})

describe('nusseltInside', () => {
  test.each([0, 1, 1000, 2300])('is 3.66 in laminar flow, Re %d', (reynolds) => {
    expect(nusseltInside({ reynolds, prandtl: 0.7 })).toBe(3.66)
  })

  // Dittus-Boelter, 0.023 Re^0.8 Pr^0.4 from Re 1e4, is printed with an error of a quarter.
  test.each([1e4, 3e4, 1e5, 1e6])('keeps company with 0.023 Re^0.8 Pr^0.4 at Re %d', (reynolds) => {
    const ratio = nusseltInside({ reynolds, prandtl: 0.7 }) / (0.023 * reynolds ** 0.8 * 0.7 ** 0.4)
    expect(Math.abs(ratio - 1)).toBeLessThan(0.15)
  })

  // Gnielinski's own short form for gases, printed for Re 1e4 to 5e6 and Pr 0.5 to 1.5.
  test.each([1e4, 3e4, 1e5, 1e6])(
    'keeps company with 0.0214 (Re^0.8 − 100) Pr^0.4 at Re %d',
    (reynolds) => {
      const short = 0.0214 * (reynolds ** 0.8 - 100) * 0.7 ** 0.4
      expect(Math.abs(nusseltInside({ reynolds, prandtl: 0.7 }) / short - 1)).toBeLessThan(0.1)
    },
  )

  test('is half way between both ends at Re 3150', () => {
    const at = (reynolds: number) => nusseltInside({ reynolds, prandtl: 0.7 })
    expect(at(3150)).toBeCloseTo((at(2300) + at(4000)) / 2, 12)
  })

  test('is the turbulent formula from Re 4000 on, and below it on the straight line beneath', () => {
    const gnielinski = (reynolds: number) =>
      nusseltTurbulentInside({ reynolds, prandtl: 0.7, friction: smoothPipeFriction(reynolds) })
    expect(nusseltInside({ reynolds: 4000, prandtl: 0.7 })).toBe(gnielinski(4000))
    expect(nusseltInside({ reynolds: 4010, prandtl: 0.7 })).toBe(gnielinski(4010))
    expect(nusseltInside({ reynolds: 3000, prandtl: 0.7 })).toBeLessThan(gnielinski(3000))
  })

  test.each([2300, 4000])('has no step at Re %d', (reynolds) => {
    for (const prandtl of [0.5, 0.7, 10, 1000]) {
      const below = nusseltInside({ reynolds: reynolds * (1 - 1e-9), prandtl })
      const above = nusseltInside({ reynolds: reynolds * (1 + 1e-9), prandtl })
      expect(above / below).toBeCloseTo(1, 6)
    }
  })

  test('faster flow never carries less heat', () => {
    fc.assert(
      fc.property(spread(1, 5e6), spread(1, 10), spread(0.5, 2000), (reynolds, factor, prandtl) => {
        expect(nusseltInside({ reynolds: reynolds * factor, prandtl })).toBeGreaterThanOrEqual(
          nusseltInside({ reynolds, prandtl }) * (1 - 1e-12),
        )
      }),
    )
  })
})

describe('smoothPipeFriction', () => {
  // By hand: 1.58 · 11.512925 − 3.28 = 14.910422.
  test('at Re 1e5', () => {
    expect(smoothPipeFriction(1e5)).toBeCloseTo(1 / 14.910422 ** 2, 9)
  })

  // Blasius, 0.0791 Re^(-1/4), is printed for smooth pipes up to 1e5.
  test.each([5e3, 2e4, 1e5])('keeps company with Blasius at Re %d', (reynolds) => {
    expect(Math.abs(smoothPipeFriction(reynolds) / (0.0791 * reynolds ** -0.25) - 1)).toBeLessThan(
      0.05,
    )
  })
})

describe('insideFilmWPerM2K', () => {
  const duct = { velocityMPerS: 5, hydraulicDiameterM: 0.3, airC: 20, pressurePa: 101325 }

  test('standing air only conducts: 3.66 λ/D', () => {
    expect(insideFilmWPerM2K({ ...duct, velocityMPerS: 0 })).toBeCloseTo((3.66 * 0.02588) / 0.3, 3)
  })

  test('is finite and above 0 for any duct, and never falls with velocity or pressure', () => {
    fc.assert(
      fc.property(
        within(0, 60),
        within(0, 10),
        spread(0.005, 20),
        within(-60, 1000),
        spread(2e4, 2e5),
        (velocityMPerS, moreMPerS, hydraulicDiameterM, airC, pressurePa) => {
          const given = { velocityMPerS, hydraulicDiameterM, airC, pressurePa }
          const film = insideFilmWPerM2K(given)
          expect(film).toBeGreaterThan(0)
          expect(film).toBeLessThan(1e4)
          const faster = { ...given, velocityMPerS: velocityMPerS + moreMPerS }
          expect(insideFilmWPerM2K(faster)).toBeGreaterThanOrEqual(film * (1 - 1e-12))
          expect(
            insideFilmWPerM2K({ ...given, pressurePa: 1.1 * pressurePa }),
          ).toBeGreaterThanOrEqual(film * (1 - 1e-12))
        },
      ),
    )
  })
})
