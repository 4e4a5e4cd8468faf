import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  type FreeFlow,
  nusseltHorizontalCylinder,
  nusseltPlateDrivingFlow,
  nusseltPlateHinderedFlow,
  nusseltSlenderCylinder,
  nusseltVerticalCylinder,
  nusseltVerticalPlate,
} from '#solver/convection/natural.ts'
import { published } from '../../published.ts'
import { spread } from '../arbitraries.ts'

const library = 'reference text of a public heat-transfer library'
// The library's check value is given by Gr = 2.63e9 and Pr = 0.69.
const checked = { rayleigh: 2.63e9 * 0.69, prandtl: 0.69 }

describe('nusseltHorizontalCylinder', () => {
  published(nusseltHorizontalCylinder, [
    { from: `${library}, Churchill-Chu, cylinder`, given: checked, printed: '139.1349' },
    {
      from: 'ASHRAE Handbook Fundamentals 2021, ch. 4, example 11',
      given: { rayleigh: 1.804e6, prandtl: 4.08 },
      printed: '20.5',
    },
  ])

  // The formula itself: without flow the conduction limit 0.60², whatever the fluid.
  test('has the limit 0.36 without flow', () => {
    expect(nusseltHorizontalCylinder({ rayleigh: 0, prandtl: 0.7 })).toBeCloseTo(0.36, 12)
  })

  // McAdams's line 0.53 Ra^(1/4), printed for 1e4 to 1e9, lies within a fifth of it in air.
  test.each([1e5, 1e6, 1e7, 1e8])('keeps company with 0.53 Ra^(1/4) at Ra %d', (rayleigh) => {
    const ratio = nusseltHorizontalCylinder({ rayleigh, prandtl: 0.71 }) / (0.53 * rayleigh ** 0.25)
    expect(Math.abs(ratio - 1)).toBeLessThan(1 / 5)
  })
})

describe('nusseltVerticalPlate', () => {
  published(nusseltVerticalPlate, [
    { from: `${library}, Churchill-Chu, plate`, given: checked, printed: '147.1619' },
  ])

  test('has the limit 0.825² without flow', () => {
    expect(nusseltVerticalPlate({ rayleigh: 0, prandtl: 0.7 })).toBeCloseTo(0.825 ** 2, 12)
  })
})

describe('nusseltSlenderCylinder', () => {
  // The formula's own ends: with Pr = 1 the first term is 4/3 (7/205 Ra)^(1/4), the second 2348/4445 L/D.
  test('is the sum of a plate term and a curvature term', () => {
    const flow = { rayleigh: 1e8, prandtl: 1 }
    const plateTerm = nusseltSlenderCylinder({ ...flow, slenderness: 0 })
    expect(plateTerm).toBeCloseTo((4 / 3) * (7e8 / 205) ** 0.25, 9)
    expect(nusseltSlenderCylinder({ ...flow, slenderness: 50 }) - plateTerm).toBeCloseTo(
      (50 * 2348) / 4445,
      9,
    )
  })
})

describe('nusseltVerticalCylinder', () => {
  const flow = fc.record({
    rayleigh: spread(1, 1e12),
    prandtl: spread(0.6, 8),
    slenderness: spread(0.1, 1e4),
  })

  test('is the larger of plate and thin cylinder up to Ra 1e9, the plate above', () => {
    fc.assert(
      fc.property(flow, (given) => {
        const plate = nusseltVerticalPlate(given)
        const expected =
          given.rayleigh <= 1e9 ? Math.max(plate, nusseltSlenderCylinder(given)) : plate
        expect(nusseltVerticalCylinder(given)).toBe(expected)
      }),
    )
  })

  test('changes over exactly above Ra 1e9', () => {
    const thin = { prandtl: 0.7, slenderness: 1000 }
    expect(nusseltVerticalCylinder({ ...thin, rayleigh: 1e9 })).toBeGreaterThan(500)
    expect(nusseltVerticalCylinder({ ...thin, rayleigh: 1.0001e9 })).toBeLessThan(200)
  })
})

describe('horizontal surfaces', () => {
  // Coefficients and exponents of ASHRAE ch. 4, table 9, evaluated by hand: 64^(1/6) = 2, 256^(1/4) = 4,
  // (1e6)^(1/4) = 31.6228, (2.7e7)^(1/3) = 300.
  test.each([
    [64, 1.92],
    [256, 2.36],
    [1e6, 17.0763],
    [2.7e7, 45],
  ])('driving flow at Ra %d has the Nusselt number %d', (rayleigh, expected) => {
    expect(nusseltPlateDrivingFlow({ rayleigh, prandtl: 0.7 })).toBeCloseTo(expected, 4)
  })

  test.each([
    [199.9, 0.96 * 199.9 ** (1 / 6)],
    [200.1, 0.59 * 200.1 ** 0.25],
    [9999, 0.59 * 9999 ** 0.25],
    [10001, 0.54 * 10001 ** 0.25],
    [7.999e6, 0.54 * 7.999e6 ** 0.25],
    [8.001e6, 0.15 * 8.001e6 ** (1 / 3)],
  ])('changes its form beside Ra %d', (rayleigh, expected) => {
    expect(nusseltPlateDrivingFlow({ rayleigh, prandtl: 0.7 })).toBeCloseTo(expected, 9)
  })

  test('hindered flow is 0.27 Ra^(1/4): half as much as driving flow', () => {
    expect(nusseltPlateHinderedFlow({ rayleigh: 1e6, prandtl: 0.7 })).toBeCloseTo(8.53815, 5)
    const half = nusseltPlateDrivingFlow({ rayleigh: 1e6, prandtl: 0.7 }) / 2
    expect(nusseltPlateHinderedFlow({ rayleigh: 1e6, prandtl: 0.7 })).toBeCloseTo(half, 9)
  })
})

describe('free convection', () => {
  const smooth: [string, (flow: FreeFlow) => number][] = [
    ['horizontal cylinder', nusseltHorizontalCylinder],
    ['vertical plate', nusseltVerticalPlate],
    ['hindered plate', nusseltPlateHinderedFlow],
  ]
  test.each(smooth)('%s: more buoyancy never carries less heat', (_, nusselt) => {
    fc.assert(
      fc.property(
        spread(1e-8, 1e15),
        spread(1, 10),
        spread(0.5, 10),
        (rayleigh, factor, prandtl) => {
          expect(nusselt({ rayleigh: rayleigh * factor, prandtl })).toBeGreaterThanOrEqual(
            nusselt({ rayleigh, prandtl }) * (1 - 1e-12),
          )
        },
      ),
    )
  })
})
