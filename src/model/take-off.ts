/** A list of runs from a spreadsheet with words above its columns, ours or somebody else's. */
import type { CellReader } from './cell-edit.ts'
import { guessColumn, isColumnName, knownColumn, type ReadAs } from './column-guess.ts'
import { type CellText, type NewId, setCells } from './edits.ts'
import type { Job, Run } from './job.ts'

export interface TakeOffColumn {
  readonly header: string
  /** The first values below it. */
  readonly samples: readonly string[]
  /** What it is read as; null where it is left out. */
  readonly readAs: ReadAs | null
}

export interface TakeOff {
  readonly columns: readonly TakeOffColumn[]
  /** The lines below the header, empty ones left out. */
  readonly rows: readonly (readonly string[])[]
  /** Every column is one of ours, so that nothing has to be asked. */
  readonly isKnown: boolean
}

/** The list that a block is, or null where its first row is not a header. */
export function takeOffOf(block: readonly (readonly string[])[]): TakeOff | null {
  const [header = [], ...below] = block
  const rows = below.filter(isUsed)
  if (!isHeader(header, rows)) return null
  const width = block.reduce(
    (widest, row) => Math.max(widest, row.findLastIndex((cell) => cell.trim() !== '') + 1),
    0,
  )
  const columns = oneOfEach(header, width).map((readAs, index) => ({
    header: (header[index] ?? '').trim(),
    samples: rows.slice(0, samplesShown).map((row) => (row[index] ?? '').trim()),
    readAs,
  }))
  const isKnown = columns.every(
    (column) =>
      (column.readAs !== null && knownColumn(column.header) !== null) ||
      (column.header === '' && column.samples.every((sample) => sample === '')),
  )
  return { columns, rows, isKnown }
}

const samplesShown = 3

/** Adds a run for every line, from what the columns are read as; what stands already is left alone. */
export function pasteTakeOff(
  job: Job,
  { columns, rows }: TakeOff,
  newId: NewId,
  readerOf: (units: ReadAs['units']) => CellReader,
): Job {
  const hasShape = columns.some(({ readAs }) => readAs?.key === 'shape')
  const added = rows.map(
    (): Run => ({ id: newId(), values: hasShape ? {} : { shape: 'pipe' }, drafts: {} }),
  )
  const grown = { ...job, runs: [...job.runs, ...added] }
  return (['si', 'us', 'shown'] as const).reduce<Job>(
    (now, units) => setCells(now, cellsIn(units, columns, rows, added), readerOf(units)),
    grown,
  )
}

function cellsIn(
  units: ReadAs['units'],
  columns: TakeOff['columns'],
  rows: TakeOff['rows'],
  added: readonly Run[],
): readonly CellText[] {
  return columns.flatMap(({ readAs }, column) => {
    if (readAs?.units !== units) return []
    return added.map(({ id }, row) => ({
      runId: id,
      key: readAs.key,
      text: rows[row]?.[column] ?? '',
    }))
  })
}

const isUsed = (row: readonly string[]) => row.some((cell) => cell.trim() !== '')

/** Words, no numbers, and something that tells them from a line of the list. */
function isHeader(header: readonly string[], rows: TakeOff['rows']): boolean {
  const words = header.filter((cell) => cell.trim() !== '')
  // One word alone may as well be a tag or a place.
  if (words.length < 2) return false
  const known = words.filter((word) => knownColumn(word) !== null)
  const keys = new Set(known.map((word) => knownColumn(word)?.key))
  if (known.length >= 2 && keys.size === known.length) return true
  if (words.some((word) => hasNumber(word))) return false
  const named = words.filter(isColumnName).map((word) => guessColumn(word)?.key)
  if (new Set(named).size >= 2) return true
  return header.some((cell, index) => cell.trim() !== '' && isNumberColumn(rows, index))
}

/** A figure, but for those of a unit: W/m2. */
const hasNumber = (cell: string) => /\d/.test(cell.replaceAll(/\b(?:m|ft|in)[23]\b/gi, ''))

function isNumberColumn(rows: TakeOff['rows'], index: number): boolean {
  const cells = rows.map((row) => (row[index] ?? '').trim()).filter((cell) => cell !== '')
  return cells.length > 0 && cells.every((cell) => /^[-\u2212+]?\d[\d\s.,]*$/.test(cell))
}

/** Two columns cannot be the same value: one of ours comes before a guess, the first before the next. */
function oneOfEach(header: readonly string[], columns: number): readonly (ReadAs | null)[] {
  const cells = Array.from({ length: columns }, (_, index) => header[index] ?? '')
  const claims = cells.map((cell) => ({
    isOurs: knownColumn(cell) !== null,
    as: guessColumn(cell),
  }))
  return claims.map((claim, index) => {
    const rivals = claims.filter(({ as }) => as !== null && as.key === claim.as?.key)
    const winner = rivals.find(({ isOurs }) => isOurs) ?? rivals[0]
    return winner === claims[index] ? claim.as : null
  })
}
