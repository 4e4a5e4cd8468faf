/** The command `size`: a list of runs in, sized runs out. Nothing is written unless every run can be read. */
import type { RunValues } from '#model/fields.ts'
import { indexCatalogue, sizeRun, withDefaults } from '#model/size-run.ts'
import { cautions } from '#report/cautions.ts'
import { writeResultsCsv } from '#report/results-csv.ts'
import { countWords, writeRunTable } from '#report/run-table.ts'
import { meetsLimits, type SizedRun } from '#report/run-words.ts'
import type { OutFormat, SizeRequest } from './arguments.ts'
import { openedCatalogue } from './catalogue.ts'
import { type Input, readInput, readJobDefaults } from './input.ts'
import { fullPath } from './place.ts'
import { print } from './print.ts'
import { whyNotWrite, writeWhole } from './write-file.ts'

export interface SizeOutcome {
  readonly end: 'done' | 'unmet' | 'badInput'
  /** For standard error, one a line. */
  readonly problems: readonly string[]
}

export async function size(request: SizeRequest): Promise<SizeOutcome> {
  const input = await readInput(request.input)
  const job =
    request.job === null ? { ok: true as const, defaults: {} } : readJobDefaults(request.job)
  const problems = [
    ...outProblems(request),
    ...(input.ok ? [] : input.problems),
    ...(job.ok ? [] : job.problems),
  ]
  if (!input.ok || !job.ok) return { end: 'badInput', problems }
  const sized = sizeAll(input, { ...job.defaults, ...input.defaults })
  const all = problems.concat(sized.problems)
  if (all.length > 0) return { end: 'badInput', problems: all }
  const notWritten = await deliver(sized.runs, request)
  if (notWritten) return { end: 'badInput', problems: [notWritten] }
  const allMet = sized.runs.every(({ result }) => meetsLimits(result))
  return { end: allMet ? 'done' : 'unmet', problems: [] }
}

function outProblems({ out, input, force }: SizeRequest): string[] {
  if (!out) return []
  const list = input === '-' ? null : fullPath(input)
  const why = whyNotWrite(fullPath(out.path), { force, input: list })
  return why === null ? [] : [`--out: ${why}`]
}

function sizeAll(input: Extract<Input, { ok: true }>, defaults: RunValues) {
  const index = indexCatalogue(openedCatalogue())
  const runs: SizedRun[] = []
  const problems: string[] = []
  for (const { values, problem } of input.runs) {
    const outcome = sizeRun(values, defaults, index)
    if (outcome.ok) runs.push({ values: withDefaults(values, defaults), result: outcome.result })
    else {
      for (const issue of outcome.issues) problems.push(problem(issue))
    }
  }
  return { runs, problems }
}

/** Prints and writes; gives back why the file could not be written. */
async function deliver(
  runs: readonly SizedRun[],
  { out, json, units }: SizeRequest,
): Promise<string | null> {
  if (out) {
    const options = { units, width: null }
    try {
      writeWhole(fullPath(out.path), writers[out.format](runs, options))
    } catch (error) {
      return `--out: ${out.path} cannot be written (${error instanceof Error ? error.message : error}); allowed: a place with room and the right to write`
    }
  }
  if (json) await print(jsonTexts(runs))
  else if (out) await print([`${out.path}: ${countWords(runs)}\n`])
  else await print([writeRunTable(runs, { units, width: process.stdout.columns ?? null })])
  return null
}

const writers: Readonly<
  Record<
    OutFormat,
    (runs: readonly SizedRun[], options: Parameters<typeof writeRunTable>[1]) => Iterable<string>
  >
> = {
  json: jsonTexts,
  csv: (runs) => [writeResultsCsv(runs)],
  txt: (runs, options) => [writeRunTable(runs, options)],
}

/** One object, a run a line; in pieces, since a long list does not fit into one string. */
function* jsonTexts(runs: readonly SizedRun[]): Iterable<string> {
  yield '{"runs":[\n'
  for (const [index, { result }] of runs.entries()) {
    yield `${index > 0 ? ',\n' : ''}${JSON.stringify(result)}`
  }
  yield `\n],"cautions":${JSON.stringify(cautions)}}\n`
}
