/** The command `loss`: what every run of a list loses in a year, bare and as built, and what they lose together. */
import { totalLoss } from '#model/loss-total.ts'
import { lossOfRun, type RunLoss } from '#model/run-loss.ts'
import { cautions } from '#report/cautions.ts'
import { type LossLine, writeLossCsv } from '#report/loss-csv.ts'
import { lossCountWords, writeLossTable } from '#report/loss-table.ts'
import type { ListRequest } from './arguments.ts'
import { deliver, type Outcome } from './deliver.ts'
import { type OpenList, openList } from './list.ts'
import { SizedList } from './sized-list.ts'

/** Whether limits are met is not this command's question. */
export async function loss(request: ListRequest): Promise<Outcome> {
  const opened = await openList(request)
  if (!opened.ok) return { end: 'badInput', problems: opened.problems }
  const lines = lossLines(opened.list)
  const { units } = request
  const notWritten = await deliver(request, {
    forFile: {
      json: () => jsonTexts(lines),
      csv: () => writeLossCsv(lines),
      txt: () => [writeLossTable(lines, units)],
    },
    json: () => jsonTexts(lines),
    terminal: () => [writeLossTable(lines, units)],
    summary: () => lossCountWords(totalLoss(lines.map((line) => line.loss))),
  })
  if (notWritten) return { end: 'badInput', problems: [notWritten] }
  return { end: 'done', problems: [] }
}

/** What a run loses is small: unlike whole results, that of a long list fits into memory. */
function lossLines(list: OpenList): readonly LossLine[] {
  return Array.from(new SizedList(list), ({ values, result }) => ({
    values,
    loss: lossOfRun(values, result, list.index),
  }))
}

/** One object, a run a line. */
function* jsonTexts(lines: readonly LossLine[]): Iterable<string> {
  const losses: readonly RunLoss[] = lines.map((line) => line.loss)
  yield '{"runs":[\n'
  for (const [at, own] of losses.entries()) yield (at === 0 ? '' : ',\n') + JSON.stringify(own)
  yield `\n],"total":${JSON.stringify(totalLoss(losses))},"cautions":${JSON.stringify(cautions)}}\n`
}
