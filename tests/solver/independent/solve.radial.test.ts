/**
 * The solver beside finite volumes: its closed forms of conduction against the conservation law on a grid.
 *
 * The film is not what is examined here: it is read off a bare thing of the outer size, as the solver gives it, so that
 * both close the same balance and any difference is conduction.
 */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { solve } from '#solver/solve.ts'
import type { Conductivity, Layer, Shape, System } from '#solver/types.ts'
import { constantConductivity, spread, within } from '../arbitraries.ts'
import { hasJump } from '../systems.ts'
import { type RadialGeometry, radialLayer, refinedRadial } from './radial-conduction.ts'

/** Curves with corners up to sevenfold steep within 100 K, rising, falling and jagged. */
const steepCurve: fc.Arbitrary<Conductivity> = fc
  .uniqueArray(fc.integer({ min: -2, max: 7 }), { minLength: 2, maxLength: 5 })
  .chain((hundreds) =>
    fc
      .array(spread(0.02, 0.15), { minLength: hundreds.length, maxLength: hundreds.length })
      .map((valuesWPerMK) => ({
        kind: 'curve',
        basis: 'point',
        pointsC: hundreds.sort((one, two) => one - two).map((hundred) => hundred * 100),
        valuesWPerMK,
      })),
  )

const layers: fc.Arbitrary<Layer[]> = fc.array(
  fc.record({
    thicknessM: spread(0.003, 0.3),
    conductivity: fc.oneof(
      { weight: 1, arbitrary: constantConductivity },
      { weight: 3, arbitrary: steepCurve },
    ),
  }),
  { minLength: 1, maxLength: 4 },
)

type Round = Extract<Shape, { outerDiameterM: number }>

const shapes: Record<RadialGeometry, fc.Arbitrary<Shape>> = {
  plane: spread(0.1, 20).map((characteristicLengthM) => ({
    kind: 'flat',
    facing: 'vertical',
    characteristicLengthM,
  })),
  cylinder: spread(0.01, 2).map((outerDiameterM) => ({
    kind: 'pipe',
    outerDiameterM,
    orientation: 'horizontal',
  })),
  sphere: spread(0.05, 10).map((outerDiameterM) => ({ kind: 'sphere', outerDiameterM })),
}

const around = fc.record({
  airC: within(-40, 50),
  surroundingsC: within(-40, 50),
  windMPerS: fc.oneof(fc.constant(0), spread(0.1, 30)),
  altitudeM: fc.constant(0),
})

/** Hot and cold, with the film of the shape or one fixed coefficient. */
const systemsOf = (geometry: RadialGeometry): fc.Arbitrary<System> =>
  fc.record({
    shape: shapes[geometry],
    layers,
    emissivity: within(0.05, 1),
    mediumC: fc.oneof(within(-190, 0), within(60, 650)),
    insideFilmWPerM2K: fc.oneof(fc.constant(null), spread(2, 1e3)),
    around,
    sunAbsorbedWPerM2: fc.oneof(fc.constant(0), within(10, 800)),
    film: fc.oneof(
      fc.constant('detailed' as const),
      spread(1, 50).map((fixedWPerM2K) => ({ fixedWPerM2K })),
    ),
    inclinedFilm: fc.constant('lower' as const),
  })

const isRound = (shape: Shape): shape is Round => 'outerDiameterM' in shape

/** The film of a system as the solver gives it for a bare thing of the outer size at a surface temperature. */
function outerFluxOf(system: System): (surfaceC: number) => number {
  const totalM = system.layers.reduce((sum, { thicknessM }) => sum + thicknessM, 0)
  const shape = isRound(system.shape)
    ? { ...system.shape, outerDiameterM: system.shape.outerDiameterM + 2 * totalM }
    : system.shape
  const bare: System = { ...system, shape, layers: [], insideFilmWPerM2K: null }
  return (surfaceC) => solve({ ...bare, mediumC: surfaceC }).heatFluxWPerM2
}

/** No case may come near the loosest bounds: λ read at the mean temperature instead would miss by per cents. */
const WORST_SHARE = 5e-4

describe.each([
  ['plane', 120],
  ['cylinder', 160],
  ['sphere', 120],
] as const)('layers of a %s', (geometry, numRuns) => {
  test('conduct as finite volumes do, within the error of the grid', () => {
    fc.assert(
      fc.property(systemsOf(geometry), (system) => {
        const solution = solve(system)
        fc.pre(!hasJump(solution))
        const grid = refinedRadial({
          geometry,
          innerRadiusM: isRound(system.shape) ? system.shape.outerDiameterM / 2 : 0,
          layers: system.layers.map((layer) => radialLayer(layer.thicknessM, layer.conductivity)),
          mediumC: system.mediumC,
          insideFilmWPerM2K: system.insideFilmWPerM2K,
          outerFlux: outerFluxOf(system),
          startC: system.around.airC,
        })
        // A bound that is loose would prove nothing.
        expect(grid.gridErrorShare).toBeLessThan(5e-3)
        const bound = Math.min(grid.gridErrorShare + 1e-6, WORST_SHARE)
        const flux = Math.abs(solution.heatFluxWPerM2)
        expect(Math.abs(grid.fluxWPerM2 - solution.heatFluxWPerM2)).toBeLessThanOrEqual(
          bound * Math.max(flux, 0.1),
        )
        const dropK = Math.max(1, Math.abs(system.mediumC - solution.surfaceTempC))
        expect(grid.interfacesC).toHaveLength(solution.interfaceTempsC.length)
        grid.interfacesC.forEach((tempC, j) => {
          expect(Math.abs(tempC - (solution.interfaceTempsC[j] as number))).toBeLessThanOrEqual(
            bound * dropK,
          )
        })
      }),
      { numRuns },
    )
  })
})
