/** What one cell of the schedule says. */
import type { CellReader } from '#model/cell-edit.ts'
import { type FieldKey, fieldOf, type RunValues } from '#model/fields.ts'
import type { Run } from '#model/job.ts'
import { isMissing, type RunBrief, type SizedBrief } from '#model/run-brief.ts'
import { governingWords } from '#report/run-words.ts'
import type { Issue } from '#sizing/result.ts'
import type { CatalogueWords } from '#ui/state/catalogue-words.ts'
import { editText, readText } from '#ui/state/cell-text.ts'
import { ABSENT, formatQuantity, formatWithUnit, thicknessDecimals } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'
import type { Column } from './columns.ts'
import { issueSentence, shownIssues } from './issue-words.ts'

export interface CellView {
  readonly text: string
  /** What is wrong with what stands here. */
  readonly problem: string | null
  /** Nothing stands here where something should. */
  readonly isMissing: boolean
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
  const issue = key ? issueOf(run, key, brief, showing.reader) : undefined
  const view = {
    problem: issue ? issueSentence(issue) : null,
    isMissing: issue !== undefined && isMissing(issue),
    isInherited: false,
  }
  if (draft !== undefined) return { ...view, text: draft }
  if (column.result) return { ...view, text: resultText(brief, column, showing) }
  if (!key) return { ...view, text: '' }
  const own = run.values[key]
  const value = own ?? showing.defaults[key]
  const text =
    value === undefined
      ? composed(run, brief, key, showing)
      : shownText(key, value, column, showing)
  return { ...view, text, isInherited: own === undefined && value !== undefined }
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
  // Spheres are counted, not measured out.
  if (key === 'lengthM') return run.values.shape === 'sphere' ? 'each' : ''
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

/** Loss with its unit, for a metre, a square metre or the whole of a piece. */
export function lossText(brief: SizedBrief, units: UnitSystem): string {
  if (brief.heatLossWPerM !== null)
    return formatWithUnit(brief.heatLossWPerM, 'heatLossPerLength', units)
  if (!brief.isPiece) return formatWithUnit(brief.heatFluxWPerM2, 'heatFlux', units, 0)
  const isLarge = units === 'us' || Math.abs(brief.laggedLossW ?? 0) >= 1000
  return formatWithUnit(brief.laggedLossW, isLarge ? 'plantPower' : 'power', units)
}

function resultText(brief: RunBrief | undefined, column: Column, { units }: Showing): string {
  if (!brief) return column.result === 'governed' ? '…' : ''
  if (!brief.ok) return column.result === 'governed' ? unsizedWord(brief.issues) : ''
  switch (column.result) {
    case 'lagging':
      return brief.thicknessM === 0
        ? ABSENT
        : formatQuantity(
            brief.thicknessM,
            'thickness',
            units,
            thicknessDecimals([brief.thicknessM], units),
          )
    case 'loss':
      // In the unit of the column the number alone; what has another says so.
      return brief.heatLossWPerM === null
        ? lossText(brief, units)
        : formatQuantity(brief.heatLossWPerM, 'heatLossPerLength', units)
    case 'surface':
      return formatQuantity(brief.surfaceTempC, 'temperature', units)
    default:
      return governingWords[brief.governing]
  }
}

/** A run that is only not finished is no mistake yet. */
function unsizedWord(issues: readonly Issue[]): string {
  return issues.every(isMissing) ? 'To fill in' : 'Check'
}

function issueOf(
  run: Run,
  key: FieldKey,
  brief: RunBrief | undefined,
  reader: CellReader,
): Issue | undefined {
  if (!brief || brief.ok) return undefined
  const { column } = fieldOf(key)
  return shownIssues(run, brief.issues, reader).find((one) => one.column === column)
}

/** Text for the clipboard: what can be pasted back, and results as plain numbers. */
export function copyText(
  run: Run,
  brief: RunBrief | undefined,
  column: Column,
  showing: Showing,
): string {
  const { key, result } = column
  if (result) return plain(resultText(brief, column, showing))
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
