/** Sun, soil, leaning pipes, the simplified set: what each of them must do to an answer, and what a search costs. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  simplifiedFreePipe,
  simplifiedFreeWall,
  simplifiedWindOnPipe,
  simplifiedWindOnWall,
} from '#solver/convection/simplified.ts'
import { solve } from '#solver/solve.ts'
import type { Shape, System } from '#solver/types.ts'
import {
  anySystem,
  constantConductivity,
  detailedSystem,
  layersOf,
  ofField,
  pointCurve,
  rising,
  spread,
  systemOf,
  unfacing,
  within,
} from './arbitraries.ts'
import { constant, hasJump, plainFilm, still } from './systems.ts'

const slackK = ({ mediumC, around }: System): number =>
  1e-9 * Math.max(1, Math.abs(mediumC), Math.abs(around.surroundingsC), Math.abs(around.airC))

describe('the sun', () => {
  test('never cools a surface, and the medium never loses more for it', () => {
    fc.assert(
      fc.property(detailedSystem, unfacing, ofField('solarWPerM2'), (system, shape, moreW) => {
        const before = solve({ ...system, shape })
        const sunAbsorbedWPerM2 = system.sunAbsorbedWPerM2 + moreW
        const after = solve({ ...system, shape, sunAbsorbedWPerM2 })
        expect(after.surfaceTempC).toBeGreaterThanOrEqual(before.surfaceTempC - slackK(system))
        expect(after.heatFluxWPerM2).toBeLessThanOrEqual(
          before.heatFluxWPerM2 + 1e-8 * Math.max(1, Math.abs(before.heatFluxWPerM2), moreW),
        )
      }),
      { numRuns: 500 },
    )
  })
})

describe('an inclined pipe', () => {
  test('has one of the films of the lying and the upright pipe, the lower or the higher', () => {
    fc.assert(
      fc.property(anySystem, rising, (system, pipe) => {
        const film = (shape: Shape, inclinedFilm: System['inclinedFilm']) =>
          solve({
            ...system,
            layers: [],
            insideFilmWPerM2K: null,
            shape,
            inclinedFilm,
            around: { ...system.around, windMPerS: 0 },
          }).convectionWPerM2K
        const { outerDiameterM } = pipe
        const lying = film({ kind: 'pipe', outerDiameterM, orientation: 'horizontal' }, 'lower')
        const upright = film({ ...pipe, orientation: 'vertical' }, 'lower')
        const inclined = { ...pipe, orientation: 'inclined' as const }
        expect(film(inclined, 'lower') / Math.min(lying, upright)).toBeCloseTo(1, 9)
        expect(film(inclined, 'higher') / Math.max(lying, upright)).toBeCloseTo(1, 9)
      }),
      { numRuns: 300 },
    )
  })

  test('is hotter outside by the lower film and loses more by the higher one, in still air as warm as its surroundings', () => {
    fc.assert(
      fc.property(systemOf(layersOf(constantConductivity, 1)), rising, (system, pipe) => {
        const { airC, altitudeM } = system.around
        const at = (inclinedFilm: System['inclinedFilm']) =>
          solve({
            ...system,
            shape: { ...pipe, orientation: 'inclined' },
            inclinedFilm,
            sunAbsorbedWPerM2: 0,
            film: 'simplified',
            around: { airC, surroundingsC: airC, windMPerS: 0, altitudeM },
          })
        const [lower, higher] = [at('lower'), at('higher')]
        const excess = ({ surfaceTempC }: { surfaceTempC: number }) => Math.abs(surfaceTempC - airC)
        expect(excess(lower)).toBeGreaterThanOrEqual(excess(higher) - slackK(system))
        expect(Math.abs(lower.heatFluxWPerM2)).toBeLessThanOrEqual(
          Math.abs(higher.heatFluxWPerM2) * (1 + 1e-8) + 1e-9,
        )
      }),
      { numRuns: 300 },
    )
  })
})

describe('a buried pipe', () => {
  test('loses less the deeper it lies', () => {
    fc.assert(
      fc.property(
        systemOf(layersOf(pointCurve)),
        spread(0.01, 2),
        spread(1, 50),
        spread(1.001, 20),
        ofField('soilWPerMK'),
        (system, outerDiameterM, cover, deeper, soilWPerMK) => {
          const at = (depthM: number) =>
            Math.abs(
              solve({
                ...system,
                sunAbsorbedWPerM2: 0,
                shape: { kind: 'buried-pipe', outerDiameterM, depthM, soilWPerMK },
              }).heatLossWPerM ?? Number.NaN,
            )
          const depthM = (outerDiameterM / 2) * cover
          expect(at(depthM * deeper)).toBeLessThanOrEqual(at(depthM) * (1 + 1e-9) + 1e-9)
        },
      ),
      { numRuns: 300 },
    )
  })

  // Bare, at 80 °C, axis 1 m deep, 0.2 m across, in soil of 1.5 W/(m·K) under ground of 10 °C, by hand:
  // arcosh(10) = 2.99322; 2π·1.5·70/2.99322 = 220.41 W/m.
  test('bare loses by the shape factor alone', () => {
    const shape = { kind: 'buried-pipe', outerDiameterM: 0.2, depthM: 1, soilWPerMK: 1.5 } as const
    const solution = solve({ ...plainFilm, shape, layers: [], mediumC: 80, around: still(10) })
    expect(solution.heatLossWPerM).toBeCloseTo(220.41, 2)
  })
})

describe('the simplified set', () => {
  test('is the larger of its own still-air and wind formulas at the surface that it gives', () => {
    fc.assert(
      fc.property(anySystem, unfacing, (given, thing) => {
        fc.pre(thing.kind === 'pipe' || thing.kind === 'flat')
        const system: System = { ...given, shape: thing, film: 'simplified' }
        const solution = solve(system)
        fc.pre(!hasJump(solution))
        const differenceK = Math.abs(solution.surfaceTempC - system.around.airC)
        const { windMPerS } = system.around
        const lengthM = thing.kind === 'flat' ? thing.characteristicLengthM : 0
        const diameterM = solution.outerDiameterM ?? 0
        const expected =
          thing.kind === 'flat'
            ? [
                simplifiedFreeWall({ differenceK, heightM: lengthM }),
                simplifiedWindOnWall({ windMPerS, lengthM }),
              ]
            : [
                simplifiedFreePipe({ differenceK, diameterM }),
                windMPerS > 0 ? simplifiedWindOnPipe({ windMPerS, diameterM }) : 0,
              ]
        fc.pre(differenceK > 0.01)
        expect(solution.convectionWPerM2K / Math.max(...expected)).toBeCloseTo(1, 9)
      }),
      { numRuns: 500 },
    )
  })
})

describe('the looks at the film that a search takes', () => {
  const share = (looks: number[], part: number): number =>
    looks.sort((a, b) => a - b)[Math.floor(part * looks.length)] ?? Number.NaN

  const pipes = fc
    .tuple(
      detailedSystem,
      spread(0.01, 2),
      spread(0.01, 0.3),
      spread(0.01, 0.2),
      within(-200, 1000),
    )
    .map(
      ([system, outerDiameterM, thicknessM, λ, mediumC]): System => ({
        ...system,
        shape: { kind: 'pipe', outerDiameterM, orientation: 'horizontal' },
        layers: [constant(thicknessM, λ)],
        sunAbsorbedWPerM2: 0,
        mediumC,
      }),
    )

  test('on lagged pipes are 5 or fewer in the middle, 6 for 99 of 100, never more than 10', () => {
    const looks = fc.sample(pipes, 5000).map((system) => solve(system).filmEvaluations)
    expect(share(looks, 0.5)).toBeLessThanOrEqual(5)
    expect(share(looks, 0.99)).toBeLessThanOrEqual(6)
    expect(Math.max(...looks)).toBeLessThanOrEqual(10)
  })

  // Curves that leap from point to point make the search halve its bracket down to the last bits.
  test('on anything are 5 or fewer a face in the middle, and never more than the 302 of a jump', () => {
    const looks = fc.sample(anySystem, 5000).map((system) => {
      const { filmEvaluations, faces } = solve(system)
      return filmEvaluations / faces.length
    })
    expect(share(looks, 0.5)).toBeLessThanOrEqual(5)
    expect(share(looks, 0.99)).toBeLessThanOrEqual(16)
    expect(Math.max(...looks)).toBeLessThanOrEqual(302)
  })
})
