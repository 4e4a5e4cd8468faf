/** What every answer of the solver owes to the conservation of energy. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { solve } from '#solver/solve.ts'
import type { Shape, Solution, System } from '#solver/types.ts'
import { anySystem } from './arbitraries.ts'
import { meanConductivity } from './oracle.ts'
import { flowsOf } from './systems.ts'

describe('the energy balance', () => {
  test('closes: what the film takes away comes through every layer, to 1e-9 of the larger flow', () => {
    fc.assert(
      fc.property(anySystem, (system) => {
        const solution = solve(system)
        for (const face of solution.faces) {
          const { convection, radiation, sun, larger } = flowsOf(system, face)
          expect(Math.abs(convection + radiation + sun - face.heatFluxWPerM2)).toBeLessThan(
            1e-9 * larger,
          )
          expect(face.interfaceTempsC).toHaveLength(system.layers.length + 1)
          expect(face.interfaceTempsC.at(-1)).toBe(face.surfaceTempC)
          carried(system, solution, face).forEach((flux) => {
            expect(Math.abs(flux - face.heatFluxWPerM2)).toBeLessThan(1e-9 * larger)
          })
        }
      }),
      { numRuns: 1000 },
    )
  })

  test('is the area mean of the faces, and per metre the flux on the outer area', () => {
    fc.assert(
      fc.property(anySystem, (system) => {
        const solution = solve(system)
        const mean = (pick: (face: Solution['faces'][number]) => number) =>
          solution.faces.reduce((sum, face) => sum + face.share * pick(face), 0)
        expect(solution.heatFluxWPerM2).toBeCloseTo(
          mean((face) => face.heatFluxWPerM2),
          9,
        )
        expect(solution.surfaceTempC).toBeCloseTo(
          mean((face) => face.surfaceTempC),
          9,
        )
        expect(solution.convectionWPerM2K).toBeCloseTo(
          mean((face) => face.convectionWPerM2K),
          9,
        )
        expect(solution.radiationWPerM2K).toBeCloseTo(
          mean((face) => face.radiationWPerM2K),
          9,
        )
        solution.interfaceTempsC.forEach((tempC, index) => {
          expect(tempC).toBeCloseTo(
            mean((face) => face.interfaceTempsC[index] ?? Number.NaN),
            9,
          )
        })
        expect(solution.heatFlowWPerUnit).toBe(
          solution.heatFluxWPerM2 * solution.outerAreaM2PerUnit,
        )
        expect(solution.heatLossWPerM).toBe(
          solution.unit === 'm' ? solution.heatFlowWPerUnit : null,
        )
      }),
      { numRuns: 300 },
    )
  })
})

/**
 * The flux through each layer, from the temperatures on its sides by Fourier's law and Simpson's rule, and the one that
 * the film inside brings; layers whose temperatures cannot show a flux (less than a thousandth of them across) are left out.
 */
function carried(system: System, solution: Solution, face: Solution['faces'][number]): number[] {
  const fluxes: number[] = []
  const { layers, shape: thing, insideFilmWPerM2K, mediumC } = system
  const outerM = solution.outerDiameterM ?? Number.NaN
  const totalM = layers.reduce((sum, { thicknessM }) => sum + thicknessM, 0)
  const innerPerimeterM = thing.kind === 'rect-duct' ? 2 * (thing.widthM + thing.heightM) : 0
  let insideM = 0
  layers.forEach(({ thicknessM, conductivity }, index) => {
    const [inC = 0, outC = 0] = face.interfaceTempsC.slice(index, index + 2)
    const scaleK = Math.max(Math.abs(inC), Math.abs(outC), 1)
    const heat = meanConductivity(conductivity, inC, outC) * (inC - outC)
    let lengthM = thicknessM
    const isShell = thing.kind === 'vessel' && face.side === 'shell'
    if (thing.kind === 'pipe' || thing.kind === 'buried-pipe' || isShell) {
      const radiusM = thing.outerDiameterM / 2 + insideM
      lengthM = (outerM / 2) * (Math.log(radiusM + thicknessM) - Math.log(radiusM))
    }
    const innerM = ballDiameterM(thing, face)
    if (innerM !== null) {
      const radiusM = innerM / 2 + insideM
      lengthM = ((innerM / 2 + totalM) ** 2 * thicknessM) / (radiusM * (radiusM + thicknessM))
    }
    if (thing.kind === 'rect-duct') {
      const meanPerimeterM = innerPerimeterM + 8 * insideM + 4 * thicknessM
      lengthM = (thicknessM * (innerPerimeterM + 8 * totalM)) / meanPerimeterM
    }
    insideM += thicknessM
    // A difference of two temperatures has lost the digits that both share.
    if (Math.abs(inC - outC) > 1e-3 * scaleK) fluxes.push(heat / lengthM)
  })
  const inC = face.interfaceTempsC[0] ?? 0
  // The solver closes the balance to 1e-12 of this span, and what is left over shows in the film inside.
  const spanK = Math.abs(mediumC - system.around.surroundingsC)
  if (
    insideFilmWPerM2K !== null &&
    Math.abs(mediumC - inC) > 0.02 * Math.max(Math.abs(mediumC), spanK, 1)
  ) {
    const ballM = ballDiameterM(thing, face)
    const growth =
      thing.kind === 'pipe' || thing.kind === 'buried-pipe' || face.side === 'shell'
        ? 1 + (2 * totalM) / (outerM - 2 * totalM)
        : ballM !== null
          ? (1 + (2 * totalM) / ballM) ** 2
          : thing.kind === 'rect-duct'
            ? 1 + (8 * totalM) / innerPerimeterM
            : 1
    fluxes.push((insideFilmWPerM2K * (mediumC - inC)) / growth)
  }
  if (insideFilmWPerM2K === null) expect(inC).toBeCloseTo(mediumC, 6)
  return fluxes
}

/** Diameter of the bare sphere that a sphere or a domed head conducts as [m]; null for other faces. */
function ballDiameterM(thing: Shape, face: Solution['faces'][number]): number | null {
  if (thing.kind === 'sphere') return thing.outerDiameterM
  if (thing.kind !== 'vessel' || thing.heads === 'flat' || face.side === 'shell') return null
  // A half ellipsoid of axes D/2, D/2, D/4 has 0.345 D² π (Beyer, Standard Mathematical Tables: oblate spheroid).
  const eccentricity = Math.sqrt(3) / 2
  const areaM2 =
    (Math.PI / 4) *
    thing.outerDiameterM ** 2 *
    (1 + (0.25 / (2 * eccentricity)) * Math.log((1 + eccentricity) / (1 - eccentricity)))
  return 2 * Math.sqrt(areaM2 / (2 * Math.PI))
}
