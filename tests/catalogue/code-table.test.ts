import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { type CodeCase, codeRowsFor, findCodeTable, nominalSizeM } from '#catalogue/code-table.ts'
import type { CodeRow, CodeTable } from '#catalogue/types.ts'
import { shippedCatalogue } from './shipped-catalogue.ts'

const catalogue = shippedCatalogue()

function tableOf(id: string): CodeTable {
  const lookup = findCodeTable(catalogue, id)
  if (!lookup.ok) throw new Error(lookup.message)
  return lookup.item
}
const bare: CodeCase = { nominalM: null, outerDiameterM: null, innerDiameterM: null, fluidC: 60 }
function rowsOf(id: string, run: Partial<CodeCase>): readonly CodeRow[] {
  const found = codeRowsFor(tableOf(id), { ...bare, ...run })
  if (!found.ok) throw new Error(found.reason)
  return found.rows
}
const reason = (id: string, run: Partial<CodeCase>) => {
  const found = codeRowsFor(tableOf(id), { ...bare, ...run })
  return found.ok ? '' : found.reason
}
const millimetres = (id: string, run: Partial<CodeCase>) =>
  rowsOf(id, run).map(({ value, rule }) => rule ?? Number(((value ?? 0) * 1000).toFixed(3)))

describe('a code table by name', () => {
  test.each(['geg-2024-heating', 'GEG 2024 heating', ' GEG-2024-Heating '])('%s', (text) => {
    expect(tableOf(text).id).toBe('geg-2024-heating')
  })

  test('every id finds its own table', () => {
    for (const table of catalogue.codeTables) expect(tableOf(table.id)).toBe(table)
  })

  test('a near miss is answered with near ids, anything else with all of them', () => {
    const near = findCodeTable(catalogue, 'geg 2024 heat')
    expect(near).toMatchObject({ ok: false, message: expect.stringContaining('geg-2024-heating') })
    const none = findCodeTable(catalogue, 'qqqq')
    expect(none).toMatchObject({ ok: false })
    for (const { id } of catalogue.codeTables) expect(none.ok ? '' : none.message).toContain(id)
  })
})

describe('German Building Energy Act, annex 8', () => {
  // Up to 22 mm bore 20 mm; above 22 to 35 mm 30 mm; above 35 to 100 mm the bore; above 100 mm 100 mm.
  test.each([
    [10, 20],
    [22, 20],
    [22.001, 30],
    [35, 30],
    [35.001, 'inner-diameter'],
    [100, 'inner-diameter'],
    [100.001, 100],
    [600, 100],
  ])('a bore of %d mm', (boreMm, asked) => {
    expect(millimetres('geg-2024-heating', { innerDiameterM: boreMm / 1000 })).toEqual([asked])
  })

  test('a bore from a subtraction meets the border it stands for', () => {
    for (const innerDiameterM of [0.028 - 2 * 0.003, 0.024 - 0.002, 0.1 - 0.078])
      expect(millimetres('geg-2024-heating', { innerDiameterM })).toEqual([20])
  })

  // 2024 edition as summarised in the trade press: 9 mm up to 22 mm, else 19 mm; 6 mm until then.
  test('cold pipes', () => {
    expect(millimetres('geg-2024-chilled', { innerDiameterM: 0.022 })).toEqual([9])
    expect(millimetres('geg-2024-chilled', { innerDiameterM: 0.0221 })).toEqual([19])
    expect(millimetres('geg-2020-chilled', {})).toEqual([6])
  })
})

describe('ASHRAE 90.1', () => {
  // Standard 90.1-2010 as ASHRAE Handbook Fundamentals 2021 (SI), chapter 23, table 2 prints it.
  test.each([
    { nominalMm: 15, fluidC: 180, asked: 114 },
    { nominalMm: 25, fluidC: 180, asked: 127 },
    { nominalMm: 20, fluidC: 150, asked: 89 },
    { nominalMm: 32, fluidC: 177, asked: 102 },
    { nominalMm: 40, fluidC: 150, asked: 114 },
    { nominalMm: 80, fluidC: 121, asked: 64 },
    { nominalMm: 80, fluidC: 121.1, asked: 114 },
    { nominalMm: 100, fluidC: 121, asked: 76 },
    { nominalMm: 32, fluidC: 93, asked: 38 },
    { nominalMm: 40, fluidC: 93, asked: 51 },
    { nominalMm: 50, fluidC: 60, asked: 38 },
    { nominalMm: 50, fluidC: 60.5, asked: 51 },
    { nominalMm: 25, fluidC: 41, asked: 25 },
  ])('heating, size $nominalMm at $fluidC °C', ({ nominalMm, fluidC, asked }) => {
    expect(millimetres('ashrae-90.1-2010-heating', { nominalM: nominalMm / 1000, fluidC })).toEqual(
      [asked],
    )
  })

  test.each([
    { nominalMm: 32, fluidC: 16, asked: 13 },
    { nominalMm: 32, fluidC: 4, asked: 13 },
    { nominalMm: 32, fluidC: 3.9, asked: 25 },
    { nominalMm: 200, fluidC: 7, asked: 25 },
    { nominalMm: 200, fluidC: -30, asked: 38 },
  ])('cooling, size $nominalMm at $fluidC °C', ({ nominalMm, fluidC, asked }) => {
    expect(millimetres('ashrae-90.1-2010-cooling', { nominalM: nominalMm / 1000, fluidC })).toEqual(
      [asked],
    )
  })

  // 90.1-2016 as a public page reproduces it: 1-1/2 to below 4 in, 141 to 200 °F: 2 in; above 350 °F: 5 in.
  test('the inch edition has its borders in °F', () => {
    const at = (degreesF: number) =>
      millimetres('ashrae-90.1-2016-heating', { nominalM: 0.05, fluidC: (degreesF - 32) / 1.8 })
    expect(at(200)).toEqual([50.8])
    expect(at(201)).toEqual([63.5])
    expect(at(350)).toEqual([114.3])
    expect(at(351)).toEqual([127])
    expect(at(105)).toEqual([38.1])
  })

  // Table 3 of the same chapter.
  test('ducts by place and climate zone', () => {
    const asked = (id: string) => rowsOf(`ashrae-90.1-2010-duct-${id}`, {}).map((row) => row.value)
    expect(asked('exterior-zones-1-5')).toEqual([1.06])
    expect(asked('exterior-zones-6-8')).toEqual([1.41])
    expect(asked('insulated-attic-zones-5-8')).toEqual([0.34])
    expect(asked('return-exterior')).toEqual([0.62])
  })
})

describe('Italian DPR 412/1993', () => {
  // Annex B from memory; 20 and 30 mm at 0.040 W/mK confirmed in a public installation manual.
  test.each([
    [19.9, 20],
    [20, 30],
    [39.5, 30],
    [48.3, 40],
    [60.3, 50],
    [99.9, 55],
    [100, 60],
    [323.9, 60],
  ])('%d mm outside at 0.040 W/mK', (outerMm, asked) => {
    const rows = rowsOf('dpr-412-a', { outerDiameterM: outerMm / 1000 })
    expect(rows.map((row) => row.conductivityMinWPerMK)).toEqual([
      0.03, 0.032, 0.034, 0.036, 0.038, 0.04, 0.042, 0.044, 0.046, 0.048, 0.05,
    ])
    const at040 = rows.find((row) => row.conductivityMinWPerMK === 0.04)
    expect((at040?.value ?? 0) * 1000).toBeCloseTo(asked, 9)
  })
})

describe('what a table does not cover', () => {
  test('is said with what it does cover', () => {
    expect(reason('ashrae-90.1-2010-heating', { nominalM: 0.05, fluidC: 35 })).toBe(
      'ashrae-90.1-2010-heating asks for nothing at a medium of 35 °C: it covers 41 °C and more.',
    )
    expect(reason('ashrae-90.1-2010-cooling', { nominalM: 0.05, fluidC: 18 })).toBe(
      'ashrae-90.1-2010-cooling asks for nothing at a medium of 18 °C: it covers 16 °C and less.',
    )
    const table = tableOf('geg-2024-heating')
    const short = { ...table, rows: table.rows.slice(1, 3) }
    const found = codeRowsFor(short, { ...bare, innerDiameterM: 0.12 })
    expect(found).toEqual({
      ok: false,
      reason: 'geg-2024-heating asks for nothing at 120 mm: it covers 22 to 100 mm.',
    })
  })

  test.each([
    ['geg-2024-heating', 'inner diameters'],
    ['dpr-412-a', 'outside diameters'],
    ['ashrae-90.1-2010-heating', 'nominal sizes'],
  ])('%s needs what it counts', (id, measure) => {
    expect(reason(id, {})).toBe(
      `${id} goes by ${measure} of pipes, and this run has none: give a size such as DN 50, NPS 2 or CU 28, or take another table.`,
    )
  })
})

test('a loss table for single temperatures is found at them', () => {
  const [shape] = tableOf('geg-2024-floor').rows
  if (!shape) throw new Error('no row')
  const at = (fluidC: number, value: number) => ({
    ...shape,
    fluidMinC: fluidC,
    fluidMaxC: fluidC,
    value,
  })
  const own = { ...tableOf('geg-2024-floor'), rows: [at(60, 1), at(75, 2)] }
  const found = codeRowsFor(own, { ...bare, fluidC: 75 })
  expect(found).toMatchObject({ ok: true, rows: [{ value: 2 }] })
  expect(codeRowsFor(own, { ...bare, fluidC: 70 }).ok).toBe(false)
})

test('every run that a table covers has exactly one cell', () => {
  const lengths = fc.integer({ min: 1, max: 700_000 }).map((micrometres) => micrometres / 1e6)
  fc.assert(
    fc.property(
      fc.constantFrom(...catalogue.codeTables),
      lengths,
      fc.oneof(
        fc.double({ min: -100, max: 400, noNaN: true }),
        fc.constantFrom(4, 16, 41, 60, 93, 121, 177),
      ),
      (table, sizeM, fluidC) => {
        const run = { nominalM: sizeM, outerDiameterM: sizeM, innerDiameterM: sizeM, fluidC }
        const found = codeRowsFor(table, run)
        const cells = table.conversion === 'interpolate' ? 11 : 1
        if (found.ok) expect(found.rows).toHaveLength(cells)
        else expect(found.reason).toMatch(/°C and (more|less)\.$/)
      },
    ),
  )
})

describe('a nominal size from an outside diameter', () => {
  // EN 10220 and ASME B36.10M.
  test.each([
    [21.3, 15],
    [33.4, 25],
    [33.7, 25],
    [42.2, 32],
    [42.4, 32],
    [48.3, 40],
    [60.3, 50],
    [88.9, 80],
    [139.7, 125],
    [141.3, 125],
    [168.3, 150],
    [323.8, 300],
    [610, 600],
  ])('%d mm is DN %d', (outerMm, dn) => {
    expect(nominalSizeM(catalogue, outerMm / 1000) * 1000).toBeCloseTo(dn, 9)
  })

  test('tube counts as the pipe that is not thinner, a giant as its diameter', () => {
    expect(nominalSizeM(catalogue, 0.028)).toBe(0.025)
    expect(nominalSizeM(catalogue, 0.054)).toBe(0.05)
    expect(nominalSizeM(catalogue, 3)).toBe(3)
  })

  test('never falls as the pipe grows', () => {
    const sizes = Array.from({ length: 2000 }, (_, i) => nominalSizeM(catalogue, (i + 1) / 1000))
    expect(sizes.every((size, i) => i === 0 || size >= (sizes[i - 1] ?? 0))).toBe(true)
  })
})
