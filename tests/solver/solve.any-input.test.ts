/** Whatever a run may hold: the solver answers in numbers, the same each time. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { notesOf } from '#solver/notes.ts'
import { solve } from '#solver/solve.ts'
import type { System } from '#solver/types.ts'
import { anySystem } from './arbitraries.ts'
import { constant, lying, radiates } from './systems.ts'

const noteCodes = [
  'film-range',
  'film-jump',
  'film-method',
  'duct-corners',
  'vessel-heads',
  'soil-shallow',
  'conductivity-extrapolated',
  'conductivity-steep',
]

describe('for any input', () => {
  test('every number is finite, every coefficient positive, the notes have text', () => {
    fc.assert(
      fc.property(anySystem, (system) => {
        const solution = solve(system)
        expect(numbersIn(solution).every(Number.isFinite)).toBe(true)
        for (const face of solution.faces) {
          expect(face.convectionWPerM2K).toBeGreaterThanOrEqual(0)
          if (radiates(system)) expect(face.radiationWPerM2K).toBeGreaterThan(0)
          else expect(face.radiationWPerM2K).toBe(0)
        }
        for (const { code, text } of notesOf(system, solution)) {
          expect(noteCodes).toContain(code)
          expect(text).toMatch(/^\S.*\.$/)
        }
      }),
      { numRuns: 2000 },
    )
  })

  const extremes: [keyof System | 'shape', readonly Partial<System>[]][] = [
    [
      'shape',
      [
        { shape: lying(0.001) },
        { shape: lying(20) },
        { shape: { kind: 'rect-duct', widthM: 0.01, heightM: 50, riseM: null } },
        { shape: { kind: 'pipe', outerDiameterM: 0.001, orientation: 'vertical', riseM: 500 } },
        { shape: { kind: 'pipe', outerDiameterM: 0.001, orientation: 'inclined', riseM: 500 } },
        { shape: { kind: 'sphere', outerDiameterM: 0.001 } },
        { shape: { kind: 'buried-pipe', outerDiameterM: 2, depthM: 1, soilWPerMK: 5 } },
        {
          shape: {
            kind: 'vessel',
            outerDiameterM: 20,
            shellLengthM: 0.01,
            orientation: 'vertical',
            heads: 'flat',
          },
        },
        {
          shape: {
            kind: 'vessel',
            outerDiameterM: 0.05,
            shellLengthM: 100,
            orientation: 'horizontal',
            heads: 'domed',
          },
        },
      ],
    ],
    ['mediumC', [{ mediumC: -200 }, { mediumC: 1000 }]],
    ['emissivity', [{ emissivity: 0.01 }, { emissivity: 1 }]],
    ['sunAbsorbedWPerM2', [{ sunAbsorbedWPerM2: 0 }, { sunAbsorbedWPerM2: 1400 }]],
    [
      'film',
      [
        { film: 'detailed', inclinedFilm: 'lower' },
        { film: 'simplified', inclinedFilm: 'higher' },
        { film: { fixedWPerM2K: 0.1 }, inclinedFilm: 'lower' },
      ],
    ],
    [
      'layers',
      [
        { layers: [constant(1e-4, 5)] },
        { layers: [constant(1, 0.001), constant(1e-4, 5), constant(1, 0.001)] },
        { layers: [] },
      ],
    ],
    [
      'insideFilmWPerM2K',
      [{ insideFilmWPerM2K: null }, { insideFilmWPerM2K: 0.1 }, { insideFilmWPerM2K: 1e6 }],
    ],
    [
      'around',
      [
        { around: { airC: -70, surroundingsC: 400, windMPerS: 60, altitudeM: 6000 } },
        { around: { airC: 200, surroundingsC: -100, windMPerS: 0, altitudeM: -500 } },
        { around: { airC: 200, surroundingsC: 200, windMPerS: 1e-6, altitudeM: 6000 } },
      ],
    ],
  ]
  test('all ends at once are finite', () => {
    const systems = extremes.reduce<Partial<System>[]>(
      (all, [, choices]) => all.flatMap((one) => choices.map((choice) => ({ ...one, ...choice }))),
      [{}],
    )
    expect(systems).toHaveLength(9 * 2 * 2 * 3 * 3 * 3 * 2 * 3)
    for (const system of systems) {
      expect(
        numbersIn(solve(system as System)).every(Number.isFinite),
        JSON.stringify(system),
      ).toBe(true)
    }
  })

  test('the same input gives the same bits', () => {
    fc.assert(
      fc.property(anySystem, (system) => {
        expect(solve(structuredClone(system))).toStrictEqual(solve(system))
      }),
      { numRuns: 200 },
    )
  })

  test('the input is left as it was', () => {
    fc.assert(
      fc.property(anySystem, (system) => {
        const before = JSON.stringify(system)
        solve(system)
        expect(JSON.stringify(system)).toBe(before)
      }),
      { numRuns: 100 },
    )
  })
})

function numbersIn(value: unknown): number[] {
  if (typeof value === 'number') return [value]
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(numbersIn) : []
}
