/** The answer for people at a terminal: one line per run, what was assumed, and the cautions. */
import { formatQuantity, formatWithUnit, thicknessDecimals, unitLabel } from '#units/format.ts'
import type { QuantityName, UnitSystem } from '#units/quantities.ts'
import { cautions } from './cautions.ts'
import { governedBy, meetsLimits, reasonWords, type SizedRun, sizeWords } from './run-words.ts'
import { type TextColumn, textTable } from './text-table.ts'

export interface TableOptions {
  readonly units: UnitSystem
  /** Columns of the terminal; null where the text is not for one. */
  readonly width: number | null
}

/** Table, count, notes and cautions as one text. */
export function writeRunTable(runs: readonly SizedRun[], options: TableOptions): string {
  const parts = [
    textTable(columnsOf(runs, options.units), options.width),
    [countWords(runs)],
    noteLines(runs),
    ['Cautions', ...cautions.map(({ text, deferTo }) => `- ${text} In doubt: ${deferTo}.`)],
  ]
  return `${parts
    .filter((lines) => lines.length > 0)
    .map((lines) => lines.join('\n'))
    .join('\n\n')}\n`
}

function columnsOf(runs: readonly SizedRun[], units: UnitSystem): readonly TextColumn[] {
  const number = (
    header: string,
    quantity: QuantityName,
    pick: (run: SizedRun) => number | null,
  ) => ({
    header: `${header} ${unitLabel(quantity, units)}`,
    align: 'right' as const,
    cells: runs.map((run) => formatQuantity(pick(run), quantity, units)),
  })
  const words = (header: string, maxWidth: number, wordsOf: (run: SizedRun) => string) => ({
    header,
    align: 'left' as const,
    maxWidth,
    cells: runs.map(wordsOf),
  })
  return [
    words('Tag', 24, ({ result }) => result.tag),
    words('Size', 18, ({ values }) => sizeWords(values, units)),
    lagging(runs, units),
    loss('Loss', runs, units, ({ result }) => result.chosen),
    loss('Bare', runs, units, ({ result }) => result.bare),
    number('Surface', 'temperature', ({ result }) => result.chosen?.surfaceTempC ?? null),
    words('Governed by', 14, ({ result }) => governedBy(result)),
    words('Reason', Number.POSITIVE_INFINITY, ({ result }) => reasonWords(result, units)),
  ]
}

function lagging(runs: readonly SizedRun[], units: UnitSystem): TextColumn {
  const thicknesses = runs.map(({ result }) => result.chosen?.thicknessM)
  const decimals = thicknessDecimals(thicknesses, units)
  return {
    header: `Lagging ${unitLabel('thickness', units)}`,
    align: 'right',
    cells: thicknesses.map((thicknessM) =>
      formatQuantity(thicknessM, 'thickness', units, decimals),
    ),
  }
}

/** Loss per metre; a flat surface has none and carries its loss per area with the unit. */
function loss(
  header: string,
  runs: readonly SizedRun[],
  units: UnitSystem,
  ratingOf: (run: SizedRun) => SizedRun['result']['chosen'],
): TextColumn {
  const cells = runs.map((run) => {
    const rating = ratingOf(run)
    return rating && rating.heatLossWPerM === null
      ? formatWithUnit(rating.heatFluxWPerM2, 'heatFlux', units)
      : formatQuantity(rating?.heatLossWPerM, 'heatLossPerLength', units)
  })
  return { header: `${header} ${unitLabel('heatLossPerLength', units)}`, align: 'right', cells }
}

/** "42 runs. 41 meet their limits; not so: GL-322." */
export function countWords(runs: readonly SizedRun[]): string {
  const failing = runs.filter(({ result }) => !meetsLimits(result)).map(({ result }) => result.tag)
  const total = `${runs.length} ${runs.length === 1 ? 'run' : 'runs'}`
  if (failing.length === 0) return `${total}. All limits are met.`
  return `${total}. ${runs.length - failing.length} meet their limits; not so: ${tagList(failing)}.`
}

function noteLines(runs: readonly SizedRun[]): readonly string[] {
  const tagsOf = new Map<string, string[]>()
  for (const { result } of runs) {
    for (const { text } of result.notes) {
      const tags = tagsOf.get(text)
      if (tags) tags.push(result.tag)
      else tagsOf.set(text, [result.tag])
    }
  }
  if (tagsOf.size === 0) return []
  const lines = [...tagsOf].map(
    ([text, tags]) => `- ${text} (${tags.length === runs.length ? 'all runs' : tagList(tags)})`,
  )
  return ['Notes', ...lines]
}

function tagList(tags: readonly string[]): string {
  const most = 8
  const more = tags.length - most
  return more > 0 ? `${tags.slice(0, most).join(', ')} and ${more} more` : tags.join(', ')
}
