/** Valves, flanges, supports and ends: what of the catalogue they become, and what is said of them. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { noteCodes, steamRun } from '../../sizing/catalogue.ts'
import { problemOf } from './problem.ts'

const run: RunValues = { ...steamRun, size: 'DN 100', lengthM: 20 }
const fittingsOf = (values: RunValues) => problemOf(values).fittings
const noteOf = (values: RunValues, code: string): string | undefined =>
  problemOf(values).notes.find((note) => note.code === code)?.text

// Of the catalogue for 114.3 mm: a flange pair 0.1301 m², a gate valve 0.435 m²; lagged at 100 °C 0.85 m and 4.5 m, at
// 400 °C 1.1 m and 6.5 m, so at 150 °C a sixth of the way.
const FLANGE_M2 = 0.1301
const VALVE_M2 = 0.435
const FLANGE_M = 0.85 + (1.1 - 0.85) / 6
const VALVE_M = 4.5 + (6.5 - 4.5) / 6

describe('valves, strainers and flange pairs', () => {
  test('are an area of bare surface and a length of lagged run', () => {
    const { bareAreaM2, laggedLengthM, areBare } = fittingsOf({ ...run, valves: 2, flanges: 4 })
    expect(bareAreaM2).toBeCloseTo(2 * VALVE_M2 + 4 * FLANGE_M2, 9)
    expect(laggedLengthM).toBeCloseTo(2 * VALVE_M + 4 * FLANGE_M, 9)
    expect(areBare).toBe(false)
  })

  test('a strainer counts as a valve', () => {
    const { items, ...sums } = fittingsOf({ ...run, strainers: 1 })
    expect(items.map(({ name }) => name)).toEqual(['strainers'])
    expect(fittingsOf({ ...run, valves: 1 })).toMatchObject(sums)
  })

  test('bare on a lagged run they have an area only', () => {
    const found = fittingsOf({ ...run, valves: 1, fittings: 'bare' })
    expect(found).toMatchObject({ areBare: true, laggedLengthM: 0 })
    expect(found.bareAreaM2).toBeCloseTo(VALVE_M2, 9)
  })

  test('of a bare run are bare whatever is said of them', () => {
    const found = fittingsOf({ ...run, thicknessM: 0, valves: 1, fittings: 'lagged' })
    expect(found).toMatchObject({ areBare: true, laggedLengthM: 0 })
    expect(
      noteCodes(problemOf({ ...run, thicknessM: 0, valves: 1, fittings: 'lagged' })),
    ).toContain('fittings-bare')
  })

  test('name one convention, with the figures taken', () => {
    const lagged = { ...run, valves: 2, flanges: 4 }
    expect(fittingsOf(lagged).convention).toBe(
      'metres of the lagged run that lose as much (ISO 12241 annex A / VDI 2055, from memory: verify)',
    )
    expect(noteOf(lagged, 'fittings')).toMatch(
      /^2 valves and 4 flange pairs, lagged like the run: 13\.23 m of the lagged run; convention: metres .*from memory: verify/,
    )
    const bare = { ...lagged, fittings: 'bare' } as const
    expect(fittingsOf(bare).convention).toMatch(
      /^surface of the bare fitting, losing the flux of the bare run .*from memory: verify/,
    )
    expect(noteOf(bare, 'fittings')).toMatch(/1\.39 m² of bare surface.*convention: surface/)
    expect(noteOf(bare, 'fittings')).toContain('hotter than its jacket')
    expect(noteOf({ ...bare, mediumC: 5 }, 'fittings')).toContain('colder than its jacket')
  })

  test('beyond the tables say what was taken', () => {
    const small = { ...run, size: 'DN 15', valves: 1 }
    expect(noteOf(small, 'fittings-figure')).toContain('60.3 mm instead of 21.3 mm')
    expect(noteOf({ ...small, fittings: 'bare' }, 'fittings-figure')).toContain('square')
  })

  test('of a run without a length: that they are not added up; of length 0 they are the run', () => {
    const { lengthM: _, ...unmeasured } = run
    expect(noteCodes(problemOf({ ...unmeasured, valves: 1 }))).toContain('fittings-length')
    const alone = problemOf({ ...run, lengthM: 0, valves: 1 })
    expect(noteCodes(alone)).not.toContain('fittings-length')
    expect(alone.extent).toBe(0)
  })

  test('none given: nothing, and nothing said', () => {
    const problem = problemOf({ ...run, valves: 0, flanges: 0 })
    expect(problem.fittings).toMatchObject({
      bareAreaM2: 0,
      laggedLengthM: 0,
      supportShare: 0,
      ends: 0,
    })
    expect(noteCodes(problem).some((code) => code.startsWith('fittings'))).toBe(false)
  })
})

describe('supports', () => {
  test('add their share once, however many they are', () => {
    for (const supports of [1, 7]) expect(fittingsOf({ ...run, supports }).supportShare).toBe(0.15)
    expect(fittingsOf({ ...run, supports: 0 }).supportShare).toBe(0)
  })

  test.each([{ windMPerS: 3 }, { solarWPerM2: 400 }, { skyView: 0.5 }] as const)(
    'the outdoor share with %o',
    (outdoors) => {
      expect(fittingsOf({ ...run, supports: 2, ...outdoors }).supportShare).toBe(0.25)
      expect(noteOf({ ...run, supports: 2, ...outdoors }, 'supports')).toContain('25 %')
    },
  )

  test('are named beside the convention of the fittings', () => {
    expect(fittingsOf({ ...run, supports: 2 }).convention).toMatch(
      /^supports as a share .*from memory/,
    )
    expect(fittingsOf({ ...run, supports: 2, valves: 1 }).convention).toMatch(
      /^metres of the lagged run that lose as much .*; supports as a share/,
    )
    expect(fittingsOf(run).convention).toBe('')
  })

  test('of a bare run add nothing', () => {
    expect(fittingsOf({ ...run, thicknessM: 0, supports: 2 }).supportShare).toBe(0)
  })
})

test('bends, tees and reducers lie in the length of the run', () => {
  const values = { ...run, bends: 3, tees: 1, reducers: 2 }
  expect(fittingsOf(values)).toEqual(fittingsOf(run))
  expect(noteOf(values, 'in-length')).toContain('Bends, tees and reducers lie within the length')
})

test('ends are counted, and said to be bare where fittings are', () => {
  expect(fittingsOf({ ...run, ends: 2 }).ends).toBe(2)
  expect(noteOf({ ...run, ends: 2 }, 'ends')).toContain('closed off')
  expect(noteOf({ ...run, ends: 1, fittings: 'bare' }, 'ends')).toContain('1 open end: bare')
})

describe('shapes', () => {
  test.each([
    ['flat', { shape: 'flat', areaM2: 3 }],
    ['sphere', { shape: 'sphere', outerDiameterM: 1 }],
    ['vessel', { shape: 'vessel', outerDiameterM: 1, lengthM: 2 }],
  ] as const)('a %s has none: the columns are said to be unused', (shape, thing) => {
    const { size: _, ...unsized } = steamRun
    const values: RunValues = { ...unsized, ...thing, valves: 1, supports: 2, ends: 1, bends: 1 }
    expect(fittingsOf(values)).toMatchObject({ bareAreaM2: 0, supportShare: 0, ends: 0 })
    expect(noteOf(values, 'unused')).toContain(
      `valves, bends, supports and ends: not used for a ${shape}`,
    )
  })

  test('a rectangular duct has supports and ends, no valves or flanges', () => {
    const values: RunValues = {
      ...steamRun,
      shape: 'rect-duct',
      size: '600 x 400',
      material: 'stone_wool_slab',
      lengthM: 5,
      valves: 1,
      supports: 2,
      ends: 1,
    }
    expect(fittingsOf(values)).toMatchObject({ bareAreaM2: 0, supportShare: 0.15, ends: 1 })
    expect(noteOf(values, 'unused')).toContain('valves: not used')
  })

  test('a round duct takes the figures of pipes, and says so', () => {
    const values: RunValues = {
      ...steamRun,
      shape: 'round-duct',
      size: 'D 250',
      lengthM: 5,
      flanges: 2,
    }
    expect(fittingsOf(values).bareAreaM2).toBeGreaterThan(0.5)
    expect(noteCodes(problemOf(values))).toContain('fittings-duct')
  })
})
