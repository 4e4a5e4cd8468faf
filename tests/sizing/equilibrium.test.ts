/** Where a run tends to: the temperature of the medium at which nothing flows. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { equilibriumC } from '#sizing/equilibrium.ts'
import type { Condition } from '#sizing/problem.ts'
import { evenly } from '../model/any-values.ts'

const condition = (airC: number, surroundingsC: number, sunWPerM2: number): Condition => ({
  around: { airC, surroundingsC, windMPerS: 0, altitudeM: 0 },
  mediumC: 60,
  emissivity: 0.9,
  bareEmissivity: 0.8,
  sunWPerM2,
  solarAbsorptance: 0.5,
  bareSolarAbsorptance: 0.8,
  film: 'detailed',
  sky: null,
  inclinedFilm: 'higher',
})

describe('equilibriumC', () => {
  test('is the air where nothing else is at another temperature, without a look at the flow', () => {
    const never = (): number => {
      throw new Error('looked')
    }
    expect(equilibriumC(condition(12, 12, 0), never)).toBe(12)
  })

  // Straight films: h_c(θ − θ_a) + h_r(θ − θ_r) − s = 0 gives θ = (h_c θ_a + h_r θ_r + s)/(h_c + h_r).
  test('weighs air, surroundings and sun by their films', () => {
    fc.assert(
      fc.property(
        evenly(-60, 60),
        evenly(-90, 200),
        fc.oneof(fc.constant(0), evenly(1, 1400)),
        evenly(0.5, 50),
        evenly(0.1, 8),
        (airC, surroundingsC, sunWPerM2, convection, radiation) => {
          const flowAt = (mediumC: number): number =>
            convection * (mediumC - airC) + radiation * (mediumC - surroundingsC) - sunWPerM2
          const byHandC =
            (convection * airC + radiation * surroundingsC + sunWPerM2) / (convection + radiation)
          expect(equilibriumC(condition(airC, surroundingsC, sunWPerM2), flowAt)).toBeCloseTo(
            byHandC,
            7,
          )
        },
      ),
      { seed: 71 },
    )
  })

  test.each([-20, 40])('is the air where surroundings of %d °C are not seen', (surroundingsC) => {
    expect(equilibriumC(condition(10, surroundingsC, 0), (mediumC) => 8 * (mediumC - 10))).toBe(10)
  })

  test('ends where nothing flows at any temperature', () => {
    expect(equilibriumC(condition(10, 20, 500), () => 0)).toBeLessThan(Number.POSITIVE_INFINITY)
  })
})
