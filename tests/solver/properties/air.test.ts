import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  airAt,
  airConductivityWPerMK,
  airHeatCapacityJPerKgK,
  airViscosityPaS,
  standardPressurePa,
} from '#solver/properties/air.ts'
import { type PublishedRow, published } from '../../published.ts'
import { within } from '../arbitraries.ts'

const SEA_LEVEL_PA = 101325

describe('airViscosityPaS', () => {
  published(airViscosityPaS, [
    { from: 'Lemmon and Jacobsen 2004, table V', given: 100, printed: '7.09559e-6' },
    { from: 'Lemmon and Jacobsen 2004, table V', given: 300, printed: '18.5230e-6' },
  ])
})

describe('airConductivityWPerMK', () => {
  published(
    (temperatureK: number) => airConductivityWPerMK(temperatureK, airViscosityPaS(temperatureK)),
    [
      { from: 'Lemmon and Jacobsen 2004, table V', given: 100, printed: '9.35902e-3' },
      { from: 'Lemmon and Jacobsen 2004, table V', given: 300, printed: '26.3529e-3' },
    ],
  )
})

/** Rows of a textbook's table of air, measured and smoothed by others than the formulas here. */
type Printed = readonly (readonly [temperatureK: number, printed: string])[]
const incropera = (rows: Printed, fraction: number, because: string): PublishedRow<number>[] =>
  rows.map(([given, printed]) => ({
    from: 'Incropera, table A.4, air at atmospheric pressure',
    given,
    printed,
    within: { fraction, because },
  }))

describe("air beside a textbook's table", () => {
  const ours = (temperatureK: number) => airAt(temperatureK - 273.15, SEA_LEVEL_PA)
  describe('dynamic viscosity', () => {
    published(
      airViscosityPaS,
      incropera(
        [
          [300, '184.6e-7'],
          [350, '208.2e-7'],
          [400, '230.1e-7'],
        ],
        0.005,
        'another correlation; Lemmon and Jacobsen state 1 % for theirs',
      ),
    )
  })
  describe('conductivity', () => {
    published(
      (temperatureK: number) => ours(temperatureK).conductivityWPerMK,
      incropera(
        [
          [300, '26.3e-3'],
          [350, '30.0e-3'],
          [400, '33.8e-3'],
        ],
        0.012,
        'another correlation; Lemmon and Jacobsen state 2 % for theirs',
      ),
    )
  })
  describe('heat capacity', () => {
    published(
      airHeatCapacityJPerKgK,
      incropera(
        [
          [300, '1007'],
          [350, '1009'],
          [400, '1014'],
        ],
        0.002,
        'the polynomial is said to agree with printed tables to 0.2 %',
      ),
    )
  })
  describe('kinematic viscosity', () => {
    published(
      (temperatureK: number) => ours(temperatureK).kinematicViscosityM2PerS,
      incropera(
        [
          [300, '15.89e-6'],
          [350, '20.92e-6'],
          [400, '26.41e-6'],
        ],
        0.015,
        'the density of the table is that of 100 kPa, which makes its viscosity 1.3 % larger',
      ),
    )
  })
  describe('Prandtl number', () => {
    published(
      (temperatureK: number) => ours(temperatureK).prandtl,
      incropera(
        [
          [300, '0.707'],
          [350, '0.700'],
          [400, '0.690'],
        ],
        0.015,
        'viscosity, heat capacity and conductivity each differ a little',
      ),
    )
  })
})

describe('standardPressurePa', () => {
  const table = 'ASHRAE Handbook Fundamentals 2017, ch. 1, table 1'
  published(standardPressurePa, [
    { from: table, given: -500, printed: '107478' },
    { from: table, given: 0, printed: '101325' },
    { from: table, given: 500, printed: '95461' },
    { from: table, given: 1000, printed: '89875' },
    { from: table, given: 4000, printed: '61640' },
    { from: table, given: 10000, printed: '26436' },
  ])
})

describe('airAt', () => {
  const conditions = [within(-73, 720), within(40000, 110000), within(0.3, 3)] as const

  test('kinematic viscosity goes as 1/pressure; conductivity and Prandtl number do not', () => {
    fc.assert(
      fc.property(...conditions, (tempC, pressurePa, factor) => {
        const here = airAt(tempC, pressurePa)
        const there = airAt(tempC, pressurePa * factor)
        expect(
          (there.kinematicViscosityM2PerS * factor) / here.kinematicViscosityM2PerS,
        ).toBeCloseTo(1, 12)
        expect(there.conductivityWPerMK).toBe(here.conductivityWPerMK)
        expect(there.prandtl).toBe(here.prandtl)
      }),
    )
  })

  test('is a gas: warmer air conducts better and is more viscous, with a Prandtl number near 0.7', () => {
    fc.assert(
      fc.property(conditions[0], conditions[1], (tempC, pressurePa) => {
        const cool = airAt(tempC, pressurePa)
        const warm = airAt(tempC + 1, pressurePa)
        expect(warm.conductivityWPerMK).toBeGreaterThan(cool.conductivityWPerMK)
        expect(warm.kinematicViscosityM2PerS).toBeGreaterThan(cool.kinematicViscosityM2PerS)
        expect(Math.abs(cool.prandtl - 0.715)).toBeLessThan(0.03)
      }),
    )
  })
})
