/** The command `working`: the whole calculation of one run, line by line. */
import { sizeRun, workRun } from '#model/size-run.ts'
import { meetsLimits } from '#report/run-words.ts'
import { writeWorkingJson } from '#report/working-schema.ts'
import { writeWorkingText } from '#report/working-text.ts'
import type { WorkingRequest } from './arguments.ts'
import { deliver, type Outcome } from './deliver.ts'
import { type OpenList, openList } from './list.ts'

export async function working(request: WorkingRequest): Promise<Outcome> {
  const opened = await openList(request)
  if (!opened.ok) return { end: 'badInput', problems: opened.problems }
  const { runs, defaults, index } = opened.list
  const run = runs.find(({ values }) => values.tag === request.tag.trim())
  const worked = run && workRun(run.values, defaults, index)
  const outcome = run && sizeRun(run.values, defaults, index)
  if (!worked || !outcome?.ok) {
    return { end: 'badInput', problems: [`--tag: ${noSuchTag(request.tag, opened.list)}`] }
  }
  const json = (): string[] => [writeWorkingJson(worked)]
  const text = (): string[] => [writeWorkingText(worked)]
  const notWritten = await deliver(request, {
    forFile: { json, txt: text },
    json,
    terminal: text,
    summary: () => `the working of ${worked.title}.`,
  })
  if (notWritten) return { end: 'badInput', problems: [notWritten] }
  return { end: meetsLimits(outcome.result) ? 'done' : 'unmet', problems: [] }
}

/** More tags than these are not worth reading in one line. */
const MOST_TAGS = 12

function noSuchTag(tag: string, { runs }: OpenList): string {
  const tags = runs.map(({ values }) => values.tag ?? '')
  const more = tags.length - MOST_TAGS
  const list = tags.slice(0, MOST_TAGS).join(', ') + (more > 0 ? ` and ${more} more` : '')
  return `found ${JSON.stringify(tag)}, which no run has; allowed: ${list}`
}
