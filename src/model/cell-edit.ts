/** One cell of one run as it was typed: a valid value, nothing, or text that is kept until it is mended. */
import { type CellResult, parseCell } from './cell.ts'
import { type FieldKey, fieldOf, type RunValues } from './fields.ts'
import type { Run } from './job.ts'

/** How typed text is read: in SI units of the columns, or in the units the window shows. */
export interface CellReader {
  readonly read: (key: FieldKey, text: string) => CellResult
  /** Metres of one unit in `600 x 400`. */
  readonly sideM: number
}

/** Reads as the columns are written: SI, mm, per cent; the decimals after a point or a comma. */
export const columnReader: CellReader = {
  read: (key, text) => parseCell(fieldOf(key), text, { decimalComma: true, doubtfulMarks: [','] }),
  sideM: 0.001,
}

/** One run with one cell as typed. */
export function withCell(run: Run, key: FieldKey, text: string, reader: CellReader): Run {
  const typed = text.trim()
  const next = key === 'size' ? withSize(run, typed, reader.sideM) : null
  const read = next ?? readInto(run, key, typed, reader)
  return isSameRun(run, read) ? run : read
}

function readInto(run: Run, key: FieldKey, typed: string, reader: CellReader): Run {
  if (typed === '') {
    return {
      ...run,
      values: withValue(run.values, key, undefined),
      drafts: without(run.drafts, key),
    }
  }
  const cell = reader.read(key, typed)
  if (cell.ok && cell.value !== undefined) {
    const values = { ...run.values, [key]: cell.value }
    return { ...run, values, drafts: without(run.drafts, key) }
  }
  const values = withValue(run.values, key, undefined)
  return { ...run, values, drafts: { ...run.drafts, [key]: typed.slice(0, longestDraft) } }
}

/** As long as the job file takes. */
const longestDraft = 2000

/** `600 x 400` typed as the size of a run is a rectangular duct, or the extent of a flat surface. */
const sides = /^(\d+(?:\.\d+)?)\s*[x×*]\s*(\d+(?:\.\d+)?)(?:\s*mm)?$/i

function withSize(run: Run, typed: string, sideM: number): Run | null {
  const [, width, height] = sides.exec(typed) ?? []
  if (width === undefined || height === undefined) return null
  const widthM = decimal(width, sideM)
  const heightM = decimal(height, sideM)
  const { min, max } = sideRange
  if (![widthM, heightM].every((side) => side >= min && side <= max)) return null
  const shape = run.values.shape === 'flat' ? 'flat' : 'rect-duct'
  const { size: _, ...values } = run.values
  return {
    ...run,
    values: { ...values, shape, widthM, heightM },
    drafts: settledBySides.reduce(without, run.drafts),
  }
}

/** What two sides typed as a size leave nothing to mend in. */
const settledBySides: readonly FieldKey[] = ['size', 'shape', 'widthM', 'heightM']

/** Twelve digits, so that 600 mm is 0.6 m and not a hair less. */
const decimal = (text: string, unitM: number) => Number((Number(text) * unitM).toPrecision(12))

const width = fieldOf('widthM')
const sideRange = width.kind === 'number' ? width : { min: 0, max: 0 }

/** Values with one set, or taken away where it is undefined. */
export function withValue<K extends FieldKey>(
  values: RunValues,
  key: K,
  value: RunValues[K],
): RunValues {
  if (values[key] === value) return values
  const { [key]: _, ...rest } = values
  return value === undefined ? rest : { ...values, [key]: value }
}

export function without(drafts: Run['drafts'], key: FieldKey): Run['drafts'] {
  if (drafts[key] === undefined) return drafts
  const { [key]: _, ...rest } = drafts
  return rest
}

export function isSameRun(one: Run, other: Run): boolean {
  return isSameRecord(one.values, other.values) && isSameRecord(one.drafts, other.drafts)
}

function isSameRecord(one: object, other: object): boolean {
  if (one === other) return true
  const [before, after] = [Object.entries(one), new Map(Object.entries(other))]
  return (
    before.length === after.size && before.every(([key, value]) => Object.is(after.get(key), value))
  )
}
