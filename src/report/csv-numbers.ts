/** How numbers are written in a CSV file: with a decimal point, a decimal comma, or in a way that could be either. */
import type { CellOptions } from '#model/cell.ts'
import { couldBeThousands, readDecimal } from '#model/decimal.ts'
import type { Column } from './csv-columns.ts'
import type { CsvRow, Separator } from './csv-table.ts'

/** By position; null for a column that is not read. */
type Columns = readonly (Column | null)[]

/** A mark is in doubt where the file shows the other one parting decimals. */
export function cellOptions(
  { separator, rows }: { readonly separator: Separator; readonly rows: readonly CsvRow[] },
  header: Columns,
): CellOptions {
  if (separator === ',') return { decimalComma: false }
  const seen = decimalMarks(rows, header)
  const doubtfulMarks = [
    ...(seen.comma ? (['.'] as const) : []),
    ...(seen.point ? ([','] as const) : []),
  ]
  return { decimalComma: true, doubtfulMarks }
}

function decimalMarks(rows: readonly CsvRow[], header: Columns) {
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
