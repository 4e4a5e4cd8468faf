/** The answer for people at a terminal: one line per run, what was assumed, and the cautions. */
import type { Rating } from '#sizing/result.ts'
import { inchName } from '#sizing/words.ts'
import { formatQuantity, formatWithUnit, thicknessDecimals, unitLabel } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'
import { restated } from '#units/restate.ts'
import { cautionLines, inParts, noteLines, tagList } from './closing-lines.ts'
import {
  governedBy,
  isJudged,
  meetsLimits,
  reasonWords,
  type SizedRun,
  sizeWords,
} from './run-words.ts'
import { type TextColumn, textTable } from './text-table.ts'

export interface TableOptions {
  readonly units: UnitSystem
  /** Columns of the terminal; null where the text is not for one. */
  readonly width: number | null
}

/** What a run contributes: small, since the results of a long list do not fit into memory. */
interface Line {
  readonly tag: string
  readonly meetsLimits: boolean
  readonly isJudged: boolean
  readonly size: string
  readonly thicknessM: number | null
  /** What an inch series calls the thickness; empty elsewhere. */
  readonly soldAs: string
  readonly loss: string
  readonly bare: string
  readonly surface: string
  readonly governedBy: string
  readonly reason: string
  readonly notes: readonly string[]
}

/** Table, count, notes and cautions as one text. */
export function writeRunTable(runs: Iterable<SizedRun>, options: TableOptions): string {
  const lines = Array.from(runs, (run) => lineOf(run, options.units))
  const failing = lines.filter((line) => !line.meetsLimits).map(({ tag }) => tag)
  const unjudged = lines.filter((line) => !line.isJudged).length
  return inParts([
    textTable(columnsOf(lines, options.units), options.width),
    [countWords(lines.length, failing, unjudged)],
    noteLines(lines),
    cautionLines(),
  ])
}

function lineOf({ values, result }: SizedRun, units: UnitSystem): Line {
  const { chosen, bare } = result
  return {
    tag: result.tag,
    meetsLimits: meetsLimits(result),
    isJudged: isJudged(result),
    size: sizeWords(values, units),
    thicknessM: chosen?.thicknessM ?? null,
    soldAs: typeof chosen?.nominalThicknessM === 'number' ? inchName(chosen.nominalThicknessM) : '',
    loss: lossWords(chosen, units),
    bare: lossWords(bare, units),
    surface: formatQuantity(chosen?.surfaceTempC, 'temperature', units),
    governedBy: governedBy(result),
    reason: reasonWords(result, units),
    notes: result.notes.map(({ text }) => (units === 'si' ? text : restated(text, units))),
  }
}

/** Loss per metre; a flat surface has none and carries its loss per area with the unit. */
function lossWords(rating: Rating | null, units: UnitSystem): string {
  return rating && rating.heatLossWPerM === null
    ? formatWithUnit(rating.heatFluxWPerM2, 'heatFlux', units)
    : formatQuantity(rating?.heatLossWPerM, 'heatLossPerLength', units)
}

function columnsOf(lines: readonly Line[], units: UnitSystem): readonly TextColumn[] {
  const lossUnit = unitLabel('heatLossPerLength', units)
  const thicknesses = lines.map(({ thicknessM }) => thicknessM)
  const decimals = thicknessDecimals(thicknesses, units)
  const lagging = thicknesses.map((thicknessM) =>
    formatQuantity(thicknessM, 'thickness', units, decimals),
  )
  const soldAs = lines.map((line) => line.soldAs)
  const words = (header: string, key: 'tag' | 'size' | 'governedBy' | 'reason'): TextColumn => ({
    header,
    align: 'left',
    cells: lines.map((line) => line[key]),
  })
  const numbers = (header: string, cells: readonly string[]): TextColumn => ({
    header,
    align: 'right',
    cells,
  })
  return [
    { ...words('Tag', 'tag'), maxWidth: 24 },
    { ...words('Size', 'size'), maxWidth: 18 },
    numbers(`Lagging ${unitLabel('thickness', units)}`, lagging),
    ...(soldAs.some((name) => name !== '') ? [numbers('Sold as', soldAs)] : []),
    numbers(
      `Loss ${lossUnit}`,
      lines.map(({ loss }) => loss),
    ),
    numbers(
      `Bare ${lossUnit}`,
      lines.map(({ bare }) => bare),
    ),
    numbers(
      `Surface, mean ${unitLabel('temperature', units)}`,
      lines.map(({ surface }) => surface),
    ),
    words('Governed by', 'governedBy'),
    words('Reason', 'reason'),
  ]
}

/** "43 runs, 40 within their limits, 2 with no limit judged. Not within: GL-322." */
export function countWords(runs: number, failing: readonly string[], unjudged: number): string {
  const total = `${runs} ${runs === 1 ? 'run' : 'runs'}`
  if (failing.length === 0 && unjudged === 0) return `${total}, all limits met.`
  const within = runs - failing.length - unjudged
  const open = unjudged === 0 ? '' : `, ${unjudged} with no limit judged`
  const not = failing.length === 0 ? '' : ` Not within: ${tagList(failing)}.`
  return `${total}, ${within} within their limits${open}.${not}`
}
