/** What the solver says beside its numbers. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { notesOf } from '#solver/notes.ts'
import { solve } from '#solver/solve.ts'
import type { Solution, System } from '#solver/types.ts'
import {
  detailedSystem,
  layersOf,
  meanCurve,
  pointCurve,
  systemOf,
  unfacing,
} from './arbitraries.ts'
import { filmNumbers } from './oracle.ts'
import { constant, flowsOf, hasJump, plainFilm, still } from './systems.ts'

describe('a note on a conductivity curve', () => {
  const codes = (system: System, solution: Solution) =>
    notesOf(system, solution)
      .filter(({ code }) => code === 'conductivity-extrapolated')
      .map(({ text }) => text)

  test('stands exactly for the layers whose mean temperature lies beyond their curve', () => {
    fc.assert(
      fc.property(systemOf(layersOf(fc.oneof(pointCurve, meanCurve), 1)), (system) => {
        const solution = solve(system)
        const beyond = system.layers.flatMap(({ conductivity }, index) => {
          if (conductivity.kind !== 'curve') return []
          const [first = 0, last = 0] = [conductivity.pointsC[0], conductivity.pointsC.at(-1)]
          const isBeyond = solution.faces.some(({ interfaceTempsC }) => {
            const meanC = ((interfaceTempsC[index] ?? 0) + (interfaceTempsC[index + 1] ?? 0)) / 2
            return meanC < first || meanC > last
          })
          return isBeyond ? [`Layer ${index + 1}: `] : []
        })
        const texts = codes(system, solution)
        expect(texts).toHaveLength(beyond.length)
        texts.forEach((text, index) => {
          expect(text.startsWith(beyond[index] ?? '-')).toBe(true)
        })
      }),
      { numRuns: 300 },
    )
  })

  test.each([
    // A flat wall of one constant-valued curve, 20 °C outside: its mean lies halfway to the medium, less the film's part.
    [600, 'above', [0, 200]],
    [-150, 'below', [0, 200]],
  ] as const)('at %d °C says how far %s the curve', (mediumC, side, [first, last]) => {
    const system: System = {
      ...plainFilm,
      shape: { kind: 'flat', facing: 'vertical', characteristicLengthM: 1 },
      layers: [
        {
          thicknessM: 0.1,
          conductivity: {
            kind: 'curve',
            basis: 'point',
            pointsC: [first, last],
            valuesWPerMK: [0.04, 0.04],
          },
        },
      ],
      emissivity: 0.9,
      mediumC,
      around: still(20),
    }
    const solution = solve(system)
    const meanC = (mediumC + solution.surfaceTempC) / 2
    const beyondK = side === 'above' ? meanC - last : first - meanC
    expect(codes(system, solution)).toEqual([
      expect.stringContaining(`${beyondK.toFixed(0)} K ${side} the conductivity curve`),
    ])
    expect(codes(system, solution)[0]).toContain(`${first} to ${last} °C`)
  })
})

describe('the jump of a plate formula', () => {
  // Found by search: at 140 mm (area over perimeter) the driving film passes Ra 8e6 at a surface of 57.4 °C, where its
  // coefficient steps up by 4.5 %. From 336 to 344 °C inside, no surface temperature closes the balance.
  const plate = (mediumC: number, characteristicLengthM = 0.14): System => ({
    ...plainFilm,
    shape: { kind: 'flat', facing: 'up', characteristicLengthM },
    layers: [constant(0.05, 0.04)],
    emissivity: 0.05,
    mediumC,
    around: still(20),
  })

  test.each([336, 338, 340, 342, 344])(
    'at %d °C is said, and the balance closes between both sides',
    (mediumC) => {
      const system = plate(mediumC)
      const solution = solve(system)
      const [face] = solution.faces
      expect(face?.closure).toBe('on-jump')
      expect(notesOf(system, solution).map(({ code }) => code)).toEqual(['film-jump'])
      expect(solution.interfaceTempsC[0]).toBeCloseTo(mediumC, 8)
      const { rayleigh, prandtl, airConductivityWPerMK } = filmNumbers(
        system,
        0,
        solution.surfaceTempC,
      )
      expect(rayleigh / 8e6).toBeCloseTo(1, 9)
      const perNusselt = airConductivityWPerMK / 0.14
      expect(solution.convectionWPerM2K).toBeGreaterThan(0.54 * 8e6 ** 0.25 * perNusselt)
      expect(solution.convectionWPerM2K).toBeLessThan(0.15 * 8e6 ** (1 / 3) * perNusselt)
      expect(prandtl).toBeCloseTo(0.7, 1)
      const { convection, radiation } = flowsOf(system, face ?? expect.fail('no face'))
      expect((convection + radiation) / solution.heatFluxWPerM2).toBeCloseTo(1, 9)
      expect((solution.interfaceTempsC[0] ?? 0) - solution.surfaceTempC).toBeCloseTo(
        (solution.heatFluxWPerM2 * 0.05) / 0.04,
        8,
      )
    },
  )

  test.each([300, 380])('at %d °C there is none and nothing is said', (mediumC) => {
    const system = plate(mediumC)
    expect(notesOf(system, solve(system))).toEqual([])
  })

  // 0.54 Ra^(1/4) at 8e6 is 28.72; 0.15 Ra^(1/3) is 30.00: the formula steps up by 4 %.
  test.each([330, 350])('at %d °C the balance closes beside it, and that is said', (mediumC) => {
    const system = plate(mediumC)
    const solution = solve(system)
    expect(solution.faces[0]?.closure).toBe('closed')
    const [note, ...more] = notesOf(system, solution)
    expect(more).toEqual([])
    expect(note?.code).toBe('film-jump')
    expect(note?.text).toMatch(/is near 8 × 10⁶, where the formula rises by 4 %\.$/)
  })

  test('stands in no answer of a shape whose film has no step', () => {
    fc.assert(
      fc.property(detailedSystem, unfacing, (system, thing) => {
        expect(hasJump(solve({ ...system, shape: thing }))).toBe(false)
      }),
      { numRuns: 300 },
    )
  })
})
