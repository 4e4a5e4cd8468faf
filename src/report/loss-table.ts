/** The losses of a list for people at a terminal: a line per run, the total under it, notes and cautions. */
import { type LossTotal, totalLoss } from '#model/loss-total.ts'
import type { UnitSystem } from '#units/quantities.ts'
import { restated } from '#units/restate.ts'
import { cautionLines, inParts, noteLines, tagList } from './closing-lines.ts'
import { lossColumns } from './loss-columns.ts'
import type { LossLine } from './loss-csv.ts'
import { textTable } from './text-table.ts'

/** As wide as it comes out: its last column is a figure, which is not to be cut. */
export function writeLossTable(lines: Iterable<LossLine>, units: UnitSystem): string {
  const all = [...lines]
  const losses = all.map(({ loss }) => loss)
  const said = losses.map(({ tag, notes }) => ({
    tag,
    notes: notes.map(({ text }) => (units === 'si' ? text : restated(text, units))),
  }))
  return inParts([
    textTable(lossColumns(all, units), null),
    [lossCountWords(totalLoss(losses))],
    noteLines(said),
    cautionLines(),
  ])
}

/** "41 runs in the total. Not in it, without a length: A-1. Heat without a cost, for want of a fuel: A-2." */
export function lossCountWords({ lost, gained, withoutLength, withoutFuel }: LossTotal): string {
  const runs = lost.runs + gained.runs
  const parts = [
    `${runs} ${runs === 1 ? 'run' : 'runs'} in the total, each whole with its fittings.`,
  ]
  if (withoutLength.length > 0)
    parts.push(`Not in it, without a length: ${tagList(withoutLength)}.`)
  if (withoutFuel.length > 0) {
    parts.push(`Without a cost, for want of a fuel: ${tagList(withoutFuel)}.`)
  }
  return parts.join(' ')
}
