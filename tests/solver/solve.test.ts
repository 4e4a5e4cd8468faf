import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { beyondCurveK } from '#solver/notes.ts'
import { solve } from '#solver/solve.ts'
import type { Shape, System } from '#solver/types.ts'
import { published } from '../published.ts'
import { anySystem, shape } from './arbitraries.ts'
import { constant, lying, plainFilm, still } from './systems.ts'

const celsius = (tempF: number): number => (tempF - 32) / 1.8

describe('the worked example of a chilled line', () => {
  // 20 mm line at 5 °C under 12.5 mm (outside 45 mm), λ 0.045, ε 0.7, inside film 7087, in air of 30 °C.
  published(
    (given: Pick<System, 'emissivity' | 'mediumC' | 'insideFilmWPerM2K' | 'around'>) =>
      solve({ ...plainFilm, shape: lying(0.02), layers: [constant(0.0125, 0.045)], ...given })
        .surfaceTempC,
    [
      {
        from: 'ASHRAE Handbook Fundamentals 2021, ch. 4, example 12',
        given: { emissivity: 0.7, mediumC: 5, insideFilmWPerM2K: 7087, around: still(30) },
        printed: '24.1',
        within: { absolute: 0.1, because: 'the example carries its coefficients with two digits' },
      },
    ],
  )
})

describe('bare steam lines', () => {
  published(
    ({ outerDiameterM, steamC }: { outerDiameterM: number; steamC: number }) =>
      solve({
        ...plainFilm,
        shape: lying(outerDiameterM),
        layers: [],
        emissivity: 0.8,
        mediumC: steamC,
        around: still(celsius(75)),
      }).heatLossWPerM ?? Number.NaN,
    [
      [0.0603, 366, '527', 'NPS 2, 150 psig'],
      [0.1143, 250, '456', 'NPS 4, 15 psig'],
    ].map(([outerDiameterM, steamF, printed, size]) => ({
      from: `US government tip sheet on steam lines, ${size}`,
      given: { outerDiameterM: Number(outerDiameterM), steamC: celsius(Number(steamF)) },
      printed: String(printed),
      within: { fraction: 0.1, because: 'the sheet does not state its emissivity' },
    })),
  )
})

describe('design coefficients of still indoor air', () => {
  const from = 'Thermal Insulation Handbook (Southern Africa, 2001), still-air coefficients'
  published(
    ({ emissivity }: { emissivity: number }) => {
      const { convectionWPerM2K, radiationWPerM2K } = solve({
        ...plainFilm,
        shape: lying(0.15),
        layers: [],
        emissivity,
        mediumC: 40,
        around: still(20),
      })
      return convectionWPerM2K + radiationWPerM2K
    },
    [
      {
        from: `${from}, mastic, canvas, paint`,
        given: { emissivity: 0.9 },
        printed: '10.0',
        within: { fraction: 0.1, because: 'one value for every size and temperature' },
      },
      {
        from: `${from}, galvanised steel`,
        given: { emissivity: 0.26 },
        printed: '6.3',
        within: { fraction: 0.1, because: 'one value for every size and temperature' },
      },
      {
        from: `${from}, planished`,
        given: { emissivity: 0.5 },
        printed: '8.0',
        within: {
          fraction: 0.1,
          because: 'one value for every size and temperature; "medium emissivity" is taken as 0.5',
        },
      },
      {
        from: `${from}, bright`,
        given: { emissivity: 0.1 },
        printed: '5.7',
        within: {
          fraction: 0.2,
          because: 'one value for every size, temperature and bright metal',
        },
      },
    ],
  )
})

describe('the coefficient inside', () => {
  test('cools a bare duct: its film takes part of the drop', () => {
    const at = (insideFilmWPerM2K: number | null) =>
      solve({
        ...plainFilm,
        shape: { kind: 'rect-duct', widthM: 0.6, heightM: 0.4, riseM: null },
        layers: [],
        emissivity: 0.26,
        mediumC: 60,
        insideFilmWPerM2K,
        around: still(20),
      })
    expect(at(null).surfaceTempC).toBe(60)
    const withFilm = at(15.5)
    for (const face of withFilm.faces) {
      expect(15.5 * (60 - face.surfaceTempC)).toBeCloseTo(face.heatFluxWPerM2, 8)
    }
    expect(withFilm.heatFluxWPerM2).toBeLessThan(at(null).heatFluxWPerM2)
  })
})

describe('shapes beside each other', () => {
  test('the top of a warm duct loses more than its bottom, of a cold duct it gains less', () => {
    const faces = (mediumC: number) =>
      solve({
        ...plainFilm,
        shape: { kind: 'rect-duct', widthM: 0.6, heightM: 0.4, riseM: null },
        layers: [constant(0.03, 0.04)],
        emissivity: 0.9,
        mediumC,
        around: still(20),
      }).faces
    const [, topWarm, bottomWarm] = faces(60)
    expect(topWarm?.surfaceTempC).toBeLessThan(bottomWarm?.surfaceTempC ?? 0)
    const [, topCold, bottomCold] = faces(5)
    expect(topCold?.surfaceTempC).toBeLessThan(bottomCold?.surfaceTempC ?? 0)
  })

  test('facing up warm is facing down cold in a world turned over', () => {
    const at = (facing: 'up' | 'down', mediumC: number) =>
      solve({
        ...plainFilm,
        shape: { kind: 'flat', facing, characteristicLengthM: 0.3 },
        layers: [],
        emissivity: 0.5,
        mediumC,
        around: still(20),
      })
    expect(at('up', 40).convectionWPerM2K).toBeGreaterThan(1.5 * at('down', 40).convectionWPerM2K)
    expect(at('down', 0).convectionWPerM2K).toBeGreaterThan(1.5 * at('up', 0).convectionWPerM2K)
  })

  test('an upright pipe as thick as it is high loses as a wall of that height', () => {
    const at = (thing: Shape) =>
      solve({
        ...plainFilm,
        shape: thing,
        layers: [],
        emissivity: 0.5,
        mediumC: 80,
        around: still(20),
      }).convectionWPerM2K
    const pipe = at({ kind: 'pipe', outerDiameterM: 3, orientation: 'vertical', riseM: 3 })
    expect(pipe).toBe(at({ kind: 'flat', facing: 'vertical', characteristicLengthM: 3 }))
  })

  test('every shape states the measures it has, and only those', () => {
    fc.assert(
      fc.property(anySystem, shape, (system, thing) => {
        const { outerDiameterM, unit, heatLossWPerM } = solve({ ...system, shape: thing })
        const units = {
          pipe: 'm',
          'buried-pipe': 'm',
          'rect-duct': 'm',
          flat: 'm2',
          sphere: 'piece',
          vessel: 'piece',
        } as const
        expect(unit).toBe(units[thing.kind])
        expect(outerDiameterM === null).toBe(thing.kind === 'flat' || thing.kind === 'rect-duct')
        expect(heatLossWPerM === null).toBe(unit !== 'm')
      }),
      { numRuns: 200 },
    )
  })
})

describe('beyondCurveK', () => {
  const curve = {
    kind: 'curve',
    basis: 'point',
    pointsC: [0, 100],
    valuesWPerMK: [0.03, 0.04],
  } as const
  test.each([
    [-20, -20],
    [0, 0],
    [50, 0],
    [100, 0],
    [130, 30],
  ])('at %d °C is %d K', (meanC, beyond) => {
    expect(beyondCurveK(curve, meanC)).toBe(beyond)
    expect(beyondCurveK({ kind: 'constant', conductivityWPerMK: 0.04 }, meanC)).toBe(0)
  })
})
