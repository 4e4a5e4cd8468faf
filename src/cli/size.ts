/** The command `size`: a list of runs in, sized runs out. Nothing is written unless every run can be read. */
import { indexCatalogue } from '#model/size-run.ts'
import { cautions } from '#report/cautions.ts'
import { writeResultsCsv } from '#report/results-csv.ts'
import { countWords, writeRunTable } from '#report/run-table.ts'
import type { SizedRun } from '#report/run-words.ts'
import type { OutFormat, SizeRequest } from './arguments.ts'
import { openedCatalogue } from './catalogue.ts'
import { readInput, readJobDefaults } from './input.ts'
import { fullPath } from './place.ts'
import { print } from './print.ts'
import { allProblems } from './run-problems.ts'
import { SizedList } from './sized-list.ts'
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
  const out = outProblems(request)
  if (!input.ok || !job.ok) {
    const ofInput = input.ok ? input.problems.map(({ text }) => text) : input.problems
    return { end: 'badInput', problems: [...out, ...ofInput, ...(job.ok ? [] : job.problems)] }
  }
  const index = indexCatalogue(openedCatalogue())
  const defaults = { ...job.defaults, ...input.defaults }
  const problems = [...out, ...allProblems(input, defaults, index)]
  if (problems.length > 0) return { end: 'badInput', problems }
  const list = new SizedList(input.runs, defaults, index)
  const notWritten = await deliver(list, request)
  if (notWritten) return { end: 'badInput', problems: [notWritten] }
  return { end: list.failing.size === 0 ? 'done' : 'unmet', problems: [] }
}

function outProblems({ out, input, force }: SizeRequest): string[] {
  if (!out) return []
  const list = input === '-' ? null : fullPath(input)
  const why = whyNotWrite(fullPath(out.path), { force, input: list })
  return why === null ? [] : [`--out: ${why}`]
}

/** Prints and writes; gives back why the file could not be written. */
async function deliver(runs: SizedList, { out, json, units }: SizeRequest): Promise<string | null> {
  if (out) {
    const options = { units, width: null }
    try {
      writeWhole(fullPath(out.path), writers[out.format](runs, options))
    } catch (error) {
      if (!(error instanceof Error && 'syscall' in error)) throw error
      return `--out: ${out.path} cannot be written (${error.message}); allowed: a place with room and the right to write`
    }
  }
  if (json) await print(jsonTexts(runs))
  else if (out) {
    const { size, failing, unjudged } = runs
    await print([`${out.path}: ${countWords(size, [...failing], unjudged.size)}\n`])
  } else await print([writeRunTable(runs, { units, width: process.stdout.columns ?? null })])
  return null
}

const writers: Readonly<
  Record<
    OutFormat,
    (runs: Iterable<SizedRun>, options: Parameters<typeof writeRunTable>[1]) => Iterable<string>
  >
> = {
  json: jsonTexts,
  csv: writeResultsCsv,
  txt: (runs, options) => [writeRunTable(runs, options)],
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
