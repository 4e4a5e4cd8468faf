import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  type Cooling,
  coolingTimeS,
  type Freezing,
  freezingTimeOfThinIceS,
  freezingTimeS,
  ICE_KG_PER_M3,
  ICE_LATENT_J_PER_KG,
  ICE_W_PER_M_K,
  wallCapacityJPerMK,
  waterCapacityJPerMK,
} from '#solver/frost.ts'
import { published } from '../published.ts'
import { spread, within } from './arbitraries.ts'
import { freezingTimes } from './printed/freezing-times.ts'

const orNaN = (value: number | null): number => value ?? Number.NaN
const fahrenheit = (tempF: number): number => (tempF - 32) / 1.8

interface Insulated {
  readonly boreMm: number
  readonly sectionInnerMm: number
  readonly sectionOuterMm: number
  readonly airF: number
}

/** Hours from 42 °F to the freezing point, as the handbook reckons them: no wall, no film. */
const hoursToFreezingPoint = (given: Insulated): number =>
  orNaN(
    coolingTimeS({
      capacityJPerMK: waterCapacityJPerMK(given.boreMm / 1000),
      resistanceMKPerW:
        Math.log(given.sectionOuterMm / given.sectionInnerMm) / (2 * Math.PI * 0.0432),
      startC: fahrenheit(42),
      endC: 0,
      airC: fahrenheit(given.airF),
    }),
  ) / 3600

describe('coolingTimeS', () => {
  published(
    hoursToFreezingPoint,
    freezingTimes.map(({ sizeMm, sectionMm, hours, ...given }) => ({
      from: `ASHRAE Handbook Fundamentals 2021, ch. 23, table 6, size ${sizeMm} with ${sectionMm} mm`,
      given: { ...given, airF: -18 },
      printed: hours,
      within: {
        absolute: 0.05 + 0.01 * Number(hours),
        because: 'diameters in whole millimetres and three digits of conductivity leave 1 %',
      },
    })),
  )

  const twoInch = { boreMm: 52.48, sectionInnerMm: 61, sectionOuterMm: 141 }
  published(hoursToFreezingPoint, [
    {
      from: 'a forensic engineering article on the table, 2 in with 1½ in',
      given: { ...twoInch, airF: -18 },
      printed: '1.4',
    },
    {
      from: 'the same article, milder air',
      given: { ...twoInch, airF: 20 },
      printed: '4.6',
      within: { fraction: 0.03, because: 'the article scales the rounded 1.4 h' },
    },
  ])

  const cooling = fc.record({
    capacityJPerMK: spread(1, 1e7),
    resistanceMKPerW: spread(1e-3, 1e3),
    startC: within(-60, 300),
    endC: within(-60, 300),
    airC: within(-80, 60),
  })

  test('is 0 where the content is as cold already, never where the air is too warm, finite otherwise', () => {
    fc.assert(
      fc.property(cooling, (given) => {
        const timeS = coolingTimeS(given)
        if (given.startC <= given.endC) expect(timeS).toBe(0)
        else if (given.airC >= given.endC) expect(timeS).toBeNull()
        else {
          expect(timeS).toBeGreaterThan(0)
          expect(timeS).toBeLessThan(Number.POSITIVE_INFINITY)
        }
      }),
    )
  })

  test('never ends at the temperature of the air itself', () => {
    const pipe = { capacityJPerMK: 9000, resistanceMKPerW: 3, startC: 10 }
    expect(coolingTimeS({ ...pipe, endC: 0, airC: 0 })).toBeNull()
  })

  test('adds up over a stop on the way', () => {
    fc.assert(
      fc.property(within(-50, 0), within(0.01, 50), within(0.01, 50), (airC, aboveK, moreK) => {
        const whole: Cooling = {
          capacityJPerMK: 1000,
          resistanceMKPerW: 2,
          startC: airC + aboveK + 2 * moreK,
          endC: airC + aboveK,
          airC,
        }
        const stopC = airC + aboveK + moreK
        const first = orNaN(coolingTimeS({ ...whole, endC: stopC }))
        const second = orNaN(coolingTimeS({ ...whole, startC: stopC }))
        expect((first + second) / orNaN(coolingTimeS(whole))).toBeCloseTo(1, 9)
      }),
    )
  })

  test('grows with content, resistance and milder air', () => {
    const pipe = { capacityJPerMK: 9000, resistanceMKPerW: 3, startC: 10, endC: 0, airC: -10 }
    const at = (change: Partial<Cooling>) => orNaN(coolingTimeS({ ...pipe, ...change }))
    // By hand: C R ln 2.
    expect(at({})).toBeCloseTo(27000 * Math.LN2, 8)
    expect(at({ capacityJPerMK: 18000 })).toBeCloseTo(2 * at({}), 8)
    expect(at({ resistanceMKPerW: 6 })).toBeCloseTo(2 * at({}), 8)
    expect(at({ airC: -1 })).toBeGreaterThan(at({}))
  })
})

describe('heat capacity per metre', () => {
  test('of wall and content of one material is that of the full rod', () => {
    const rod = wallCapacityJPerMK({
      outerDiameterM: 0.06,
      boreM: 0,
      densityKgPerM3: 1000,
      heatCapacityJPerKgK: 4190,
    })
    const wall = wallCapacityJPerMK({
      outerDiameterM: 0.06,
      boreM: 0.05,
      densityKgPerM3: 1000,
      heatCapacityJPerKgK: 4190,
    })
    expect(wall + waterCapacityJPerMK(0.05)).toBeCloseTo(rod, 9)
  })
})

describe('freezing', () => {
  const pipe: Freezing = { iceFraction: 0.25, boreM: 0.05, resistanceMKPerW: 3, airC: -10 }

  const freezing = fc.record({
    iceFraction: within(0.001, 1),
    boreM: spread(0.005, 1),
    resistanceMKPerW: spread(0.01, 100),
    airC: within(-60, -0.01),
  })

  test('is finite, and longer with the resistance of the ice than without', () => {
    fc.assert(
      fc.property(freezing, (given) => {
        const thinS = orNaN(freezingTimeOfThinIceS(given))
        expect(thinS).toBeGreaterThan(0)
        expect(orNaN(freezingTimeS(given))).toBeGreaterThan(thinS)
        expect(orNaN(freezingTimeS(given))).toBeLessThan(Number.POSITIVE_INFINITY)
      }),
    )
  })

  test('takes the same time with as without where the ice is thin', () => {
    const thin = { ...pipe, iceFraction: 1e-6 }
    expect(orNaN(freezingTimeS(thin)) / orNaN(freezingTimeOfThinIceS(thin))).toBeCloseTo(1, 6)
  })

  // All of it: f + (1 − f) ln(1 − f) is 1, so R + 1/(4πλ); for a bare wall of ice temperature the classic ρ h r²/(4λΔθ).
  test('of the whole bore, without insulation, is the classic solidification of a cylinder', () => {
    const bare = { iceFraction: 1, boreM: 0.1, resistanceMKPerW: 0, airC: -20 }
    const classicS = (ICE_KG_PER_M3 * ICE_LATENT_J_PER_KG * 0.05 ** 2) / (4 * ICE_W_PER_M_K * 20)
    expect(orNaN(freezingTimeS(bare))).toBeCloseTo(classicS, 6)
  })

  test('agrees with the growth of the ice step by step', () => {
    fc.assert(
      fc.property(freezing, (given) => {
        const { iceFraction, boreM, resistanceMKPerW, airC } = given
        const steps = 2000
        let timeS = 0
        for (let n = 0; n < steps; n++) {
          const share = ((n + 0.5) / steps) * iceFraction
          const iceMKPerW = -Math.log(1 - share) / (4 * Math.PI * ICE_W_PER_M_K)
          const heatJPerM =
            ((Math.PI / 4) * boreM ** 2 * ICE_KG_PER_M3 * ICE_LATENT_J_PER_KG * iceFraction) / steps
          timeS += (heatJPerM * (resistanceMKPerW + iceMKPerW)) / -airC
        }
        expect(orNaN(freezingTimeS(given)) / timeS).toBeCloseTo(1, 3)
      }),
      { numRuns: 50 },
    )
  })

  test('grows with the share of ice, the insulation and milder air', () => {
    fc.assert(
      fc.property(freezing, within(1.01, 3), (given, factor) => {
        for (const timeS of [freezingTimeS, freezingTimeOfThinIceS]) {
          const base = orNaN(timeS(given))
          const { iceFraction, resistanceMKPerW, airC } = given
          expect(orNaN(timeS({ ...given, iceFraction: iceFraction / factor }))).toBeLessThan(base)
          expect(
            orNaN(timeS({ ...given, resistanceMKPerW: resistanceMKPerW * factor })),
          ).toBeGreaterThan(base)
          expect(orNaN(timeS({ ...given, airC: airC / factor }))).toBeGreaterThan(base)
        }
      }),
    )
  })

  test.each([0, 5])('never comes in air of %d °C; no ice takes no time', (airC) => {
    expect(freezingTimeS({ ...pipe, airC })).toBeNull()
    expect(freezingTimeOfThinIceS({ ...pipe, airC })).toBeNull()
    expect(freezingTimeS({ ...pipe, airC, iceFraction: 0 })).toBe(0)
  })
})
