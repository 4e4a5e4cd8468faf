/** The ladder takes the rows of a catalogue as they come: unsorted, repeated, of several forms, and of odd totals. */
import { describe, expect, test } from 'vitest'
import type { InchSection, ThicknessStep } from '#catalogue/types.ts'
import { inchLadder, metricLadder } from '#sizing/ladder.ts'
import type { Step } from '#sizing/problem.ts'
import { mm } from './catalogue.ts'

const row = (
  thicknessMm: number,
  largestMm: number,
  own: Partial<ThicknessStep> = {},
): ThicknessStep => ({
  source: 'test',
  confidence: 'found',
  materialId: 'm',
  form: 'section',
  series: 'metric',
  thicknessM: thicknessMm / 1000,
  maxSingleLayerM: largestMm / 1000,
  singleLayerOnly: false,
  ...own,
})
const made = (ladder: readonly Step[]): string[] =>
  ladder.map(({ thicknessM, piecesM }) => `${mm(thicknessM)}=${piecesM.map(mm).join('+')}`)

describe('metric rows', () => {
  // By the rule: up to 50 mm one piece, above a first piece of 40 mm and the one that differs least.
  const expected = ['20=20', '30=30', '40=40', '60=40+20', '70=40+30', '80=40+40']

  test.each([
    ['in order', [20, 30, 40]],
    ['in no order', [40, 20, 30]],
    ['several times', [30, 20, 40, 20, 30, 20]],
  ])('%s give one ladder, thinnest first', (_, thicknesses) => {
    expect(made(metricLadder(thicknesses.map((thicknessMm) => row(thicknessMm, 40))))).toEqual(
      expected,
    )
  })

  test('of two forms are cut to the larger largest piece', () => {
    const ladder = metricLadder([row(40, 40), row(60, 120), row(100, 120)])
    expect(Math.max(...ladder.flatMap(({ piecesM }) => piecesM))).toBeCloseTo(0.1, 12)
  })

  test('of which only some stay single are laid in layers', () => {
    const mixed = metricLadder([row(40, 40, { singleLayerOnly: true }), row(30, 40)])
    expect(made(mixed)).toContain('70=40+30')
    const single = metricLadder([
      row(40, 60, { singleLayerOnly: true }),
      row(60, 60, { singleLayerOnly: true }),
    ])
    expect(made(single)).toEqual(['40=40', '60=60'])
  })

  // 130 mm of pieces up to 50 mm: 50 + 50 leaves 30 mm, for which there is no piece.
  test('a total that no pieces make stands as it is sold', () => {
    expect(made(metricLadder([40, 50, 130].map((thicknessMm) => row(thicknessMm, 50))))).toEqual([
      '40=40',
      '50=50',
      '80=40+40',
      '90=40+50',
      '100=50+50',
      '130=130',
    ])
  })

  test('a total of three pieces is wound, the largest first', () => {
    expect(made(metricLadder([20, 50, 120].map((thicknessMm) => row(thicknessMm, 50))))).toContain(
      '120=50+50+20',
    )
  })
})

describe('inch rows', () => {
  const INCH_MM = 25.4
  const inches = (values: readonly number[], largest: number): ThicknessStep[] =>
    values.map((value) => row(value * INCH_MM, largest * INCH_MM, { series: 'inch' }))
  const nominal = (ladder: readonly Step[]): string[] =>
    ladder.map(
      ({ nominalThicknessM, piecesM }) =>
        `${Number(((nominalThicknessM ?? 0) / 0.0254).toFixed(3))}=${piecesM
          .map((pieceM) => Number((pieceM / 0.0254).toFixed(3)))
          .join('+')}`,
    )

  // 1½ and 2 in are the first pieces: 3 in is 1½ + 1½ and not 2 + 1, since those differ more; 2½ in is 1½ + 1.
  test('in any order and number give one ladder with a first piece of 1½ or 2 in', () => {
    const expected = ['1=1', '1.5=1.5', '2=2', '2.5=1.5+1', '3=1.5+1.5', '3.5=1.5+2', '4=2+2']
    for (const values of [
      [1, 1.5, 2],
      [2, 1, 1.5, 1, 2],
    ]) {
      expect(nominal(inchLadder(inches(values, 2), [], null))).toEqual(expected)
    }
  })

  test('beyond the largest piece are laid of smaller ones', () => {
    const ladder = inchLadder(inches([1.5, 2, 4], 2), [], null)
    expect(Math.max(...ladder.flatMap(({ piecesM }) => piecesM))).toBeCloseTo(0.0508, 12)
    expect(nominal(ladder)).toContain('4=2+2')
  })

  test('of which only some stay single are laid in layers, and none of all', () => {
    const single = { series: 'inch', singleLayerOnly: true } as const
    const some = [
      row(INCH_MM, 2 * INCH_MM, single),
      row(1.5 * INCH_MM, 2 * INCH_MM, { series: 'inch' }),
    ]
    expect(nominal(inchLadder(some, [], null))).toContain('2.5=1.5+1')
    const all = [row(INCH_MM, 3 * INCH_MM, single), row(3 * INCH_MM, 3 * INCH_MM, single)]
    expect(nominal(inchLadder(all, [], null))).toEqual(['1=1', '3=3'])
  })

  const section = (pipeMm: number, nominalMm: number, actualMm: number): InchSection => ({
    source: 'test',
    confidence: 'found',
    system: 's',
    pipeOuterDiameterM: pipeMm / 1000,
    nominalThicknessM: nominalMm / 1000,
    actualThicknessM: actualMm / 1000,
  })

  // ASTM C585 sections differ from their names, and from pipe to pipe: those of another pipe do not serve.
  test('are as thick as the section made for this pipe, within one hundredth of its diameter', () => {
    const sections = [section(114.3, 25.4, 26.9), section(60.3, 25.4, 26.2)]
    const actualMm = (pipeMm: number): number | undefined => {
      const [rung] = inchLadder(inches([1], 2), sections, pipeMm / 1000)
      return rung && Number((rung.thicknessM * 1000).toFixed(3))
    }
    expect(actualMm(60.3)).toBe(26.2)
    expect(actualMm(60.8)).toBe(26.2)
    expect(actualMm(61)).toBe(25.4)
    expect(actualMm(114.3)).toBe(26.9)
  })
})
