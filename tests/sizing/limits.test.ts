/** What each limit says of itself: its rule, its unit, its condition, and what was judged; on the worst face. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { limitNames, passesLimit } from '#sizing/passes-limit.ts'
import type { LimitName, LimitResult, Rating } from '#sizing/result.ts'
import { coldRun, sized, steamRun } from './catalogue.ts'

const { material: _material, size: _size, ...plain } = steamRun
const duct: RunValues = {
  ...plain,
  shape: 'rect-duct',
  widthM: 0.6,
  heightM: 0.4,
  material: 'stone_wool_slab',
}

const judged = (values: RunValues, thicknessM = 0.05): readonly LimitResult[] =>
  sized({ ...values, thicknessM }).chosen?.limits ?? []
const only = (values: RunValues, name: LimitName, thicknessM?: number): LimitResult => {
  const [found, ...more] = judged(values, thicknessM).filter(({ limit }) => limit === name)
  expect(more).toEqual([])
  return found ?? expect.fail(`no ${name}`)
}

describe('loss', () => {
  test('per metre is at most its bound, in W/m, at the loss condition', () => {
    expect(only({ ...steamRun, maxLossWPerM: 50 }, 'loss')).toMatchObject({
      rule: 'at most',
      bound: 50,
      unit: 'W/m',
      condition: 'loss',
      what: 'heat flow per metre',
    })
  })

  test('per square metre likewise, on the outer area', () => {
    expect(only({ ...steamRun, maxLossWPerM2: 90 }, 'loss')).toMatchObject({
      rule: 'at most',
      bound: 90,
      unit: 'W/m²',
      condition: 'loss',
      what: 'heat flux on the outer area',
    })
  })

  test('of a flat surface has no metre to be judged by', () => {
    const wall = { ...plain, shape: 'flat', heightM: 2, widthM: 3, material: 'stone_wool_slab' }
    const limits = judged({ ...wall, maxLossWPerM2: 90 } as RunValues)
    expect(limits.filter(({ limit }) => limit === 'loss').map(({ unit }) => unit)).toEqual(['W/m²'])
  })

  test('of a cold run counts the gain', () => {
    const { value } = only({ ...coldRun, maxLossWPerM: 50 }, 'loss', 0.025)
    expect(value).toBeGreaterThan(0)
  })
})

describe('touch', () => {
  test('by a stated temperature is at most it, by the burn curve below it, with metal and time named', () => {
    const limits = judged({ ...steamRun, maxSurfaceC: 45 }).filter(({ limit }) => limit === 'touch')
    expect(limits.map(({ rule, unit, condition }) => [rule, unit, condition])).toEqual([
      ['at most', '°C', 'touch'],
      ['below', '°C', 'touch'],
    ])
    expect(limits[0]?.what).toBe('surface')
    expect(limits[1]?.what).toMatch(/^surface, smooth metal touched for \d/)
  })

  // The film of the face that looks down is the weakest when it is warm.
  test('is judged on the hottest face of a duct', () => {
    const { what, value } = only(
      { ...duct, maxSurfaceC: 60, reach: false, reachReason: 'high up' },
      'touch',
    )
    expect(what).toBe('surface, bottom')
    expect(value).toBe(sized({ ...duct, thicknessM: 0.05 }).chosen?.touchSurfaceC)
  })
})

describe('damp', () => {
  test('is at least the dew point, at its own condition', () => {
    expect(only(coldRun, 'damp', 0.025)).toMatchObject({
      rule: 'at least',
      unit: '°C',
      condition: 'damp',
      what: 'surface',
    })
  })

  // Cold turns the faces about: the weakest film is that of the top.
  test('is judged on the coldest face of a duct', () => {
    const { size: _, ...cold } = coldRun
    const chilled: RunValues = {
      ...cold,
      shape: 'rect-duct',
      widthM: 0.6,
      heightM: 0.4,
      material: 'elastomeric_foam_nbr',
    }
    expect(only(chilled, 'damp', 0.025).what).toBe('surface, top')
  })
})

describe('space', () => {
  // DN 50 is 60.3 mm across (EN 10255/EN 10220): with twice 40 mm 140.3 mm.
  test('is at most the overall diameter, to the last digit', () => {
    expect(only({ ...steamRun, maxOuterDiameterM: 0.1403 }, 'space', 0.04)).toMatchObject({
      pass: true,
      rule: 'at most',
      unit: 'm',
      condition: 'loss',
      what: 'overall diameter',
    })
    expect(only({ ...steamRun, maxOuterDiameterM: 0.1403 }, 'space', 0.04).value).toBeCloseTo(
      0.1403,
      12,
    )
    expect(only({ ...steamRun, maxOuterDiameterM: 0.1402 }, 'space', 0.04).pass).toBe(false)
  })

  test('of a duct is its larger outer side', () => {
    for (const [widthM, heightM] of [
      [0.6, 0.4],
      [0.4, 0.6],
    ] as const) {
      const limit = only({ ...duct, widthM, heightM, maxOuterDiameterM: 0.7 }, 'space')
      expect(limit).toMatchObject({ pass: true, what: 'larger outer side', bound: 0.7 })
      expect(limit.value).toBeCloseTo(0.7, 12)
    }
  })

  test('is not asked where no bound is given', () => {
    expect(judged(steamRun).filter(({ limit }) => limit === 'space')).toEqual([])
  })
})

describe('service', () => {
  test('says the side of the material that is nearest to its end', () => {
    expect(only({ ...steamRun, mediumC: 640 }, 'service', 0.2)).toMatchObject({
      unit: '°C',
      rule: 'at most',
      what: expect.stringMatching(/, hottest side$/),
    })
    expect(only({ ...coldRun, mediumMinC: -49 }, 'service', 0.032)).toMatchObject({
      rule: 'at least',
      condition: 'damp',
      what: expect.stringMatching(/, coldest side$/),
    })
  })
})

describe('a rung of several judgements', () => {
  const result = (limit: LimitName, pass: boolean): LimitResult => ({
    limit,
    pass,
    value: 0,
    rule: 'at most',
    bound: 0,
    unit: '°C',
    condition: 'touch',
    what: 'surface',
  })
  const rung = (...limits: LimitResult[]): Rating => {
    const { chosen } = sized({ ...steamRun, thicknessM: 0.05 })
    return { ...(chosen ?? expect.fail('not sized')), limits }
  }

  test('passes a limit only where it passes every time, and whatever the others do', () => {
    expect(passesLimit(rung(result('touch', true), result('touch', false)), 'touch')).toBe(false)
    expect(passesLimit(rung(result('touch', true), result('touch', true)), 'touch')).toBe(true)
    expect(passesLimit(rung(result('loss', false), result('touch', true)), 'touch')).toBe(true)
    expect(passesLimit(rung(result('loss', false)), 'touch')).toBe(true)
  })

  test('names each limit once, in the order of the results', () => {
    const ladder = [
      rung(result('touch', true), result('touch', false), result('loss', true)),
      rung(result('touch', true), result('space', true)),
    ]
    expect(limitNames(ladder)).toEqual(['touch', 'loss', 'space'])
  })
})
