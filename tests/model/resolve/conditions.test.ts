/** The design conditions and emissivities, sentence by sentence of the contract. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import {
  coldRun,
  noteCodes,
  refused,
  refusedColumns,
  sized,
  steamRun,
} from '../../sizing/catalogue.ts'
import { problemOf } from './problem.ts'

describe('defaults', () => {
  test('wind and altitude are 0, the medium is as hot and as cold as itself', () => {
    const { loss, touch, damp } = problemOf(steamRun).conditions
    expect(loss.around).toEqual({ airC: 20, surroundingsC: 20, windMPerS: 0, altitudeM: 0 })
    expect([loss.mediumC, touch.mediumC, damp.mediumC]).toEqual([150, 150, 150])
  })

  test('the air of touch and damp is that of the run, said in a note', () => {
    const problem = problemOf({ ...coldRun, mediumMaxC: 60, reach: true })
    expect(problem.conditions.touch.around.airC).toBe(27)
    expect(problem.conditions.damp.around.airC).toBe(27)
    expect(noteCodes(problem)).toEqual(
      expect.arrayContaining(['touch-air-assumed', 'damp-air-assumed']),
    )
  })

  test('air given for a question is not an assumption', () => {
    const problem = problemOf({ ...coldRun, mediumMaxC: 60, touchAirC: 35, dampAirC: 30 })
    expect(problem.conditions.touch.around.airC).toBe(35)
    expect(problem.conditions.damp.around.airC).toBe(30)
    expect(noteCodes(problem)).not.toContain('touch-air-assumed')
    expect(noteCodes(problem)).not.toContain('damp-air-assumed')
  })

  test('no note about the air of a question that is not asked', () => {
    const problem = problemOf({
      ...steamRun,
      reach: false,
      reachReason: 'in a locked duct',
      maxLossWPerM: 40,
    })
    expect(noteCodes(problem)).not.toContain('touch-air-assumed')
    expect(noteCodes(problem)).not.toContain('damp-air-assumed')
  })

  test('surroundings are the air of each condition', () => {
    const { loss, touch, damp } = problemOf({
      ...coldRun,
      airC: 18,
      touchAirC: 35,
      dampAirC: 30,
    }).conditions
    expect(loss.around.surroundingsC).toBe(18)
    expect(touch.around.surroundingsC).toBe(35)
    expect(damp.around.surroundingsC).toBe(30)
  })

  test('surroundings that are given hold for loss', () => {
    expect(problemOf({ ...steamRun, surroundingsC: 12 }).conditions.loss.around.surroundingsC).toBe(
      12,
    )
  })

  test.each([
    [{ surroundingsC: 15, touchAirC: 35 }, 'touch', 35],
    [{ surroundingsC: 60, touchAirC: 35 }, 'touch', 60],
    [{ surroundingsC: 40, dampAirC: 30 }, 'damp', 30],
    [{ surroundingsC: 5, dampAirC: 30 }, 'damp', 5],
  ] as const)(
    'given as %o, those of %s are %d: never milder than its own air',
    (own, question, tempC) => {
      const problem = problemOf({ ...coldRun, mediumMaxC: 60, ...own })
      expect(problem.conditions[question].around.surroundingsC).toBe(tempC)
      expect(noteCodes(problem).includes(`${question}-surroundings`)).toBe(
        tempC !== own.surroundingsC,
      )
    },
  )

  test('wind is of the yearly mean only: touch and damp are judged in still air', () => {
    const { loss, touch, damp } = problemOf({ ...coldRun, windMPerS: 4 }).conditions
    expect([loss, touch, damp].map(({ around }) => around.windMPerS)).toEqual([4, 0, 0])
  })

  test('altitude is of the place, whatever the question', () => {
    const { loss, touch, damp } = problemOf({ ...coldRun, altitudeM: 1500 }).conditions
    expect([loss, touch, damp].map(({ around }) => around.altitudeM)).toEqual([1500, 1500, 1500])
  })
})

describe('the medium at its worst', () => {
  test('touch has the hottest, damp the coldest, loss the usual', () => {
    const { loss, touch, damp } = problemOf({
      ...steamRun,
      mediumMaxC: 180,
      mediumMinC: 5,
    }).conditions
    expect([loss.mediumC, touch.mediumC, damp.mediumC]).toEqual([150, 180, 5])
  })

  test('a hottest below the medium, a coldest above it: each an issue with its column', () => {
    expect(refusedColumns({ ...steamRun, mediumMaxC: 140 })).toEqual(['medium_max_c'])
    expect(refusedColumns({ ...steamRun, mediumMinC: 160 })).toEqual(['medium_min_c'])
  })
})

describe('emissivity', () => {
  // The shipped row: aluminium sheet, mill finish, 0.1 new and 0.2 aged (ASHRAE Fundamentals 2021, ch. 23, table 12).
  test('loss takes the aged finish; touch and damp the new one', () => {
    const { loss, touch, damp } = problemOf(steamRun).conditions
    expect([loss, touch, damp].map(({ emissivity }) => emissivity)).toEqual([0.2, 0.1, 0.1])
  })

  test('an emissivity that is given overrides both', () => {
    const { loss, touch, damp } = problemOf({ ...steamRun, emissivity: 0.35 }).conditions
    expect([loss, touch, damp].map(({ emissivity }) => emissivity)).toEqual([0.35, 0.35, 0.35])
  })

  test('without a finish 0.9, with a note', () => {
    const { finish: _, ...plain } = steamRun
    const problem = problemOf(plain)
    expect(problem.conditions.loss.emissivity).toBe(0.9)
    expect(problem.conditions.touch.emissivity).toBe(0.9)
    expect(noteCodes(problem)).toContain('finish-assumed')
  })

  test('no such note beside a finish or an emissivity, nor on a bare run', () => {
    const { finish: _, ...plain } = steamRun
    for (const values of [steamRun, { ...plain, emissivity: 0.3 }, { ...plain, thicknessM: 0 }])
      expect(noteCodes(problemOf(values))).not.toContain('finish-assumed')
  })

  test('bare steel 0.80, said in a note', () => {
    const problem = problemOf(steamRun)
    expect(problem.conditions.loss.bareEmissivity).toBe(0.8)
    expect(noteCodes(problem)).toContain('bare-emissivity-assumed')
  })

  // The shipped rows: copper as found in service 0.6, galvanised steel 0.28, austenitic stainless 0.3.
  test.each([
    [{ pipeMaterial: 'copper' }, 0.6],
    [{ size: 'CU 28' }, 0.6],
    [{ pipeMaterial: 'stainless_304' }, 0.3],
    [{ size: 'CU 28', pipeMaterial: 'carbon_steel' }, 0.8],
    [{ bareEmissivity: 0.55 }, 0.55],
    [{ bareEmissivity: 0.55, emissivity: 0.3 }, 0.55],
  ])('the bare surface of %o has %d', (own, emissivity) => {
    const { loss, touch } = problemOf({ ...steamRun, ...own }).conditions
    expect(loss.bareEmissivity).toBe(emissivity)
    expect(touch.bareEmissivity).toBe(emissivity)
  })

  test('with a thickness of 0 the emissivity given means the bare surface', () => {
    const { loss } = problemOf({ ...steamRun, thicknessM: 0, emissivity: 0.45 }).conditions
    expect(loss.bareEmissivity).toBe(0.45)
  })

  test('a duct is of galvanised steel', () => {
    const { loss } = problemOf({
      ...steamRun,
      size: 'D 250',
      shape: 'round-duct',
      mediumC: 50,
    }).conditions
    expect(loss.bareEmissivity).toBe(0.28)
  })
})

describe('saturated steam by its pressure', () => {
  const { mediumC: _, ...noMedium } = steamRun
  // IAPWS-IF97, region 4: 10 bar absolute saturates at 179.89 °C, 1.01325 bar at 99.97 °C.
  test.each([
    [8.98675, 179.89],
    [0, 99.97],
  ])('%d bar g is %d °C', (bar, tempC) => {
    const problem = problemOf({ ...noMedium, pressureGaugePa: bar * 1e5 })
    expect(problem.conditions.loss.mediumC).toBeCloseTo(tempC, 1)
    expect(noteCodes(problem)).toContain('steam-saturated')
  })

  test('beside a temperature that is not its own, an issue; beside its own, none', () => {
    expect(refusedColumns({ ...steamRun, pressureGaugePa: 9e5 })).toEqual(['medium_c'])
    expect(problemOf({ ...steamRun, mediumC: 179.9, pressureGaugePa: 8.98675e5 })).toBeTruthy()
  })

  test('only steam is given by its pressure', () => {
    expect(refusedColumns({ ...noMedium, medium: 'water', pressureGaugePa: 5e5 })).toEqual([
      'pressure_bar_g',
    ])
  })

  test('neither temperature nor pressure', () => {
    const [issue] = refused(noMedium)
    expect(issue).toMatchObject({ column: 'medium_c', found: 'nothing' })
    expect(issue?.allowed).toContain('pressure_bar_g')
  })
})

test('air is required', () => {
  const { airC: _, ...noAir } = steamRun
  expect(refusedColumns(noAir)).toEqual(['air_c'])
})

describe('twelve months', () => {
  const months = '2;3;6;9;13;16;18;18;15;10;6;3'
  // Their mean is 9.9 °C.
  const told = (airC: number): string[] =>
    problemOf({ ...steamRun, airC, monthlyAirC: months }).notes.flatMap(({ code, text }) =>
      code === 'by-the-month' || code === 'monthly-mean' ? [text] : [],
    )
  const year =
    'The loss of the year is that of its twelve months, the hours in service spread evenly over them; months in which heat flows the other way count as nothing.'

  test.each([9.2, 10.8])('whose mean is near the air of %d °C stand for its year', (airC) => {
    expect(told(airC)).toEqual([`${year} The loss shown beside it stands at the yearly mean.`])
  })

  test.each([8.8, 11, 20])('far from the air of %d °C are told apart from it', (airC) => {
    expect(told(airC)).toEqual([
      year,
      `The twelve months have a mean of 9.9 °C; the loss shown stands at air_c, ${airC} °C.`,
    ])
  })
})

describe('the sun', () => {
  const sun = (values: RunValues): string =>
    problemOf({ ...values, solarWPerM2: 700 }).notes.find(({ code }) => code === 'sun')?.text ?? ''

  test('on a round run leaves one side in shadow; on a flat one it does not', () => {
    const { size: _, ...plain } = steamRun
    expect(sun(steamRun)).toMatch(/about a third of what falls square on it\.$/)
    expect(sun({ ...plain, shape: 'sphere', outerDiameterM: 2 })).toMatch(/about a quarter of/)
    for (const flat of [
      { shape: 'flat', areaM2: 4, heightM: 2 },
      { shape: 'rect-duct', widthM: 0.6, heightM: 0.4 },
    ] as const)
      expect(sun({ ...plain, ...flat })).toMatch(/judged at night\.$/)
  })
})

describe('a buried run', () => {
  const buried = { ...steamRun, buryDepthM: 0.8, maxLossWPerM: 60 }

  test('has no emissivity to be assumed', () => {
    const { finish: _, ...plain } = buried
    const codes = noteCodes(problemOf(plain))
    expect(codes).not.toContain('finish-assumed')
    expect(codes).not.toContain('bare-emissivity-assumed')
  })

  const sunny = { ...buried, solarWPerM2: 700, skyView: 0.5 }

  test('is in nobody’s sun and under no sky, at no condition', () => {
    const shaded = sized(buried)
    const lit = sized(sunny)
    expect(lit.ladder).toEqual(shaded.ladder)
    expect(lit.bare).toEqual(shaded.bare)
  })

  test('is told so, and of no absorptance', () => {
    const { notes } = problemOf(sunny)
    expect(notes.map(({ text }) => text)).toContain('sun, sky: not used for a buried run.')
    expect(noteCodes({ notes })).not.toContain('sun')
  })

  test.each([
    [{ filmWPerM2K: 10 }, 'film: not used for a buried run.'],
    [{ method: 'simplified' }, 'the simplified method: not used for a buried run.'],
  ] as const)('has the soil for a film, whatever is given: %o', (film, text) => {
    const { notes } = problemOf({ ...buried, ...film })
    expect(notes.map((note) => note.text)).toContain(text)
    expect(noteCodes({ notes })).not.toContain('film-fixed')
    expect(noteCodes({ notes })).not.toContain('film-simplified')
    expect(sized({ ...buried, ...film }).ladder).toEqual(sized(buried).ladder)
  })
})
