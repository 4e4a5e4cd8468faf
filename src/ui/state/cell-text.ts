/** What a cell shows and how typed text is read, in the units the window shows. */
import { type CellResult, formatCell, parseCell, quote } from '#model/cell.ts'
import type { CellReader } from '#model/cell-edit.ts'
import { columnReader } from '#model/cell-edit.ts'
import { readDecimal, writeDecimal } from '#model/decimal.ts'
import {
  type Field,
  type FieldKey,
  fieldOf,
  type NumberField,
  type RunValues,
} from '#model/fields.ts'
import { quantities } from '#model/quantities.ts'
import { formatNumber } from '#units/format.ts'
import { displayUnit, type UnitSystem } from '#units/quantities.ts'

/** The unit of a field as shown: that of its column in SI, the customary one in US. */
export function unitOf(field: Field, system: UnitSystem): string {
  if (field.kind !== 'number') return ''
  return system === 'si'
    ? quantities[field.quantity].unit
    : displayUnit(field.quantity, system).label
}

/** The text one edits: all digits, no grouping. */
export function editText(key: FieldKey, value: RunValues[FieldKey], system: UnitSystem): string {
  const field = fieldOf(key)
  if (typeof value !== 'number' || field.kind !== 'number' || system === 'si')
    return formatCell(field, value)
  return writeDecimal(Number(shownIn(field, value, system).toPrecision(10)))
}

/** The text one reads: fixed decimals where given, words for choices and flags. */
export function readText(
  key: FieldKey,
  value: RunValues[FieldKey],
  system: UnitSystem,
  decimals?: number,
): string {
  const field = fieldOf(key)
  if (typeof value !== 'number' || field.kind !== 'number') {
    const text = formatCell(field, value)
    return field.kind === 'choice' ? wordsFor(text) : text
  }
  const shown = shownIn(field, value, system)
  return formatNumber(shown, decimals ?? decimalsOf([value], key, system))
}

/** Enough decimals for every value of a column, at most three. */
export function decimalsOf(
  values: readonly number[],
  key: FieldKey,
  system: UnitSystem,
  least = 0,
): number {
  const field = fieldOf(key)
  if (field.kind !== 'number') return 0
  let decimals = least
  for (const value of values) {
    const shown = shownIn(field, value, system)
    while (
      decimals < 3 &&
      Math.abs(shown * 10 ** decimals - Math.round(shown * 10 ** decimals)) > 1e-6
    )
      decimals++
    if (decimals === 3) break
  }
  return system === 'us'
    ? Math.min(decimals, Math.max(least, displayUnit(field.quantity, system).decimals))
    : decimals
}

/** Reads typed text in the shown units. */
export function readerFor(system: UnitSystem): CellReader {
  return system === 'si' ? columnReader : customaryReader
}

const customaryReader: CellReader = { read: readCustomary, sideM: 0.0254 }

function readCustomary(key: FieldKey, text: string): CellResult {
  const field = fieldOf(key)
  if (field.kind !== 'number') return columnReader.read(key, text)
  if (text.trim() === '') return { ok: true, value: undefined }
  const typed = readDecimal(text, { decimalComma: true })
  // Back through the column's own reading, which judges the range.
  const { size, zero } = displayUnit(field.quantity, 'us')
  const value = typed === null ? null : Number(((typed - zero) * size).toPrecision(12))
  const read =
    value === null ? null : parseCell(field, formatCell(field, value), { decimalComma: false })
  if (read?.ok) return read
  return { ok: false, found: quote(text.trim()), allowed: allowedShown(field, 'us') }
}

/** What may be typed into a number field, in the shown unit. */
export function allowedShown(field: NumberField, system: UnitSystem): string {
  const ends = [field.min, field.max].map((end) =>
    formatNumber(...rounded(shownIn(field, end, system))),
  )
  const unit = unitOf(field, system)
  return `a ${field.whole ? 'whole ' : ''}number from ${ends.join(' to ')}${unit && ` ${unit}`}`
}

function rounded(value: number): [number, number] {
  const decimals = Math.abs(value) >= 100 || Number.isInteger(value) ? 0 : 3
  return [value, decimals]
}

function shownIn(field: NumberField, value: number, system: UnitSystem): number {
  if (system === 'si') return value / quantities[field.quantity].perUnit
  const { size, zero } = displayUnit(field.quantity, 'us')
  return value / size + zero
}

/** `rect-duct` as people say it. */
export function wordsFor(choice: string): string {
  return words.get(choice) ?? choice
}

const words: ReadonlyMap<string, string> = new Map([
  ['round-duct', 'round duct'],
  ['rect-duct', 'rectangular duct'],
  ['flat', 'flat surface'],
  ['up', 'facing up'],
  ['down', 'facing down'],
  ['smooth-metal', 'smooth metal'],
  ['coated-metal', 'coated metal'],
  ['ceramic-glass-stone', 'ceramic, glass, stone'],
])
