/** The rows and cells of a CSV file, before anything is known of their meaning. */
import Papa from 'papaparse'
import { columns } from './csv-columns.ts'
import type { CsvIssue } from './csv-issue.ts'
import { decodeUtf8 } from './utf8.ts'

export interface CsvRow {
  /** As a spreadsheet counts, the first row being 1. */
  readonly row: number
  readonly cells: readonly string[]
}

export type CsvTable =
  | {
      readonly ok: true
      readonly separator: Separator
      readonly header: CsvRow
      /** Without the blank ones. */
      readonly rows: readonly CsvRow[]
      /** Quotes that do not pair up; the rows are read as well as they can be. */
      readonly issues: readonly CsvIssue[]
    }
  | { readonly ok: false; readonly issues: readonly CsvIssue[] }

const separators = [',', ';', '\t'] as const
export type Separator = (typeof separators)[number]

/** Splits a file into rows; only bytes that are no text, and a file without any, have no table. */
export function readCsvTable(source: string | Uint8Array): CsvTable {
  const decoded = textOf(source)
  if (typeof decoded !== 'string') return { ok: false, issues: [decoded] }
  const text = decoded.replace(/\r\n?/g, '\n')
  const separator = sniffSeparator(text)
  const { data, errors } = Papa.parse<string[]>(text, { delimiter: separator, newline: '\n' })
  const [header, ...rows] = data
    .map((cells, index) => ({ row: index + 1, cells }))
    .filter(({ cells }) => cells.some((cell) => cell.trim() !== ''))
  if (!header) return { ok: false, issues: [emptyFile] }
  const quoteRows = new Set(
    errors.filter(({ type }) => type === 'Quotes').map(({ row = 0 }) => row + 1),
  )
  return { ok: true, separator, header, rows, issues: [...quoteRows].map(openQuote) }
}

const emptyFile: CsvIssue = {
  row: 0,
  column: '',
  found: 'nothing in it',
  allowed: 'a header row and a row for every run',
}

const openQuote = (row: number): CsvIssue => ({
  row,
  column: '',
  found: 'a quoted cell that does not end where it should',
  allowed: 'quotes in pairs, and a quote inside a quoted cell written twice',
})

function textOf(source: string | Uint8Array): string | CsvIssue {
  if (typeof source === 'string') {
    return source.charCodeAt(0) === 0xfeff ? source.slice(1) : source
  }
  const decoded = decodeUtf8(source)
  if (decoded.ok) return decoded.text
  if (new TextDecoder('latin1').decode(source.subarray(0, 15)) === 'SQLite format 3') {
    return {
      row: 0,
      column: '',
      found: 'a database, as a job is',
      allowed: 'a list of runs as text; if it is a job, a name that ends in .lagjob',
    }
  }
  const isUtf16 = [0xfe, 0xff].includes(source[0] ?? 0) && [0xfe, 0xff].includes(source[1] ?? 0)
  return {
    row: isUtf16 ? 0 : decoded.line,
    column: '',
    found: isUtf16
      ? 'UTF-16 text'
      : `a byte (hexadecimal ${decoded.byte.toString(16)}) that is not UTF-8 text`,
    allowed: 'UTF-8 text; save the file as "CSV UTF-8"',
  }
}

/** The separator under which the header names the most columns; then the one that gives the most cells. */
function sniffSeparator(text: string): Separator {
  const start = /\S/.exec(text)?.index ?? 0
  const lineStart = text.lastIndexOf('\n', start) + 1
  // No header of ours is near this long; a longer first line is not worth reading three times.
  const sample = text.slice(lineStart, lineStart + 20_000)
  let best: Separator = ','
  let bestScore = 0
  for (const separator of separators) {
    const { data } = Papa.parse<string[]>(sample, {
      delimiter: separator,
      newline: '\n',
      preview: 1,
    })
    const cells = data[0] ?? []
    const known = cells.filter((cell) => columns.has(cell.trim().toLowerCase())).length
    const score = known * 20_000 + cells.length
    if (score > bestScore) {
      best = separator
      bestScore = score
    }
  }
  return best
}
