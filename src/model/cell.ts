/** One cell: from what a person wrote to the value of a field and back, for the CSV and the window alike. */
import { couldBeThousands, readDecimal, writeDecimal } from './decimal.ts'
import type { Field, NumberField } from './fields.ts'
import { quantities } from './quantities.ts'

export interface CellOptions {
  /** Whether a comma may part the decimals (a point always may). */
  readonly decimalComma: boolean
  /** The number is in the US unit of the field: in, ft or °F. */
  readonly twin?: boolean
  /** Marks that may part thousands in this file: a number that reads either way is refused, not guessed. */
  readonly doubtfulMarks?: readonly ('.' | ',')[]
}

/** No field takes more, however it is spaced; keeps a pasted novel away from the patterns. */
const longestCell = 4000

/** An empty cell has no value: `undefined`. */
export type CellValue = number | string | boolean | undefined

export type CellResult =
  | { readonly ok: true; readonly value: CellValue }
  | { readonly ok: false; readonly found: string; readonly allowed: string }

/** Reads one cell. Numbers come out in SI units, temperatures in °C. */
export function parseCell(field: Field, text: string, options: CellOptions): CellResult {
  const trimmed = text.trim()
  if (trimmed === '') return { ok: true, value: undefined }
  const value =
    trimmed.length > longestCell ? null : readers[field.kind](field as never, trimmed, options)
  if (value !== null) return { ok: true, value }
  return { ok: false, found: quote(trimmed), allowed: refusal(field, trimmed, options) }
}

/** The CSV form of a value, in the unit of the column; `parseCell` gives the same value back. */
export function formatCell(field: Field, value: CellValue): string {
  switch (typeof value) {
    case 'undefined':
      return ''
    case 'boolean':
      return value ? 'yes' : 'no'
    case 'string':
      return value
    case 'number':
      return writeDecimal(value, field.kind === 'number' ? -decimalShift(field) : 0)
  }
}

/** What a field takes, in words: "a number from 1 to 20000 mm". */
export function allowedIn(field: Field, twin = false): string {
  switch (field.kind) {
    case 'number':
      return `a ${field.whole ? 'whole ' : ''}number ${rangeIn(field, twin)}`
    case 'text':
      return `at most ${field.maxLength} characters, without control characters`
    case 'choice':
      return `one of ${field.choices.join(', ')}`
    case 'flag':
      return 'yes or no'
  }
}

/** What was found, short enough for one line and with nothing in it that a terminal would obey. */
export function quote(text: string): string {
  const long = text.length > 60
  const shown = [...text.slice(0, 60)].slice(0, long ? 40 : 60).join('')
  const plain = shown.replace(/[\p{Cc}\p{Cs}\p{Zl}\p{Zp}]/gu, unprintable)
  return long ? `"${plain}…" (${text.length} characters)` : `"${plain}"`
}

function unprintable(character: string): string {
  return `\\u${character.charCodeAt(0).toString(16).padStart(4, '0')}`
}

const readers: {
  readonly [K in Field['kind']]: (
    field: Extract<Field, { kind: K }>,
    text: string,
    options: CellOptions,
  ) => CellValue | null
} = {
  number: readNumber,
  text: ({ maxLength }, text) => {
    // Line breaks and tabs inside a quoted cell are layout, not content.
    const oneLine = text.replace(/\s+/g, ' ')
    return oneLine.length <= maxLength && !/[\p{Cc}\p{Cs}]/u.test(oneLine) ? oneLine : null
  },
  choice: ({ choices }, text) => {
    const wanted = choiceForm(text)
    return choices.find((choice) => choice === wanted) ?? null
  },
  flag: (_field, text) => flags.get(text.toLowerCase()) ?? null,
}

const flags: ReadonlyMap<string, boolean> = new Map([
  ['yes', true],
  ['true', true],
  ['1', true],
  ['no', false],
  ['false', false],
  ['0', false],
])

const choiceForm = (text: string): string => text.toLowerCase().replace(/[\s_]+/g, '-')

function readNumber(field: NumberField, text: string, options: CellOptions): number | null {
  const { decimalComma } = options
  if (isDoubtful(text, options)) return null
  const twin = options.twin ? twinOf(field) : undefined
  const typed = readDecimal(text, { decimalComma, shift: twin ? 0 : decimalShift(field) })
  if (typed === null) return null
  const value = twin ? twin.toSi(typed) : typed
  const fits = value >= field.min && value <= field.max
  return fits && (!field.whole || Number.isInteger(value)) ? value : null
}

function refusal(field: Field, text: string, options: CellOptions): string {
  const allowed = allowedIn(field, options.twin)
  if (field.kind === 'number' && isDoubtful(text, options)) {
    return `${allowed}, without a mark between the thousands`
  }
  return allowed
}

function isDoubtful(text: string, { doubtfulMarks = [] }: CellOptions): boolean {
  return doubtfulMarks.some((mark) => couldBeThousands(text, mark))
}

/** Power of ten between the unit of the column and SI. */
function decimalShift({ quantity }: NumberField): number {
  return Math.round(Math.log10(quantities[quantity].perUnit))
}

interface Twin {
  readonly unit: string
  readonly suffix: string
  readonly toSi: (value: number) => number
}

/** The US form of a field's column, where it has one. */
export function twinOf(field: NumberField): Twin | undefined {
  const form = quantities[field.quantity]
  return 'twin' in form ? form.twin : undefined
}

function rangeIn(field: NumberField, inTwin: boolean): string {
  const twin = inTwin ? twinOf(field) : undefined
  const ends = twin
    ? [insideTwin(twin, field.min, Math.ceil), insideTwin(twin, field.max, Math.floor)]
    : [formatCell(field, field.min), formatCell(field, field.max)]
  const unit = twin ? twin.unit : quantities[field.quantity].unit
  // Read by people, who write −200 with a minus; a cell takes a hyphen as well.
  const said = ends.map((end) => end.replace('-', '−'))
  return `from ${said.join(' to ')}${unit ? ` ${unit}` : ''}`
}

/** An end of the range in the US unit, rounded to the inside, so that what is named is accepted. */
function insideTwin(twin: Twin, si: number, round: (value: number) => number): string {
  // All twins are straight lines, so two points give the way back.
  const exact = (si - twin.toSi(0)) / (twin.toSi(1) - twin.toSi(0))
  const scale = 10 ** (5 - Math.floor(Math.log10(Math.abs(exact) || 1)))
  const value = round(Number((exact * scale).toPrecision(12))) / scale
  return writeDecimal(value)
}
