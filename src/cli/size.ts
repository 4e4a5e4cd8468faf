/** The command `size`: a list of runs in, sized runs out. Nothing is written unless every run can be read. */
import { cautions } from '#report/cautions.ts'
import { writeResultsCsv } from '#report/results-csv.ts'
import { countWords, writeRunTable } from '#report/run-table.ts'
import type { SizedRun } from '#report/run-words.ts'
import type { ListRequest } from './arguments.ts'
import { deliver, type Outcome } from './deliver.ts'
import { openList } from './list.ts'
import { SizedList } from './sized-list.ts'

export async function size(request: ListRequest): Promise<Outcome> {
  const opened = await openList(request)
  if (!opened.ok) return { end: 'badInput', problems: opened.problems }
  const list = new SizedList(opened.list)
  const { units } = request
  const notWritten = await deliver(request, {
    forFile: {
      json: () => jsonTexts(list),
      csv: () => writeResultsCsv(list),
      txt: () => [writeRunTable(list, { units, width: null })],
    },
    json: () => jsonTexts(list),
    terminal: () => [writeRunTable(list, { units, width: process.stdout.columns ?? null })],
    summary: () => countWords(list.size, [...list.failing], list.unjudged.size),
  })
  if (notWritten) return { end: 'badInput', problems: [notWritten] }
  return { end: list.failing.size === 0 ? 'done' : 'unmet', problems: [] }
}

/** One object, a run a line; in pieces, since a long list does not fit into one string. */
function* jsonTexts(runs: Iterable<SizedRun>): Iterable<string> {
  yield '{"runs":[\n'
  let between = ''
  for (const { result } of runs) {
    yield between + JSON.stringify(result)
    between = ',\n'
  }
  yield `\n],"cautions":${JSON.stringify(cautions)}}\n`
}
