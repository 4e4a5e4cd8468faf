/** The solver beside a second implementation that shares nothing with it. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { nusseltSlenderCylinder, nusseltVerticalPlate } from '#solver/convection/natural.ts'
import { solve } from '#solver/solve.ts'
import type { System } from '#solver/types.ts'
import {
  anySystem,
  constantConductivity,
  layersOf,
  meanCurve,
  pointCurve,
  spread,
  systemOf,
  unfacing,
} from './arbitraries.ts'
import { filmNumbers, missK, oracle } from './oracle.ts'
import { flowsOf, hasJump } from './systems.ts'

// The second implementation takes milliseconds where the solver takes microseconds.
describe('beside a second implementation', { timeout: 60_000 }, () => {
  const agrees = (system: System): void => {
    const solution = solve(system)
    // On a jump of a plate formula there is no film to agree on; `film-jump` has its own tests.
    if (hasJump(solution)) return
    const answer = oracle(system)
    solution.faces.forEach((face, index) => {
      const other = answer.surfaces[index]
      const { larger } = flowsOf(system, face)
      expect(other?.side).toBe(face.side)
      expect(Math.abs((other?.flux ?? Number.NaN) - face.heatFluxWPerM2)).toBeLessThan(
        1e-6 * larger,
      )
      face.interfaceTempsC.forEach((tempC, j) => {
        const spanK = Math.max(1, Math.abs(system.mediumC - face.surfaceTempC))
        expect(Math.abs((other?.interfacesC[j] ?? Number.NaN) - tempC)).toBeLessThan(1e-6 * spanK)
      })
    })
  }

  test.each([
    ['constant conductivities', constantConductivity, 300],
    ['point curves', pointCurve, 150],
    ['mean curves', meanCurve, 150],
  ] as const)('pipes and walls with %s agree to 1e-6', (_, conductivity, numRuns) => {
    fc.assert(
      fc.property(systemOf(layersOf(conductivity)), unfacing, (system, thing) => {
        agrees({ ...system, shape: thing })
      }),
      { numRuns },
    )
  })

  // Where a film formula steps down, more than one surface temperature closes the balance, and each solver may find
  // another of them.
  test('every shape agrees to 1e-6 where the balance has one solution', () => {
    fc.assert(
      fc.property(anySystem, (system) => {
        fc.pre(!isNearStepDown(system))
        agrees(system)
      }),
      { numRuns: 250 },
    )
  })

  test('beside a step down the answer still closes the balance, film and layers computed by the other', () => {
    const nearSteps = fc
      .tuple(anySystem, fc.constantFrom('up' as const, 'down' as const), spread(0.005, 0.1))
      .map(([system, facing, characteristicLengthM]) => ({
        ...system,
        shape: { kind: 'flat' as const, facing, characteristicLengthM },
        around: { ...system.around, windMPerS: 0 },
      }))
    fc.assert(
      fc.property(nearSteps, (system) => {
        const solution = solve(system)
        fc.pre(!hasJump(solution) && system.layers.length > 0)
        const spanK = Math.max(1, Math.abs(system.mediumC - solution.surfaceTempC))
        expect(Math.abs(missK(system, 0, solution.surfaceTempC))).toBeLessThan(1e-6 * spanK)
      }),
      { numRuns: 300 },
    )
  })
})

/** True where a formula in use is near a step down: driving flow of a plate at Ra 200 and 1e4, a thin riser at 1e9. */
function isNearStepDown(system: System): boolean {
  return solve(system).faces.some((face, index) => {
    const { kind, rayleigh, prandtl, slenderness } = filmNumbers(system, index, face.surfaceTempC)
    if (kind === 'standing') {
      const atStep = { rayleigh: 1e9, prandtl, slenderness }
      const isThin = nusseltSlenderCylinder(atStep) > nusseltVerticalPlate(atStep)
      return isThin && rayleigh > 1e9 / 1000 && rayleigh < 1e9 * 1000
    }
    if (kind !== 'up' && kind !== 'down') return false
    return [200, 1e4].some((step) => rayleigh > step / 1.5 && rayleigh < step * 1.5)
  })
}
