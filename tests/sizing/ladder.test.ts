/**
 * The layering rule: up to 50 mm one layer; above, the fewest pieces, the first of 40 or 50 mm, the smallest difference,
 * up to twice the largest piece. Source: product rule, after the handbook rules `two_layers_over_50` and
 * `first_layer_40_50` of the catalogue.
 */
import { describe, expect, test } from 'vitest'
import type { InchSection, ThicknessStep } from '#catalogue/types.ts'
import { inchLadder, metricLadder, plainSteps } from '#sizing/ladder.ts'
import type { Step } from '#sizing/problem.ts'
import { catalogue, mm } from './catalogue.ts'

const from = { source: 'test', confidence: 'found' } as const

function steps(
  thicknessesMm: readonly number[],
  form: { readonly largestMm: number; readonly single?: boolean; readonly series?: 'inch' },
): ThicknessStep[] {
  return thicknessesMm.map((thicknessMm) => ({
    ...from,
    materialId: 'm',
    form: 'section',
    series: form.series ?? 'metric',
    thicknessM: thicknessMm / 1000,
    maxSingleLayerM: form.largestMm / 1000,
    singleLayerOnly: form.single ?? false,
  }))
}

/** `70=40+30`: how a rung is made up. */
const made = (ladder: readonly Step[]): string[] =>
  ladder.map(({ thicknessM, piecesM }) => `${mm(thicknessM)}=${piecesM.map(mm).join('+')}`)
const totals = (ladder: readonly Step[]): number[] => ladder.map(({ thicknessM }) => mm(thicknessM))

describe('metric ladder', () => {
  const section = metricLadder(
    steps([20, 25, 30, 40, 50, 60, 70, 80, 90, 100, 120], { largestMm: 120 }),
  )

  test('up to 50 mm one layer', () => {
    expect(made(section).slice(0, 5)).toEqual(['20=20', '25=25', '30=30', '40=40', '50=50'])
  })

  test('above, two pieces of which the first is 40 or 50 mm', () => {
    const pairs = section.filter(({ thicknessM }) => thicknessM > 0.05 && thicknessM <= 0.17)
    expect(pairs.length).toBeGreaterThan(8)
    for (const { piecesM } of pairs) {
      expect(piecesM).toHaveLength(2)
      expect([40, 50]).toContain(mm(piecesM[0]))
    }
  })

  test('of the pairs for one total, the one that differs least', () => {
    // 80 = 40+40 (not 50+30), 100 = 50+50 (not 40+60), 110 = 50+60 (not 40+70), 140 = 50+90 (not 40+100).
    expect(made(section)).toEqual(
      expect.arrayContaining(['80=40+40', '100=50+50', '110=50+60', '140=50+90', '160=40+120']),
    )
  })

  test('the ladder goes up to twice the largest piece, beyond the reach of a 40 or 50 mm piece too', () => {
    expect(totals(section).at(-1)).toBe(240)
    expect(made(section)).toEqual(
      expect.arrayContaining([
        '180=90+90',
        '190=90+100',
        '200=100+100',
        '220=100+120',
        '240=120+120',
      ]),
    )
    expect(section.every(({ piecesM }) => piecesM.length <= 2)).toBe(true)
  })

  test('without a piece of 40 or 50 mm, the pairs that differ least above 50 mm', () => {
    expect(made(metricLadder(steps([9, 13, 19, 25, 32], { largestMm: 32 })))).toEqual([
      '9=9',
      '13=13',
      '19=19',
      '25=25',
      '32=32',
      '51=19+32',
      '57=25+32',
      '64=32+32',
    ])
  })

  test('thinnest first, each total once, sums without the dust of fractions', () => {
    const found = section.map(({ thicknessM }) => thicknessM)
    expect(found).toEqual([...new Set(found)].sort((a, b) => a - b))
    expect(found).toContain(0.09)
    expect(section.find(({ thicknessM }) => thicknessM === 0.09)?.piecesM).toEqual([0.04, 0.05])
  })

  test('a form marked single stays single', () => {
    expect(made(metricLadder(steps([5, 13, 20, 30, 60], { largestMm: 60, single: true })))).toEqual(
      ['5=5', '13=13', '20=20', '30=30', '60=60'],
    )
  })

  test('a listed thickness above the largest piece is wound up from the largest', () => {
    expect(made(metricLadder(steps([5, 10, 25, 40], { largestMm: 10 })))).toEqual([
      '5=5',
      '10=10',
      '25=10+10+5',
      '40=10+10+10+10',
    ])
  })

  test('steps of another series are left out, and none give no rung', () => {
    expect(metricLadder(steps([25.4], { largestMm: 50, series: 'inch' }))).toEqual([])
    expect(metricLadder([])).toEqual([])
  })

  test.each(catalogue.materials.map(({ id }) => id))('%s of the catalogue keeps the rule', (id) => {
    const own = catalogue.steps.filter(
      ({ materialId, series }) => materialId === id && series === 'metric',
    )
    const sold = own.map(({ thicknessM }) => mm(thicknessM))
    for (const { thicknessM, piecesM } of metricLadder(own)) {
      expect(mm(piecesM.reduce((sum, pieceM) => sum + pieceM, 0))).toBe(mm(thicknessM))
      for (const pieceM of piecesM) expect(sold).toContain(mm(pieceM))
      const largestM = Math.max(...own.map((step) => step.maxSingleLayerM))
      for (const pieceM of piecesM) expect(pieceM).toBeLessThanOrEqual(largestM + 1e-9)
      if (own.every((step) => step.singleLayerOnly)) expect(piecesM).toHaveLength(1)
    }
  })
})

test('a conductivity alone has sections of 20 to 100 mm', () => {
  const rungs = plainSteps()
  expect(totals(rungs)).toEqual([20, 25, 30, 40, 50, 60, 65, 70, 75, 80, 90, 100])
  expect(rungs.every(({ nominalThicknessM }) => nominalThicknessM === null)).toBe(true)
})

describe('inch ladder', () => {
  const IN = 25.4
  const own = steps(
    [0.5, 1, 1.5, 2, 2.5, 3, 4, 5].map((inches) => inches * IN),
    { largestMm: 127, series: 'inch' },
  )
  // ASHRAE Handbook Fundamentals 2021 (SI), chapter 23, table 13, NPS 2: 1 in is 26.9 mm, 2 in 53.9, 3 in 79.3, 4 in 106.3.
  const sections: InchSection[] = [
    [25.4, 26.9],
    [50.8, 53.9],
    [76.2, 79.3],
    [101.6, 106.3],
  ].map(([nominalMm = 0, actualMm = 0]) => ({
    ...from,
    system: 'rigid',
    pipeOuterDiameterM: 0.0603,
    nominalThicknessM: nominalMm / 1000,
    actualThicknessM: actualMm / 1000,
  }))
  const onPipe = inchLadder(own, sections, 0.0603)
  const nominalIn = (rungs: readonly Step[]): number[] =>
    rungs.map(({ nominalThicknessM }) => Number(((nominalThicknessM ?? 0) / 0.0254).toFixed(4)))

  test('computes with the true thickness on the pipe and keeps the nominal one', () => {
    expect(onPipe.find(({ thicknessM }) => mm(thicknessM) === 53.9)).toMatchObject({
      nominalThicknessM: 0.0508,
      piecesM: [expect.closeTo(0.0539, 9)],
    })
    expect(
      onPipe.find(({ thicknessM }) => mm(thicknessM) === 106.3)?.nominalThicknessM,
    ).toBeCloseTo(0.1016, 9)
  })

  test('2 in is still one layer, 3 in is two, the first of 1.5 or 2 in', () => {
    const pieces = (inches: number): readonly number[] =>
      onPipe[nominalIn(onPipe).indexOf(inches)]?.piecesM ?? []
    expect(pieces(2)).toHaveLength(1)
    expect(pieces(3)).toHaveLength(2)
    expect(pieces(3)[0]).toBeCloseTo(0.0793 / 2, 9)
  })

  test('up to twice the largest piece', () => {
    expect(nominalIn(onPipe).at(-1)).toBe(10)
  })

  test('where the table has no row, true equals nominal', () => {
    for (const rungs of [inchLadder(own, sections, 0.9), inchLadder(own, sections, null)]) {
      for (const { thicknessM, nominalThicknessM } of rungs)
        expect(thicknessM).toBe(nominalThicknessM)
    }
  })

  test('a nominal thickness takes no row but its own', () => {
    const [odd] = inchLadder(
      steps([2.1 * IN], { largestMm: 127, series: 'inch', single: true }),
      sections,
      0.0603,
    )
    expect(mm(odd?.thicknessM)).toBe(53.34)
  })

  test('pieces of a rung add up to its true thickness', () => {
    for (const { thicknessM, piecesM } of onPipe)
      expect(piecesM.reduce((sum, pieceM) => sum + pieceM, 0)).toBeCloseTo(thicknessM, 9)
  })

  test('no inch steps give no rung', () => {
    expect(inchLadder(steps([20], { largestMm: 50 }), sections, 0.0603)).toEqual([])
  })
})
