/** The list of runs that a command works on, read and checked: nothing is done unless every run can be. */
import type { RunValues } from '#model/fields.ts'
import { type CatalogueIndex, indexCatalogue } from '#model/size-run.ts'
import type { ListRequest } from './arguments.ts'
import { openedCatalogue } from './catalogue.ts'
import { type InputRun, readInput, readJobDefaults } from './input.ts'
import { fullPath } from './place.ts'
import { allProblems } from './run-problems.ts'
import { whyNotWrite } from './write-file.ts'

export interface OpenList {
  readonly runs: readonly InputRun[]
  readonly defaults: RunValues
  readonly index: CatalogueIndex
}

export type Opened =
  | { readonly ok: true; readonly list: OpenList }
  | { readonly ok: false; readonly problems: readonly string[] }

export async function openList(request: ListRequest): Promise<Opened> {
  const input = await readInput(request.input)
  const job =
    request.job === null ? { ok: true as const, defaults: {} } : readJobDefaults(request.job)
  const out = outProblems(request)
  if (!input.ok || !job.ok) {
    const ofInput = input.ok ? input.problems.map(({ text }) => text) : input.problems
    return { ok: false, problems: [...out, ...ofInput, ...(job.ok ? [] : job.problems)] }
  }
  const index = indexCatalogue(openedCatalogue())
  const defaults = { ...job.defaults, ...input.defaults }
  const problems = [...out, ...allProblems(input, defaults, index)]
  return problems.length > 0
    ? { ok: false, problems }
    : { ok: true, list: { runs: input.runs, defaults, index } }
}

function outProblems({ out, input, force }: ListRequest): string[] {
  if (!out) return []
  const list = input === '-' ? null : fullPath(input)
  const why = whyNotWrite(fullPath(out.path), { force, input: list })
  return why === null ? [] : [`--out: ${why}`]
}
