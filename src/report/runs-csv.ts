/** A list of runs as CSV, in and out. Reading finds everything that is wrong at once and never throws. */
import Papa from 'papaparse'
import { type CellOptions, formatCell, parseCell, quote } from '#model/cell.ts'
import { couldBeThousands, readDecimal } from '#model/decimal.ts'
import { fields, type RunValues } from '#model/fields.ts'
import { type Column, columns, columnsToCome, nearestColumn } from './csv-columns.ts'
import type { CsvIssue } from './csv-issue.ts'
import { type CsvRow, type CsvTable, readCsvTable } from './csv-table.ts'
import { guardFormula, unguardFormula } from './csv-text.ts'

export { type CsvIssue, sentence } from './csv-issue.ts'

export type RunsCsv =
  /** `lines`: the row of each run, the header being row 1. */
  | { readonly ok: true; readonly runs: readonly RunValues[]; readonly lines: readonly number[] }
  | { readonly ok: false; readonly issues: readonly CsvIssue[] }

export function parseRunsCsv(source: string | Uint8Array): RunsCsv {
  const table = readCsvTable(source)
  if (!table.ok) return table
  const header = readHeader(table.header, table.rows)
  const body = readRows(table, header.columns)
  const issues = [...table.issues, ...header.issues, ...body.issues]
  if (issues.length > 0) return { ok: false, issues: issues.sort((a, b) => a.row - b.row) }
  return { ok: true, runs: body.runs, lines: table.rows.map(({ row }) => row) }
}

/** The runs as CSV with the columns in use; `parseRunsCsv` gives the same runs back. */
export function writeRunsCsv(runs: readonly RunValues[]): string {
  const used = fields.filter(
    ({ key }) => key === 'tag' || runs.some((values) => values[key] !== undefined),
  )
  const rows = runs.map((values) =>
    used.map((field) => {
      const text = formatCell(field, values[field.key])
      return field.kind === 'text' ? guardFormula(text) : text
    }),
  )
  const options = { newline: '\n' }
  return `${Papa.unparse([used.map(({ column }) => column), ...rows], options)}\n`
}

interface Header {
  /** By position; null for a column that is not read. */
  readonly columns: readonly (Column | null)[]
  readonly issues: readonly CsvIssue[]
}

function readHeader({ row, cells }: CsvRow, rows: readonly CsvRow[]): Header {
  const issues: CsvIssue[] = []
  const taken = new Map<string, string>()
  const width = cells.findLastIndex((cell) => cell.trim() !== '') + 1
  const read = cells.slice(0, width).map((cell, index) => {
    const header = cell.trim().toLowerCase()
    const column = columns.get(header)
    if (!column) {
      const isUsed = header !== '' || rows.some((line) => line.cells[index]?.trim())
      if (isUsed) issues.push({ row, ...unknownColumn(header) })
      return null
    }
    const before = taken.get(column.field.key)
    if (before !== undefined) {
      const found = before === header ? 'the column twice' : `the same as column ${before} again`
      issues.push({ row, column: header, found, allowed: 'each column once, in one unit' })
      return null
    }
    taken.set(column.field.key, header)
    return column
  })
  if (!taken.has('tag')) {
    issues.push({ row, column: 'tag', found: 'no such column', allowed: 'a tag for every run' })
  }
  return { columns: read, issues }
}

function unknownColumn(header: string): Omit<CsvIssue, 'row'> {
  if (header === '') {
    return { column: '', found: 'a column without a name', allowed: 'a name above every column' }
  }
  const column = /^\w{1,60}$/.test(header) ? header : quote(header)
  return columnsToCome.has(header)
    ? { column, found: 'a column that is not yet supported', allowed: 'the list without it' }
    : {
        column,
        found: 'an unknown column',
        allowed: `known columns, of which ${nearestColumn(header)} is the nearest`,
      }
}

type Table = Extract<CsvTable, { ok: true }>

function readRows(table: Table, header: Header['columns']) {
  const issues: CsvIssue[] = []
  const options = cellOptions(table, header)
  const tags = new Map<string, number>()
  const runs = table.rows.map(({ row, cells }) => {
    const width = widthIssue(cells, header)
    if (width) {
      issues.push({ row, column: '', ...width })
      return {}
    }
    const run = readRun(cells, header, options)
    for (const issue of run.issues) issues.push({ row, ...issue })
    const tag = tagIssue(run.values, run.issues, header, tags, row)
    if (tag) issues.push({ row, column: 'tag', ...tag })
    return run.values
  })
  if (runs.length === 0) {
    const allowed = 'a row for every run below the header'
    issues.push({ row: 0, column: '', found: 'no runs', allowed })
  }
  return { runs, issues }
}

function readRun(cells: readonly string[], header: Header['columns'], options: CellOptions) {
  const issues: Omit<CsvIssue, 'row'>[] = []
  const values: Record<string, unknown> = {}
  header.forEach((column, index) => {
    if (!column) return
    const text = cells[index] ?? ''
    const { field, twin } = column
    const plain = field.kind === 'text' ? unguardFormula(text.trim()) : text
    const cell = parseCell(field, plain, { ...options, twin })
    if (!cell.ok) issues.push({ column: column.header, found: cell.found, allowed: cell.allowed })
    else if (cell.value !== undefined) values[field.key] = cell.value
  })
  return { values: values as RunValues, issues }
}

/** More cells than the header is fine while they are empty, as some spreadsheets write them; fewer is a torn row. */
function widthIssue(cells: readonly string[], header: Header['columns']) {
  const spare = cells.slice(header.length).some((cell) => cell.trim() !== '')
  if (!spare && cells.length >= header.length) return null
  return { found: `${count(cells.length, 'cell')}`, allowed: `${header.length}, as in the header` }
}

const count = (number: number, noun: string) => `${number} ${noun}${number === 1 ? '' : 's'}`

function tagIssue(
  values: RunValues,
  issues: readonly Omit<CsvIssue, 'row'>[],
  header: Header['columns'],
  tags: Map<string, number>,
  row: number,
) {
  const hasColumn = header.some((column) => column?.field.key === 'tag')
  if (!hasColumn || issues.some(({ column }) => column === 'tag')) return null
  if (values.tag === undefined)
    return { found: 'nothing', allowed: 'a tag of its own for every run' }
  const before = tags.get(values.tag)
  if (before === undefined) {
    tags.set(values.tag, row)
    return null
  }
  return {
    found: `${quote(values.tag)}, as in row ${before}`,
    allowed: 'a tag of its own for every run',
  }
}

/** How numbers are written in this file. A mark is in doubt where the file shows the other one parting decimals. */
function cellOptions({ separator, rows }: Table, header: Header['columns']): CellOptions {
  if (separator === ',') return { decimalComma: false }
  const seen = decimalMarks(rows, header)
  const doubtfulMarks = [
    ...(seen.comma ? (['.'] as const) : []),
    ...(seen.point ? ([','] as const) : []),
  ]
  return { decimalComma: true, doubtfulMarks }
}

function decimalMarks(rows: readonly CsvRow[], header: Header['columns']) {
  const seen = { comma: false, point: false }
  for (const { cells } of rows) {
    header.forEach((column, index) => {
      const text = cells[index] ?? ''
      if (column?.field.kind !== 'number') return
      if (text.includes(',') && isDecimal(text, ',')) seen.comma = true
      if (text.includes('.') && isDecimal(text, '.')) seen.point = true
    })
  }
  return seen
}

function isDecimal(text: string, mark: '.' | ','): boolean {
  return !couldBeThousands(text, mark) && readDecimal(text, { decimalComma: mark === ',' }) !== null
}
