/** A list of runs as CSV, in and out. Reading finds everything that is wrong at once and never throws. */
import Papa from 'papaparse'
import { type CellOptions, formatCell, parseCell, quote } from '#model/cell.ts'
import { type FieldKey, fields, type RunValues } from '#model/fields.ts'
import { type Column, columns, columnsToCome, nearestColumn } from './csv-columns.ts'
import type { CsvIssue } from './csv-issue.ts'
import { cellOptions } from './csv-numbers.ts'
import { type CsvRow, type CsvTable, readCsvTable } from './csv-table.ts'
import { guardFormula, unguardFormula } from './csv-text.ts'

export { type CsvIssue, sentence } from './csv-issue.ts'

export type RunsCsv =
  | { readonly ok: true; readonly runs: readonly RunValues[]; readonly list: ReadList }
  /** `list`: what could be read all the same, so that its own faults are found too. */
  | { readonly ok: false; readonly issues: readonly CsvIssue[]; readonly list: ReadList }

/** The rows of a list as far as they could be read. */
export interface ReadList {
  readonly header: {
    readonly row: number
    readonly keys: ReadonlySet<FieldKey>
    /** Whether every column is read; one that is not may hold what a run seems to lack. */
    readonly isWhole: boolean
  }
  readonly rows: readonly ReadRow[]
}
export interface ReadRow {
  /** As a spreadsheet counts, the first row being 1. */
  readonly row: number
  readonly values: RunValues
  /** Fields that have their issue already. */
  readonly faulty: ReadonlySet<FieldKey>
}

export function parseRunsCsv(source: string | Uint8Array): RunsCsv {
  const table = readCsvTable(source)
  if (!table.ok) return { ...table, list: emptyList }
  const header = readHeader(table.header, table.rows)
  const body = readRows(table, header.columns)
  const keys = header.columns.flatMap((column) => (column ? [column.field.key as FieldKey] : []))
  const isWhole = header.issues.length === 0
  const list: ReadList = {
    header: { row: table.header.row, keys: new Set(keys), isWhole },
    // Where quotes do not pair up, what stands in the cells is anybody's guess.
    rows: table.issues.length === 0 ? body.rows : [],
  }
  const issues = [...table.issues, ...header.issues, ...body.issues]
  if (issues.length > 0) return { ok: false, issues: issues.sort((a, b) => a.row - b.row), list }
  return { ok: true, runs: body.rows.map(({ values }) => values), list }
}

const emptyList: ReadList = { header: { row: 1, keys: new Set(), isWhole: false }, rows: [] }

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
  const rows = table.rows.flatMap(({ row, cells }): ReadRow[] => {
    const width = widthIssue(cells, header)
    if (width) {
      issues.push({ row, column: '', ...width })
      return []
    }
    const run = readRun(cells, header, options)
    for (const issue of run.issues) issues.push({ row, ...issue })
    const tag = tagIssue(run.values, run.faulty, header, tags, row)
    if (tag) issues.push({ row, column: 'tag', ...tag })
    // Where there is no tag, the reader has said so: of the row, or of the header.
    if (run.values.tag === undefined) run.faulty.add('tag')
    return [{ row, values: run.values, faulty: run.faulty }]
  })
  if (table.rows.length === 0) {
    const allowed = 'a row for every run below the header'
    issues.push({ row: 0, column: '', found: 'no runs', allowed })
  }
  return { rows, issues }
}

function readRun(cells: readonly string[], header: Header['columns'], options: CellOptions) {
  const issues: Omit<CsvIssue, 'row'>[] = []
  const faulty = new Set<FieldKey>()
  const values: Record<string, unknown> = {}
  header.forEach((column, index) => {
    if (!column) return
    const text = cells[index] ?? ''
    const { field, twin } = column
    const plain = field.kind === 'text' ? unguardFormula(text.trim()) : text
    const cell = parseCell(field, plain, { ...options, twin })
    if (!cell.ok) {
      issues.push({ column: column.header, found: cell.found, allowed: cell.allowed })
      faulty.add(field.key as FieldKey)
    } else if (cell.value !== undefined) values[field.key] = cell.value
  })
  return { values: values as RunValues, issues, faulty }
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
  faulty: ReadonlySet<FieldKey>,
  header: Header['columns'],
  tags: Map<string, number>,
  row: number,
) {
  const hasColumn = header.some((column) => column?.field.key === 'tag')
  if (!hasColumn || faulty.has('tag')) return null
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
