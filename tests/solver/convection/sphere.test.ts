import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { nusseltSphere, nusseltSphereInWind } from '#solver/convection/sphere.ts'
import { published } from '../../published.ts'
import { spread, within } from '../arbitraries.ts'

const library = 'check values of a public heat-transfer library, Churchill, sphere'
const ashrae = 'ASHRAE Handbook Fundamentals 2021, ch. 4, example 10'

describe('nusseltSphere', () => {
  // The library gives Gr at Pr 0.7, one value for each power of ten.
  published(
    nusseltSphere,
    [
      [1, '2.4150663772'],
      [1e1, '2.7381040026'],
      [1e2, '3.3125553309'],
      [1e3, '4.3340933313'],
      [1e4, '6.1507272232'],
      [1e5, '9.3821675084'],
      [1e6, '15.1454531448'],
      [1e7, '25.6708694403'],
      [1e8, '47.2717613107'],
      [1e9, '96.4793056284'],
      [1e10, '204.7431085429'],
    ].map(([grashof, printed]) => ({
      from: library,
      given: { rayleigh: 0.7 * Number(grashof), prandtl: 0.7 },
      printed: String(printed),
    })),
  )

  test('has the conduction limit 2 without flow', () => {
    expect(nusseltSphere({ rayleigh: 0, prandtl: 0.7 })).toBe(2)
  })

  // Incropera prints the laminar form 2 + 0.589 Ra^(1/4) / […]^(4/9) for the same sphere.
  test('is the laminar form within 1 % up to Ra 1e6, and above it ever more', () => {
    const laminar = (rayleigh: number) =>
      2 + (0.589 * rayleigh ** 0.25) / (1 + (0.469 / 0.7) ** (9 / 16)) ** (4 / 9)
    const ratio = (rayleigh: number) =>
      nusseltSphere({ rayleigh, prandtl: 0.7 }) / laminar(rayleigh)
    expect(ratio(1e6)).toBeGreaterThan(1)
    expect(ratio(1e6)).toBeLessThan(1.01)
    expect(ratio(1e10)).toBeGreaterThan(1.2)
  })
})

// 3.02 m, air of 0 °C with the viscosity 1.729e-5 Pa·s, surface of 30 °C with 1.872e-5; wind 25 km/h.
const handbook = { reynolds: 1.304e6, prandtl: 0.7282, viscosityRatio: 1.872 / 1.729 }

describe('nusseltSphereInWind', () => {
  published(nusseltSphereInWind, [{ from: ashrae, given: handbook, printed: '1056' }])

  published(
    (given) => (nusseltSphereInWind(given) * 0.02588) / 3.02,
    [{ from: `${ashrae}, coefficient`, given: handbook, printed: '9.05' }],
  )

  published(
    (given) => nusseltSphereInWind(given) * 0.02588 * Math.PI * 3.02 * 30,
    [
      {
        from: `${ashrae}, heat flow`,
        given: handbook,
        printed: '7780',
        within: { absolute: 5, because: 'the handbook goes on with its rounded coefficient' },
      },
    ],
  )

  test('has the conduction limit 2 without wind', () => {
    expect(nusseltSphereInWind({ reynolds: 0, prandtl: 0.7, viscosityRatio: 1 })).toBe(2)
  })

  // By hand: Re 1e6 gives 0.4 · 1000 + 0.06 · 10000 = 1000.
  test('is the sum of a laminar and a turbulent share', () => {
    const given = { reynolds: 1e6, prandtl: 1, viscosityRatio: 1 }
    expect(nusseltSphereInWind(given)).toBeCloseTo(1002, 9)
    expect(nusseltSphereInWind({ ...given, viscosityRatio: 16 })).toBeCloseTo(2002, 9)
  })
})

describe('both', () => {
  test('more flow never carries less heat, nor less than still conduction', () => {
    fc.assert(
      fc.property(
        spread(1e-6, 1e14),
        spread(1, 10),
        spread(0.5, 10),
        within(0.3, 3),
        (number, factor, prandtl, viscosityRatio) => {
          const still = nusseltSphere({ rayleigh: number, prandtl })
          expect(still).toBeGreaterThanOrEqual(2)
          expect(nusseltSphere({ rayleigh: number * factor, prandtl })).toBeGreaterThanOrEqual(
            still * (1 - 1e-12),
          )
          const wind = { prandtl, viscosityRatio }
          const windy = nusseltSphereInWind({ ...wind, reynolds: number })
          expect(windy).toBeGreaterThanOrEqual(2)
          expect(
            nusseltSphereInWind({ ...wind, reynolds: number * factor }),
          ).toBeGreaterThanOrEqual(windy * (1 - 1e-12))
        },
      ),
    )
  })
})
