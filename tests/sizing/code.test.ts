/** Code tables: what is asked of a conductivity, the cells as printed, and the limit. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { resolve } from '#model/resolve/resolve.ts'
import { detailRun, sizeRun } from '#model/size-run.ts'
import { requiredThicknessM } from '#sizing/code.ts'
import { limitEnds } from '#sizing/continuous.ts'
import type { CodeThickness, Problem } from '#sizing/problem.ts'
import type { LimitResult, RunResult } from '#sizing/result.ts'
import { evenly } from '../model/any-values.ts'
import { published } from '../published.ts'
import { steamRun } from './catalogue.ts'
import { bs5422, muken, ownIndex } from './code-tables.ts'
import { limitOf } from './limit-of.ts'

function sized(values: RunValues): RunResult {
  const outcome = sizeRun(values, {}, ownIndex)
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.issues, null, 1))
  return outcome.result
}
function problemOf(values: RunValues): Problem {
  const resolved = resolve(values, ownIndex)
  if (!resolved.ok) throw new Error(JSON.stringify(resolved.issues, null, 1))
  return resolved.problem
}

/** A run rated at one thickness of a constant conductivity. */
const rated: RunValues = {
  tag: 'A',
  shape: 'pipe',
  mediumC: 60,
  airC: 20,
  emissivity: 0.9,
  thicknessM: 0.05,
}
const codeOf = (values: RunValues): LimitResult => {
  const { chosen, bare } = sized(values)
  return limitOf(chosen ?? bare, 'code')
}
const askedMm = (values: RunValues): number => 1000 * codeOf(values).bound

interface Pipe {
  readonly table: string
  readonly size?: string
  readonly boreMm?: number
  readonly odMm?: number
  readonly conductivity: number
  readonly mediumC?: number
  readonly factor?: number
}
const given = ({ table, size, boreMm, odMm, conductivity, mediumC, factor }: Pipe): RunValues => ({
  ...rated,
  codeTable: table,
  conductivityWPerMK: conductivity,
  ...(size !== undefined && { size }),
  ...(boreMm !== undefined && { outerDiameterM: (boreMm + 4) / 1000, wallM: 0.002 }),
  ...(odMm !== undefined && { outerDiameterM: odMm / 1000, wallM: 0.001 }),
  ...(mediumC !== undefined && { mediumC }),
  ...(factor !== undefined && { codeFactor: factor }),
})
/** The same, to be sized. */
function unsettled({ thicknessM: _, ...values }: RunValues): RunValues {
  return values
}
const asked = (pipe: Pipe): number => askedMm(given(pipe))

describe('cells as printed', () => {
  const geg = (boreMm: number, printed: string) => ({
    from: 'German Building Energy Act, annex 8',
    given: { table: 'geg-2024-heating', boreMm, conductivity: 0.035 },
    printed,
  })
  const dpr = (odMm: number, conductivity: number, printed: string) => ({
    from: 'Italian DPR 412/1993, annex B, from memory',
    given: { table: 'dpr-412-a', odMm, conductivity },
    printed,
  })
  const ashrae = (size: string, mediumC: number, conductivity: number, printed: string) => ({
    from: 'ASHRAE Handbook Fundamentals 2021, ch. 23, table 2 (Standard 90.1-2010)',
    given: { table: 'ashrae-90.1-2010-heating', size, mediumC, conductivity },
    printed,
  })
  published(asked, [
    // Up to 22 mm bore 20 mm, to 35 mm 30 mm, to 100 mm the bore, above 100 mm.
    geg(20, '20'),
    geg(22, '20'),
    geg(30, '30'),
    geg(54, '54'),
    geg(100, '100'),
    geg(200, '100'),
    dpr(15, 0.03, '13'),
    dpr(30, 0.04, '30'),
    dpr(50, 0.038, '37'),
    dpr(70, 0.046, '62'),
    dpr(120, 0.05, '84'),
    ashrae('NPS 1/2', 180, 0.047, '114'),
    ashrae('NPS 1', 150, 0.042, '102'),
    ashrae('NPS 2', 100, 0.041, '64'),
    ashrae('NPS 4', 80, 0.036, '51'),
    ashrae('NPS 6', 50, 0.04, '38'),
  ])

  test.each(muken)('MuKEn 2014, DN %d to %d, from memory', (from, to, above, upTo) => {
    const table = 'muken-2014'
    for (const nominalMm of [from, to].filter((dn) => dn !== 10 && dn !== 175)) {
      const size = `DN ${nominalMm}`
      expect(asked({ table, size, conductivity: 0.04 })).toBeCloseTo(above, 9)
      expect(asked({ table, size, conductivity: 0.05 })).toBeCloseTo(above, 9)
      expect(asked({ table, size, conductivity: 0.03 })).toBeCloseTo(upTo, 9)
      expect(asked({ table, size, conductivity: 0.022 })).toBeCloseTo(upTo, 9)
    }
  })
})

describe('the loss that BS 5422 allows', () => {
  /** The exact thickness at 0.035 W/mK [mm]. */
  const neededMm = ({ odMm }: { readonly odMm: number }): number => {
    const values = unsettled(given({ table: 'bs-5422-2023-domestic', odMm, conductivity: 0.035 }))
    const end = limitEnds(problemOf(values)).find(({ limit }) => limit === 'code')
    return 1000 * (end?.fromM ?? Number.NaN)
  }
  published(
    neededMm,
    bs5422.map(([odMm, , guideMm]) => ({
      from: 'BS 5422:2023, table 20A, as quoted in an open-source hot-water model',
      given: { odMm },
      printed: guideMm,
      within: {
        absolute: 1.3,
        because: 'the guide is in whole millimetres, rounded up, and its films are not ours',
      },
    })),
  )

  test.each(bs5422)('%d mm: %s W/m, met by the %s mm it guides to', (odMm, lossWPerM, guideMm) => {
    const limit = codeOf({
      ...given({ table: 'bs-5422-2023-domestic', odMm, conductivity: 0.035 }),
      thicknessM: Number(guideMm) / 1000,
    })
    expect(limit).toMatchObject({
      pass: true,
      rule: 'at most',
      bound: Number(lossWPerM),
      unit: 'W/m',
      condition: 'code',
    })
  })

  test('is judged in the air and wind of the table, whatever those of the run', () => {
    const values = given({ table: 'bs-5422-2023-domestic', odMm: 22, conductivity: 0.035 })
    const { value } = codeOf(values)
    const elsewhere = { airC: -10, windMPerS: 8, solarWPerM2: 500, filmWPerM2K: 3, altitudeM: 3000 }
    expect(codeOf({ ...values, ...elsewhere, mediumC: 80 }).value).toBe(value)
    expect(codeOf({ ...values, emissivity: 0.05 }).value).toBe(value)
  })

  test('a gain counts by its amount, with the emissivity of the finish', () => {
    const cold = { ...rated, size: 'DN 50', mediumC: 6, airC: 25, conductivityWPerMK: 0.035 }
    const at = (emissivity: number): LimitResult =>
      codeOf({ ...cold, codeTable: 'bs-5422-2009-cooled', emissivity })
    expect(at(0.9)).toMatchObject({ bound: 4.78, pass: true })
    expect(at(0.9).value).toBeGreaterThan(0)
    expect(at(0.1).value).toBeLessThan(at(0.9).value)
  })
})

const ask: CodeThickness = {
  kind: 'thickness',
  rows: [{ thicknessM: 0.03, rangeWPerMK: [0.036, 0.042] }],
  conversion: 'conductivity-range',
  radiusM: 0.03,
  ratingMeanC: 52,
}

describe('requiredThicknessM', () => {
  test('within the range as it stands', () => {
    for (const own of [0.036, 0.04, 0.042]) expect(requiredThicknessM(ask, own)).toBe(0.03)
  })

  // By hand: r[(1 + t/r)^(K/k) − 1] with t = r: K = 2k gives 3r, K = k/2 gives (√2 − 1)r; k the upper end.
  test('outside it converted from its upper end, above and below', () => {
    expect(requiredThicknessM(ask, 0.084)).toBeCloseTo(0.09, 12)
    expect(requiredThicknessM(ask, 0.021)).toBeCloseTo((Math.SQRT2 - 1) * 0.03, 12)
  })

  test('by equal loss converted always', () => {
    const equal: CodeThickness = {
      ...ask,
      conversion: 'equal-loss',
      rows: [{ thicknessM: 0.03, rangeWPerMK: [0.035, 0.035] }],
    }
    expect(requiredThicknessM(equal, 0.035)).toBeCloseTo(0.03, 12)
    expect(requiredThicknessM(equal, 0.07)).toBeCloseTo(0.09, 12)
    expect(requiredThicknessM(equal, 0.0175)).toBeCloseTo((Math.SQRT2 - 1) * 0.03, 12)
  })

  test('a converted thickness resists as much on the same pipe', () => {
    fc.assert(
      fc.property(
        evenly(0.005, 0.5),
        evenly(0.005, 0.2),
        evenly(0.01, 0.1),
        (radiusM, thicknessM, own) => {
          const equal: CodeThickness = {
            ...ask,
            radiusM,
            conversion: 'equal-loss',
            rows: [{ thicknessM, rangeWPerMK: [0.035, 0.035] }],
          }
          const neededM = requiredThicknessM(equal, own)
          expect(
            Math.log(1 + neededM / radiusM) / own / (Math.log(1 + thicknessM / radiusM) / 0.035),
          ).toBeCloseTo(1, 9)
        },
      ),
      { seed: 51 },
    )
  })

  const columns: CodeThickness = {
    ...ask,
    conversion: 'interpolate',
    rows: [0.03, 0.034, 0.04].map((k, n) => ({
      thicknessM: 0.02 + 0.01 * n,
      rangeWPerMK: [k, k] as const,
    })),
  }
  test('interpolated straight between the rows, as the first below, converted from the last above', () => {
    expect(requiredThicknessM(columns, 0.034)).toBe(0.03)
    expect(requiredThicknessM(columns, 0.032)).toBeCloseTo(0.025, 12)
    expect(requiredThicknessM(columns, 0.0385)).toBeCloseTo(0.0375, 12)
    expect(requiredThicknessM(columns, 0.02)).toBe(0.02)
    expect(requiredThicknessM(columns, 0.08)).toBeCloseTo(0.03 * ((7 / 3) ** 2 - 1), 12)
  })

  test('never less for what conducts more, and always a number', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(
          ask,
          columns,
          { ...columns, conversion: 'none' as const },
          { ...ask, conversion: 'equal-loss' as const },
        ),
        evenly(0.0425, 5),
        evenly(1, 20),
        (of, own, factor) => {
          const neededM = requiredThicknessM(of, own)
          expect(neededM).toBeGreaterThan(0)
          expect(neededM).toBeLessThan(Number.POSITIVE_INFINITY)
          expect(requiredThicknessM(of, own * factor)).toBeGreaterThanOrEqual(neededM)
        },
      ),
      { seed: 52 },
    )
  })

  test('of a row for any conductivity, and of none', () => {
    const any: CodeThickness = { ...ask, rows: [{ thicknessM: 0.04, rangeWPerMK: null }] }
    for (const own of [0.001, 5, null]) expect(requiredThicknessM(any, own)).toBe(0.04)
    expect(requiredThicknessM({ ...any, conversion: 'equal-loss' }, 0.07)).toBe(0.04)
    expect(requiredThicknessM({ ...ask, rows: [] }, 0.04)).toBe(0)
  })
})

describe('the code limit', () => {
  const heating: RunValues = { ...steamRun, mediumC: 70, codeTable: 'geg-2024-heating' }

  test('governs; the thickness is that of this material on this pipe', () => {
    const result = sized(heating)
    expect(result.governing).toBe('code')
    const limit = limitOf(result.chosen ?? result.bare, 'code')
    expect(limit).toMatchObject({ rule: 'at least', unit: 'm', condition: 'code', pass: true })
    expect(limit.value).toBe(result.chosen?.thicknessM)
    expect(limit.what).toContain('German Building Energy Act (GEG), annex 8')
    expect(limit.what).toContain('W/mK')
    expect(result.notes.find(({ code }) => code === 'code-table')?.text).toContain(
      'verify against your own edition',
    )
  })

  test('the bare run has no thickness at all', () => {
    expect(limitOf(sized(heating).bare, 'code')).toMatchObject({ pass: false, value: 0 })
    expect(codeOf({ ...heating, thicknessM: 0 })).toMatchObject({ pass: false, value: 0 })
  })

  test('passes at the very thickness', () => {
    const at = (thicknessM: number): boolean =>
      codeOf({
        ...given({ table: 'geg-2024-heating', boreMm: 54, conductivity: 0.035 }),
        thicknessM,
      }).pass
    expect(at(0.054)).toBe(true)
    expect(at(0.0539999)).toBe(false)
  })

  test('factor 1 is none; half of it asks for half, twice for twice', () => {
    const pipe = { table: 'geg-2024-heating', boreMm: 54, conductivity: 0.035 }
    expect(asked({ ...pipe, factor: 1 })).toBe(asked(pipe))
    expect(asked({ ...pipe, factor: 0.5 })).toBeCloseTo(27, 9)
    expect(asked({ ...pipe, factor: 2 })).toBeCloseTo(108, 9)
  })

  test('conductivity is read at the mean temperature of the table', () => {
    const material = ownIndex.material('stone_wool_pipe_section')
    if (!material.ok) throw new Error(material.message)
    const { pointsC, valuesWPerMK } = material.item.conductivity
    const next = pointsC.findIndex((at) => at >= 40)
    const [lowC = 0, highC = 0] = [pointsC[next - 1], pointsC[next]]
    const [low = 0, high = 0] = [valuesWPerMK[next - 1], valuesWPerMK[next]]
    const own = low + ((high - low) * (40 - lowC)) / (highC - lowC)
    const radiusM = 0.0603 / 2
    const boreM = 0.0545
    const expectedM = radiusM * ((1 + boreM / radiusM) ** (own / 0.035) - 1)
    expect(codeOf({ ...heating, thicknessM: 0.05 }).bound).toBeCloseTo(expectedM, 9)
  })

  // Two layers resist in series: ln(r2/r1)/λ1 + ln(r3/r2)/λ2 against ln((r + t)/r)/0.035 of the table.
  test('several materials are judged by what they resist together', () => {
    fc.assert(
      fc.property(evenly(10, 100), evenly(10, 100), (innerMm, outerMm) => {
        const { material: _, ...plain } = heating
        const limit = codeOf({
          ...plain,
          layers: `calcium_silicate:${innerMm.toFixed(1)};stone_wool_pipe_section:${outerMm.toFixed(1)}`,
        })
        const [silicate, wool] = ['calcium_silicate', 'stone_wool_pipe_section'].map((id) => {
          const found = ownIndex.material(id)
          if (!found.ok) throw new Error(found.message)
          const { pointsC, valuesWPerMK } = found.item.conductivity
          const next = Math.max(
            1,
            pointsC.findIndex((at) => at >= 40),
          )
          const [a = 0, b = 0] = [pointsC[next - 1], pointsC[next]]
          const [x = 0, y = 0] = [valuesWPerMK[next - 1], valuesWPerMK[next]]
          // Flat below the cold end.
          return 40 < a ? x : x + ((y - x) * (40 - a)) / (b - a)
        })
        const r1 = 0.03015
        const r2 = r1 + Number(innerMm.toFixed(1)) / 1000
        const r3 = r2 + Number(outerMm.toFixed(1)) / 1000
        const resists = Math.log(r2 / r1) / (silicate ?? 0) + Math.log(r3 / r2) / (wool ?? 0)
        expect(limit.pass).toBe(resists >= Math.log((r1 + 0.0545) / r1) / 0.035)
        expect(limit.value).toBeCloseTo(r3 - r1, 12)
      }),
      { seed: 53, numRuns: 60 },
    )
  })

  test('its exact end passes, a hair below fails', () => {
    const fromM = limitEnds(problemOf(heating)).find(({ limit }) => limit === 'code')?.fromM ?? 0
    const at = (thicknessM: number): LimitResult => codeOf({ ...heating, thicknessM })
    expect(fromM).toBeCloseTo(at(0.05).bound, 6)
    expect(at(fromM + 1e-6).pass).toBe(true)
    expect(at(fromM - 1e-6).pass).toBe(false)
    expect(detailRun(heating, {}, ownIndex)?.ends.map(({ limit }) => limit)).toContain('code')
  })

  test('cannot be met by a material that conducts too well: said', () => {
    const result = sized(
      unsettled(given({ table: 'geg-2024-heating', boreMm: 54, conductivity: 5 })),
    )
    expect(result.governing).toBe('unmet')
    expect(result.limits.find(({ limit }) => limit === 'code')?.bound).toBeLessThan(Infinity)
  })
})

describe('the resistance of a duct', () => {
  const duct: RunValues = {
    tag: 'D',
    shape: 'rect-duct',
    size: '600 x 400',
    mediumC: 13,
    airC: 27,
    finish: 'asj',
    codeTable: 'ashrae-90.1-2010-duct-exterior-zones-1-5',
  }

  // Σ d/λ: 1.06 m²K/W (ASHRAE Handbook Fundamentals 2021, ch. 23, table 3) at 0.04 W/mK is 42.4 mm.
  test('is thickness over conductivity, films left out', () => {
    const at = (thicknessM: number): LimitResult =>
      codeOf({ ...duct, conductivityWPerMK: 0.04, thicknessM })
    expect(at(0.05)).toMatchObject({
      value: 1.25,
      bound: 1.06,
      pass: true,
      rule: 'at least',
      unit: 'm²K/W',
      condition: 'code',
    })
    expect(at(0.0424).pass).toBe(true)
    expect(at(0.0423).pass).toBe(false)
    expect(at(0).value).toBe(0)
  })

  test('of several layers adds up', () => {
    const both = codeOf({ ...duct, layers: 'glass_wool_slab:20;stone_wool_slab:30' }).value
    const one = codeOf({ ...duct, layers: 'glass_wool_slab:20' }).value
    const other = codeOf({ ...duct, layers: 'stone_wool_slab:30' }).value
    expect(both).toBeCloseTo(one + other, 12)
  })

  test('governs', () => {
    expect(sized({ ...duct, material: 'glass_wool_slab' }).governing).toBe('code')
  })
})
