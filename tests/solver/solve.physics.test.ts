/** What physics asks of every answer, and how answers scale. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { standardPressurePa } from '#solver/properties/air.ts'
import { solve } from '#solver/solve.ts'
import type { Layer, System } from '#solver/types.ts'
import {
  anySystem,
  around,
  constantConductivity,
  layersOf,
  ofField,
  spread,
  systemOf,
  unfacing,
  within,
} from './arbitraries.ts'
import { constant, lying, plainFilm, radiates, still } from './systems.ts'

describe('what physics asks of every answer', () => {
  test('temperatures fall one way from the medium to the surface', () => {
    fc.assert(
      fc.property(anySystem, (system) => {
        for (const { interfaceTempsC, heatFluxWPerM2 } of solve(system).faces) {
          const slack = 1e-9 * Math.max(1, Math.abs(system.mediumC - system.around.surroundingsC))
          const path = [system.mediumC, ...interfaceTempsC]
          path.slice(1).forEach((tempC, index) => {
            const drop = (path[index] ?? 0) - tempC
            expect(heatFluxWPerM2 >= 0 ? drop : -drop).toBeGreaterThanOrEqual(-slack)
          })
        }
      }),
      { numRuns: 500 },
    )
  })

  test('the surface lies between the coldest and the hottest of medium, air and surroundings', () => {
    fc.assert(
      fc.property(anySystem, (system) => {
        const { airC, surroundingsC } = system.around
        for (const { surfaceTempC } of solve({ ...system, sunAbsorbedWPerM2: 0 }).faces) {
          expect(surfaceTempC).toBeGreaterThanOrEqual(
            Math.min(airC, surroundingsC, system.mediumC) - 1e-9,
          )
          expect(surfaceTempC).toBeLessThanOrEqual(
            Math.max(airC, surroundingsC, system.mediumC) + 1e-9,
          )
        }
      }),
      { numRuns: 500 },
    )
  })

  test('nothing flows where medium, air and surroundings are at one temperature', () => {
    fc.assert(
      fc.property(anySystem, ofField('airC'), (system, tempC) => {
        const solution = solve({
          ...system,
          sunAbsorbedWPerM2: 0,
          mediumC: tempC,
          around: { ...system.around, airC: tempC, surroundingsC: tempC },
        })
        expect(solution.heatFluxWPerM2).toBe(0)
        expect(Math.abs(solution.heatLossWPerM ?? 0)).toBe(0)
        for (const face of solution.faces) {
          expect(face.surfaceTempC).toBe(tempC)
          for (const t of face.interfaceTempsC) expect(t).toBe(tempC)
        }
      }),
      { numRuns: 200 },
    )
  })

  test('a hotter medium never loses less', () => {
    fc.assert(
      fc.property(anySystem, unfacing, within(0.1, 100), (system, thing, moreK) => {
        const cool = solve({ ...system, shape: thing })
        const hot = solve({ ...system, shape: thing, mediumC: system.mediumC + moreK })
        expect(hot.heatFluxWPerM2).toBeGreaterThan(
          cool.heatFluxWPerM2 - 1e-9 * Math.abs(cool.heatFluxWPerM2),
        )
      }),
      { numRuns: 400 },
    )
  })

  test('beyond the critical radius more lagging never loses more, with surroundings at air', () => {
    fc.assert(
      fc.property(
        spread(0.01, 2),
        spread(0.02, 0.2),
        spread(0.005, 0.3),
        spread(1e-4, 0.1),
        ofField('emissivity'),
        within(-150, 600),
        within(-30, 50),
        spread(0.01, 20),
        (outerDiameterM, λ, thicknessM, moreM, emissivity, mediumC, airC, windMPerS) => {
          const at = (thickM: number) =>
            solve({
              ...plainFilm,
              shape: lying(outerDiameterM),
              layers: [constant(thickM, λ)],
              emissivity,
              mediumC,
              around: { airC, surroundingsC: airC, windMPerS, altitudeM: 0 },
            })
          const thin = at(thicknessM)
          // The film itself gets weaker with size, so the true peak lies below 2λ/h in diameter; twice that is beyond it.
          const film = thin.convectionWPerM2K + thin.radiationWPerM2K
          fc.pre((thin.outerDiameterM ?? 0) > (4 * λ) / film)
          expect(Math.abs(at(thicknessM + moreM).heatLossWPerM ?? 0)).toBeLessThanOrEqual(
            Math.abs(thin.heatLossWPerM ?? 0) * (1 + 1e-9),
          )
        },
      ),
      { numRuns: 400 },
    )
  })

  test('below the critical radius lagging a thin pipe makes it lose more', () => {
    const at = (layers: Layer[]) =>
      solve({
        ...plainFilm,
        shape: lying(0.003),
        layers,
        emissivity: 0.1,
        mediumC: 90,
        around: still(20),
      }).heatLossWPerM ?? 0
    expect(at([constant(0.002, 0.3)])).toBeGreaterThan(at([]))
  })

  test('a black surface loses at least as much as a bright one when its surroundings are at air', () => {
    fc.assert(
      fc.property(anySystem, unfacing, ofField('emissivity'), (system, thing, other) => {
        const at = (emissivity: number) =>
          solve({
            ...system,
            shape: thing,
            emissivity,
            sunAbsorbedWPerM2: 0,
            around: { ...system.around, surroundingsC: system.around.airC },
          })
        const [bright, black] = [
          at(Math.min(other, system.emissivity)),
          at(Math.max(other, system.emissivity)),
        ]
        expect(Math.abs(black.heatFluxWPerM2)).toBeGreaterThanOrEqual(
          Math.abs(bright.heatFluxWPerM2) * (1 - 1e-9),
        )
      }),
      { numRuns: 300 },
    )
  })

  test('a layer that conducts beyond measure is as good as none on a flat surface', () => {
    fc.assert(
      fc.property(around, within(-100, 500), (air, mediumC) => {
        const at = (layers: Layer[]) =>
          solve({
            ...plainFilm,
            shape: { kind: 'flat', facing: 'vertical', characteristicLengthM: 2 },
            layers,
            emissivity: 0.7,
            mediumC,
            around: air,
          }).heatFluxWPerM2
        expect(at([constant(0.001, 1e9)]) / at([])).toBeCloseTo(1, 8)
      }),
      { numRuns: 100 },
    )
  })
})

describe('scaling', () => {
  const pipes = systemOf(layersOf(constantConductivity, 1)).map((system) => ({
    ...system,
    shape: lying(0.1),
    film: 'detailed' as const,
  }))

  // Free convection knows air only through Ra ∝ p²L³: at half the pressure, a thing 2^(2/3) times as large has the
  // same Nusselt number, so its coefficient falls as 1/L.
  test('pressure and size trade in the Rayleigh number', () => {
    fc.assert(
      fc.property(
        spread(0.002, 0.5),
        within(-50, 150),
        within(-200, 1000),
        within(0, 6000),
        (d, airC, mediumC, altitudeM) => {
          const factor = (standardPressurePa(0) / standardPressurePa(altitudeM)) ** (2 / 3)
          const at = (outerDiameterM: number, altitude: number) =>
            solve({
              ...plainFilm,
              shape: lying(outerDiameterM),
              layers: [],
              emissivity: 0.5,
              mediumC,
              around: { ...still(airC), altitudeM: altitude },
            }).convectionWPerM2K
          expect((at(d * factor, altitudeM) * factor) / at(d, 0)).toBeCloseTo(1, 9)
        },
      ),
    )
  })

  test('thin air carries less: altitude never raises the convection coefficient', () => {
    fc.assert(
      fc.property(pipes, (system) => {
        const at = (altitudeM: number) =>
          solve({
            ...system,
            layers: [],
            around: { ...system.around, altitudeM },
          }).convectionWPerM2K
        expect(at(5000)).toBeLessThan(at(0))
      }),
    )
  })

  test('twice the emissivity is twice the radiation coefficient at the same surface', () => {
    fc.assert(
      fc.property(anySystem, within(0.01, 0.5), (system, emissivity) => {
        fc.pre(radiates(system))
        const at = (e: number) =>
          solve({ ...system, layers: [], insideFilmWPerM2K: null, emissivity: e }).radiationWPerM2K
        expect(at(2 * emissivity) / at(emissivity)).toBeCloseTo(2, 12)
      }),
      { numRuns: 100 },
    )
  })

  test('conductivities and inside film times any factor, films apart, leave the split of the drop alone', () => {
    fc.assert(
      fc.property(pipes, spread(0.1, 10), (system, factor) => {
        // With every resistance inside scaled alike, the interface temperatures keep their shares of the drop.
        const scaled: System = {
          ...system,
          layers: system.layers.map(({ thicknessM, conductivity }) => ({
            thicknessM,
            conductivity:
              conductivity.kind === 'constant'
                ? { kind: 'constant', conductivityWPerMK: conductivity.conductivityWPerMK * factor }
                : conductivity,
          })),
          insideFilmWPerM2K:
            system.insideFilmWPerM2K === null ? null : system.insideFilmWPerM2K * factor,
        }
        const shares = (given: System): number[] => {
          const { interfaceTempsC, surfaceTempC } = solve(given)
          return interfaceTempsC.map((t) => (given.mediumC - t) / (given.mediumC - surfaceTempC))
        }
        const before = solve(system)
        fc.pre(Math.abs(system.mediumC - before.surfaceTempC) > 1)
        fc.pre(Math.abs(system.mediumC - solve(scaled).surfaceTempC) > 1)
        const after = shares(scaled)
        shares(system).forEach((share, index) => {
          expect(after[index]).toBeCloseTo(share, 7)
        })
      }),
      { numRuns: 200 },
    )
  })
})
