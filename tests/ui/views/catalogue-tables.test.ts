import { expect, test } from 'vitest'
import { tablesOf } from '#ui/views/catalogue/tables.ts'
import type { UnitSystem } from '#units/quantities.ts'
import { shippedCatalogue } from '../../catalogue/shipped-catalogue.ts'

const catalogue = shippedCatalogue()

function rowsOf(title: string, units: UnitSystem = 'si') {
  const table = tablesOf(catalogue, units).find((candidate) => candidate.title === title)
  if (!table) throw new Error(`no table ${title}`)
  return table.rows
}
const cells = (title: string, id: string, units?: UnitSystem) =>
  rowsOf(title, units).find((row) => row.id === id)?.cells

test('every table has a head for each cell, an id of its own for each row, and a source', () => {
  for (const { title, heads, rows } of tablesOf(catalogue, 'si')) {
    expect(rows.length, title).toBeGreaterThan(0)
    expect(rows.every((row) => row.cells.length === heads.length)).toBe(true)
    expect(rows.every((row) => row.cells.every((cell) => cell !== ''))).toBe(true)
    expect(rows.every((row) => row.source !== '')).toBe(true)
  }
})

test('a code says which band an end belongs to, what it asks for and at which conductivity', () => {
  const words = (id: string, units?: UnitSystem) => cells('Code figures', id, units)?.slice(1)
  expect(words('geg-2024-heating 1')).toEqual([
    'inside above 22 to 35',
    'any',
    '0.035 at 40\u00a0°C',
    'at least 30\u00a0mm',
  ])
  expect(words('geg-2024-heating 2')?.at(-1)).toBe('thickness = inner diameter')
  expect(words('ashrae-90.1-2010-heating 12')).toEqual([
    'nominal 40 to below 100',
    'above 93 to 121',
    '0.039 to 0.043 at 66\u00a0°C',
    'at least 64\u00a0mm',
  ])
  expect(words('ashrae-90.1-2016-cooling 9', 'us')).toEqual([
    'nominal from 7.87',
    'below 40',
    '0.20 to 0.26 at 50\u00a0°F',
    'at least 1.5\u00a0in',
  ])
  expect(words('ashrae-90.1-2010-duct-return-exterior 0')).toEqual([
    'any',
    'any',
    'at 24\u00a0°C',
    'at least 0.62\u00a0m²K/W',
  ])
})

test('a code carries its factors and its warning', () => {
  const row = rowsOf('Codes').find(({ id }) => id === 'dpr-412-a')
  expect(row?.cells.at(-1)).toContain('0.5 for category B')
  expect(row?.cells.at(-1)).toContain('0.3 for category C')
  expect(
    rowsOf('Codes').every(({ note }) => note.endsWith('Verify against your own edition.')),
  ).toBe(true)
})

test('a loss is shown with the conditions it is stated for', () => {
  const [code] = catalogue.codeTables
  const [row] = code?.rows ?? []
  if (!code || !row) throw new Error('no code')
  const loss = {
    ...row,
    quantity: 'max-loss' as const,
    value: 7.06,
    conductivityMinWPerMK: null,
    conductivityMaxWPerMK: null,
    ratingMeanC: null,
    conditions: { mediumC: 60, airC: 15, windMPerS: 0, emissivity: null },
  }
  const own = { ...catalogue, codeTables: [{ ...code, rows: [loss] }] }
  const table = tablesOf(own, 'si').find(({ title }) => title === 'Code figures')
  expect(table?.rows[0]?.cells.slice(3)).toEqual([
    '–',
    'at most 7.1\u00a0W/m with medium 60\u00a0°C, air 15\u00a0°C, wind 0.0\u00a0m/s, emissivity of the finish',
  ])
})

test('fittings keep their two conventions apart', () => {
  expect(cells('Bare fittings', 'valve 150 100')).toEqual([
    'Valve',
    '100',
    '114.3',
    '150',
    '0.4350',
  ])
  expect(cells('Fitting lengths', 'valve true any 100 400')).toEqual([
    'Valve',
    'lagged',
    'anywhere',
    '100',
    '400',
    '6.50',
    '6.00 to 7.00',
  ])
  const titles = tablesOf(catalogue, 'si').map(({ title }) => title)
  expect(new Set(titles).size).toBe(titles.length)
})
