/** The finite-volume conduction by itself, against closed forms: only what is sound may examine the solver. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { constantConductivity, pointCurve, spread, within } from '../arbitraries.ts'
import { lambdaAt } from '../oracle.ts'
import {
  type RadialGeometry,
  radialLayer,
  refinedRadial,
  solveRadial,
} from './radial-conduction.ts'

const FILM = 8
const AIR = 20
const film = (surfaceC: number): number => FILM * (surfaceC - AIR)

/** Resistance times λ of one layer on its outer area, Fourier's law [m]. */
function form(geometry: RadialGeometry, inner: number, outer: number, outermost: number): number {
  if (geometry === 'plane') return outer - inner
  return geometry === 'cylinder'
    ? outermost * Math.log(outer / inner)
    : outermost * outermost * (1 / inner - 1 / outer)
}

const geometries = ['plane', 'cylinder', 'sphere'] as const

describe.each(geometries)('finite volumes in a %s', (geometry) => {
  test('give the closed form of constant conductivities within the error they state', () => {
    fc.assert(
      fc.property(
        spread(0.005, 1),
        fc.array(fc.tuple(spread(0.002, 0.3), spread(0.01, 2)), { minLength: 1, maxLength: 4 }),
        within(-150, 600),
        (innerRadiusM, given, mediumC) => {
          const outermost = given.reduce(
            (radius, [thicknessM]) => radius + thicknessM,
            innerRadiusM,
          )
          let radius = innerRadiusM
          const resistances = given.map(([thicknessM, lambda]) => {
            radius += thicknessM
            return form(geometry, radius - thicknessM, radius, outermost) / lambda
          })
          const flux = (mediumC - AIR) / (resistances.reduce((sum, one) => sum + one, 0) + 1 / FILM)
          const answer = refinedRadial({
            geometry,
            innerRadiusM,
            layers: given.map(([thicknessM, conductivityWPerMK]) =>
              radialLayer(thicknessM, { kind: 'constant', conductivityWPerMK }),
            ),
            mediumC,
            insideFilmWPerM2K: null,
            outerFlux: film,
            startC: AIR,
          })
          expect(answer.gridErrorShare).toBeLessThan(2e-3)
          const bound = answer.gridErrorShare + 1e-6
          expect(Math.abs(answer.fluxWPerM2 - flux)).toBeLessThanOrEqual(
            bound * Math.abs(flux) + 1e-9,
          )
          let tempC = mediumC
          resistances.forEach((resistance, j) => {
            tempC -= flux * resistance
            const miss = Math.abs((answer.interfacesC[j + 1] as number) - tempC)
            expect(miss).toBeLessThanOrEqual(bound * Math.abs(mediumC - tempC) + 1e-9)
          })
        },
      ),
      { numRuns: 60 },
    )
  })

  test('carry the mean of a straight λ(T): closed form of one layer between two temperatures', () => {
    // λ = 0.03 + 1e-4·T between 400 and 50 °C: mean 0.0525 W/(m·K).
    const layer = {
      thicknessM: 0.1,
      lambda: (tempC: number) => 0.03 + 1e-4 * tempC,
      corners: [],
    }
    const exact = (0.0525 * 350) / form(geometry, 0.05, 0.15, 0.15)
    // A film that grips at 50 °C holds the surface there.
    const grip = (surfaceC: number): number => 1e9 * (surfaceC - 50)
    const problem = {
      geometry,
      innerRadiusM: 0.05,
      layers: [layer],
      mediumC: 400,
      insideFilmWPerM2K: null,
      outerFlux: grip,
      startC: 50,
    }
    expect(refinedRadial(problem, 100).fluxWPerM2 / exact).toBeCloseTo(1, 6)
    const miss = (cells: number) => Math.abs(solveRadial(problem, cells).fluxWPerM2 / exact - 1)
    // The square law that the extrapolation builds on; on a plane a straight λ leaves no error to measure.
    if (geometry !== 'plane') expect(miss(20) / miss(40)).toBeCloseTo(4, 1)
    else expect(miss(20)).toBeLessThan(1e-7)
  })

  test('lose to an inside film what it resists', () => {
    const at = (insideFilmWPerM2K: number | null) =>
      refinedRadial({
        geometry,
        innerRadiusM: 0.05,
        layers: [radialLayer(0.05, { kind: 'constant', conductivityWPerMK: 0.04 })],
        mediumC: 90,
        insideFilmWPerM2K,
        outerFlux: film,
        startC: AIR,
      })
    const { fluxWPerM2, interfacesC } = at(12)
    const areas = { plane: 1, cylinder: 2, sphere: 4 }[geometry]
    expect(12 * (90 - (interfacesC[0] as number))).toBeCloseTo(fluxWPerM2 * areas, 3)
    expect(at(1e9).fluxWPerM2 / at(null).fluxWPerM2).toBeCloseTo(1, 6)
  })
})

test('its reading of a curve is the documented one: straight between points, flat below, last rising slope above', () => {
  fc.assert(
    fc.property(fc.oneof(constantConductivity, pointCurve), within(-250, 1200), (λ, tempC) => {
      expect(radialLayer(0.1, λ).lambda(tempC) / lambdaAt(λ, tempC)).toBeCloseTo(1, 9)
    }),
  )
})
