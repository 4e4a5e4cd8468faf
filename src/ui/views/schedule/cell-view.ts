/** What one cell of the schedule says. */
import type { CellReader } from '#model/cell-edit.ts'
import { type FieldKey, fieldOf, type RunValues } from '#model/fields.ts'
import type { Run } from '#model/job.ts'
import type { RunBrief } from '#model/run-brief.ts'
import { governingWords } from '#report/run-words.ts'
import type { Issue } from '#sizing/result.ts'
import type { CatalogueWords } from '#ui/state/catalogue-words.ts'
import { editText, readText } from '#ui/state/cell-text.ts'
import { ABSENT, formatQuantity } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'
import type { Column } from './columns.ts'
import { issueSentence, shownIssues } from './issue-words.ts'

export interface CellView {
  readonly text: string
  /** What is wrong with what stands here. */
  readonly problem: string | null
  /** Given by the job's defaults, not by the run. */
  readonly isInherited: boolean
}

export interface Showing {
  readonly units: UnitSystem
  readonly words: CatalogueWords
  readonly defaults: RunValues
  readonly reader: CellReader
  /** Decimals of number columns, the same all the way down. */
  readonly decimals: ReadonlyMap<string, number>
}

export function cellView(
  run: Run,
  brief: RunBrief | undefined,
  column: Column,
  showing: Showing,
): CellView {
  const { key } = column
  const draft = key ? run.drafts[key] : undefined
  const problem = key ? problemOf(run, key, brief, showing.reader) : null
  if (draft !== undefined)
    return { text: draft, problem: problem ?? 'not a value of this column', isInherited: false }
  if (column.result)
    return { text: resultText(run, brief, column, showing), problem, isInherited: false }
  if (!key) return { text: '', problem, isInherited: false }
  const own = run.values[key]
  const value = own ?? showing.defaults[key]
  const text =
    value === undefined
      ? composed(run, brief, key, showing)
      : shownText(key, value, column, showing)
  return { text, problem, isInherited: own === undefined && value !== undefined }
}

function shownText(
  key: NonNullable<Column['key']>,
  value: RunValues[typeof key],
  column: Column,
  showing: Showing,
) {
  if (typeof value === 'string' && showing.words.isListed(key))
    return showing.words.nameOf(key, value)
  return readText(key, value, showing.units, showing.decimals.get(column.id))
}

/** What follows from other values of the run. */
function composed(run: Run, brief: RunBrief | undefined, key: FieldKey, showing: Showing): string {
  if (key !== 'mediumC') return composedSize(run, key, showing.units)
  return readText(key, mediumOf(run, brief), showing.units, showing.decimals.get(key))
}

/** The temperature of the medium; of steam given by its pressure, as it was found. */
export function mediumOf(run: Run, brief: RunBrief | undefined): number | undefined {
  if (run.values.mediumC !== undefined) return run.values.mediumC
  const isSteam = run.values.pressureGaugePa !== undefined
  return isSteam && brief?.ok ? (brief.insideTempC ?? undefined) : undefined
}

/** A run without a size in words still has one in numbers. */
function composedSize(run: Run, key: string, units: UnitSystem): string {
  if (key !== 'size') return ''
  const { shape, widthM, heightM, outerDiameterM } = run.values
  const decimals = units === 'us' ? 1 : undefined
  if (
    (shape === 'rect-duct' || shape === 'flat') &&
    widthM !== undefined &&
    heightM !== undefined
  ) {
    return `${readText('widthM', widthM, units, decimals)} × ${readText('heightM', heightM, units, decimals)}`
  }
  return outerDiameterM === undefined
    ? ''
    : `Ø ${readText('outerDiameterM', outerDiameterM, units)}`
}

function resultText(
  run: Run,
  brief: RunBrief | undefined,
  column: Column,
  { units }: Showing,
): string {
  if (!brief) return column.result === 'governed' ? '…' : ''
  if (!brief.ok) return column.result === 'governed' ? unsizedWord(run, brief.issues) : ''
  switch (column.result) {
    case 'lagging':
      return brief.thicknessM === 0
        ? ABSENT
        : formatQuantity(brief.nominalThicknessM ?? brief.thicknessM, 'thickness', units)
    case 'loss':
      return formatQuantity(brief.heatLossWPerM, 'heatLossPerLength', units)
    case 'surface':
      return formatQuantity(brief.surfaceTempC, 'temperature', units)
    default:
      return governingWords[brief.governing]
  }
}

function unsizedWord(run: Run, issues: readonly Issue[]): string {
  const isMissing = issues.length > 0 && issues.every(({ column }) => isEmpty(run, column))
  return isMissing ? 'To fill in' : 'Check'
}

function isEmpty({ values, drafts }: Run, column: string): boolean {
  const written = [...Object.keys(values), ...Object.keys(drafts)]
  return !written.some((key) => fieldOf(key as keyof RunValues).column === column)
}

function problemOf(
  run: Run,
  key: FieldKey,
  brief: RunBrief | undefined,
  reader: CellReader,
): string | null {
  if (!brief || brief.ok) return null
  const { column } = fieldOf(key)
  const issue = shownIssues(run, brief.issues, reader).find((one) => one.column === column)
  return issue ? issueSentence(issue) : null
}

/** Text for the clipboard: what can be pasted back, and results as plain numbers. */
export function copyText(
  run: Run,
  brief: RunBrief | undefined,
  column: Column,
  showing: Showing,
): string {
  const { key, result } = column
  if (result) return plain(resultText(run, brief, column, showing))
  if (!key) return ''
  const draft = run.drafts[key]
  if (draft !== undefined) return draft
  const value = run.values[key]
  if (value === undefined) return plain(composedSize(run, key, showing.units))
  if (typeof value === 'string' && showing.words.isListed(key))
    return showing.words.nameOf(key, value)
  return editText(key, value, showing.units)
}

const plain = (text: string) =>
  text
    .replaceAll('\u202f', '')
    .replaceAll('\u2212', '-')
    .replace(/^[–…]$/, '')
