/** What a code table asks between its rows, and how the limit says it. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { requiredThicknessM } from '#sizing/code.ts'
import type { CodeAsk, CodeThickness, Problem } from '#sizing/problem.ts'
import type { LimitResult } from '#sizing/result.ts'
import { size } from '#sizing/size.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { steamRun } from './catalogue.ts'

/** Two rows with a gap between their ranges, on a pipe of 60 mm. */
const table = (conversion: CodeThickness['conversion']): CodeThickness => ({
  kind: 'thickness',
  rows: [
    { thicknessM: 0.02, rangeWPerMK: [0.03, 0.04] },
    { thicknessM: 0.05, rangeWPerMK: [0.05, 0.06] },
  ],
  conversion,
  radiusM: 0.03,
  ratingMeanC: 24,
})

/** T = r[(1 + t/r)^(K/k) − 1], Standard 90.1. */
const converted = (thicknessM: number, share: number): number =>
  0.03 * ((1 + thicknessM / 0.03) ** share - 1)

describe('between the rows', () => {
  test('the row that begins last below serves, as it stands or converted from its upper end', () => {
    expect(requiredThicknessM(table('none'), 0.045)).toBe(0.02)
    for (const conversion of ['conductivity-range', 'equal-loss'] as const) {
      expect(requiredThicknessM(table(conversion), 0.045)).toBeCloseTo(
        converted(0.02, 0.045 / 0.04),
        12,
      )
      expect(requiredThicknessM(table(conversion), 0.08)).toBeCloseTo(
        converted(0.05, 0.08 / 0.06),
        12,
      )
      expect(requiredThicknessM(table(conversion), 0.02)).toBeCloseTo(
        converted(0.02, 0.02 / 0.04),
        12,
      )
    }
  })

  // From 0.04 to 0.06: a quarter of the way from 20 to 50 mm.
  test('or a straight line between their upper ends', () => {
    expect(requiredThicknessM(table('interpolate'), 0.045)).toBeCloseTo(0.0275, 12)
    expect(requiredThicknessM(table('interpolate'), 0.02)).toBe(0.02)
    expect(requiredThicknessM(table('interpolate'), 0.08)).toBeCloseTo(
      converted(0.05, 0.08 / 0.06),
      12,
    )
  })

  test('an end of a range belongs to it', () => {
    for (const conductivity of [0.03, 0.04]) {
      expect(requiredThicknessM(table('conductivity-range'), conductivity)).toBe(0.02)
    }
    expect(requiredThicknessM(table('conductivity-range'), 0.05)).toBe(0.05)
  })
})

test('a bare run is asked the first row, no rows ask nothing, a row for any material asks itself', () => {
  expect(requiredThicknessM(table('equal-loss'), null)).toBe(0.02)
  expect(requiredThicknessM({ ...table('equal-loss'), rows: [] }, 0.04)).toBe(0)
  const any = { ...table('equal-loss'), rows: [{ thicknessM: 0.03, rangeWPerMK: null }] }
  expect(requiredThicknessM(any, 0.09)).toBe(0.03)
})

test('what conducts like a metal is asked a kilometre, not more metres than there are numbers for', () => {
  expect(requiredThicknessM(table('equal-loss'), 400)).toBe(1000)
})

describe('the limit', () => {
  const own: RunValues = {
    tag: 'A',
    shape: 'pipe',
    outerDiameterM: 0.06,
    wallM: 0.002,
    mediumC: 60,
    airC: 20,
    emissivity: 0.9,
    conductivityWPerMK: 0.04,
    thicknessM: 0.05,
  }
  const asking = (ask: CodeAsk, values: RunValues = own): Problem => {
    const problem = problemOf(values)
    return { ...problem, limits: { ...problem.limits, code: { table: 'Table 1', asks: [ask] } } }
  }
  const judged = (ask: CodeAsk, values: RunValues = own): LimitResult | undefined => {
    const { chosen, bare } = size(asking(ask, values))
    return (chosen ?? bare).limits.find(({ limit }) => limit === 'code')
  }

  test('of a thickness names conductivity and table', () => {
    expect(judged(table('equal-loss'))).toMatchObject({
      rule: 'at least',
      unit: 'm',
      condition: 'code',
      what: 'thickness at 0.04 W/mK, Table 1',
    })
    expect(judged(table('equal-loss'), { ...own, thicknessM: 0 })?.what).toBe('thickness, Table 1')
  })

  // 0.05 m of 0.04 W/(m·K): 1.25 m²K/W, met to the last digit and not beyond.
  test('of a resistance is thickness over conductivity, without films', () => {
    const resistance = (resistanceM2KPerW: number): CodeAsk => ({
      kind: 'resistance',
      resistanceM2KPerW,
      ratingMeanC: 24,
    })
    expect(judged(resistance(1.25))).toMatchObject({
      pass: true,
      value: expect.closeTo(1.25, 12),
      rule: 'at least',
      unit: 'm²K/W',
      what: 'resistance without films, Table 1',
    })
    expect(judged(resistance(1.2500001))?.pass).toBe(false)
  })

  test('of a loss is at most it, to the last digit, at the condition of the table', () => {
    const { loss } = problemOf(own).conditions
    const ask = (maxLossWPerM: number): CodeAsk => ({ kind: 'loss', maxLossWPerM, condition: loss })
    const value = judged(ask(1))?.value ?? Number.NaN
    expect(judged(ask(value))).toMatchObject({
      pass: true,
      rule: 'at most',
      unit: 'W/m',
      condition: 'code',
      what: 'heat flow per metre, Table 1',
    })
    expect(judged(ask(value * (1 - 1e-10)))?.pass).toBe(true)
    expect(judged(ask(value * (1 - 1e-8)))?.pass).toBe(false)
    // The loss at the table's own condition is that of the run here.
    expect(value).toBeCloseTo(size(problemOf(own)).chosen?.heatLossWPerM ?? Number.NaN, 9)
  })

  test('of two layers compares with the one conductivity that resists as much', () => {
    const { material: _material, ...plain } = steamRun
    const what = judged(table('equal-loss'), {
      ...plain,
      layers: 'calcium_silicate:50;stone_wool_pipe_section:50',
    })?.what
    const [, between = ''] = /^thickness at (0\.\d+) W\/mK, Table 1$/.exec(what ?? '') ?? []
    // Stone wool some 0.035, calcium silicate some 0.055.
    expect(Number(between)).toBeGreaterThan(0.035)
    expect(Number(between)).toBeLessThan(0.06)
  })
})
