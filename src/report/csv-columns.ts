/** What the columns of a list of runs are called, and which known name is meant by an unknown one. */
import { twinOf } from '#model/cell.ts'
import { type Field, fields } from '#model/fields.ts'
import { laterColumns } from '#model/later.ts'
import { quantities } from '#model/quantities.ts'

export interface Column {
  readonly header: string
  readonly field: Field
  /** The US form of the column: in, ft or °F. */
  readonly twin: boolean
}

/** Every column that is read, by its header. */
export const columns: ReadonlyMap<string, Column> = new Map(
  fields.flatMap((field) => columnsOf(field).map((column) => [column.header, column])),
)

/** Columns of the finished program that are refused by name, with their US twins. */
export const columnsToCome: ReadonlySet<string> = new Set(
  laterColumns.flatMap((header) => [header, ...twinHeaders(header)]),
)

function columnsOf(field: Field): readonly Column[] {
  const column = { header: field.column, field, twin: false }
  const twin = field.kind === 'number' ? twinOf(field) : undefined
  if (field.kind !== 'number' || !twin) return [column]
  const stem = field.column.slice(0, -quantities[field.quantity].suffix.length)
  return [column, { header: stem + twin.suffix, field, twin: true }]
}

function twinHeaders(header: string): readonly string[] {
  return Object.values(quantities).flatMap((quantity) =>
    'twin' in quantity && header.endsWith(`_${quantity.suffix}`)
      ? [header.slice(0, -quantity.suffix.length) + quantity.twin.suffix]
      : [],
  )
}

/** The known column that is spelled most like an unknown one. */
export function nearestColumn(unknown: string): string {
  const wanted = unknown.slice(0, 60)
  let nearest = ''
  let least = Number.POSITIVE_INFINITY
  for (const header of columns.keys()) {
    const distance = editDistance(wanted, header)
    if (distance < least) {
      nearest = header
      least = distance
    }
  }
  return nearest
}

/** Letters to put in, take out or change (Levenshtein 1965). */
function editDistance(from: string, to: string): number {
  let above = Array.from({ length: to.length + 1 }, (_, index) => index)
  for (let row = 1; row <= from.length; row += 1) {
    const current = [row]
    for (let column = 1; column <= to.length; column += 1) {
      const change = (above[column - 1] ?? 0) + (from[row - 1] === to[column - 1] ? 0 : 1)
      current.push(Math.min(change, (above[column] ?? 0) + 1, (current[column - 1] ?? 0) + 1))
    }
    above = current
  }
  return above[to.length] ?? 0
}
