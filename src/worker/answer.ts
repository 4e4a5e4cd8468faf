/** What the worker does with a message; pure, so that it is tested without a worker. */
import type { RunValues } from '#model/fields.ts'
import { briefOf } from '#model/run-brief.ts'
import { type CatalogueIndex, detailRun, indexCatalogue, sizeRun } from '#model/size-run.ts'
import type { RunDetail, RunOutcome } from '#sizing/result.ts'
import type { Answer, Request, Sheet } from './protocol.ts'

/** An answering machine with its own memory of the catalogue. */
export function answerer(): (request: Request) => Answer | null {
  let index: CatalogueIndex | null = null
  return (request) => {
    if (request.kind === 'catalogue') {
      index = indexCatalogue(request.catalogue)
      return null
    }
    return index && answer(request, index)
  }
}

export function answer(
  request: Exclude<Request, { kind: 'catalogue' }>,
  index: CatalogueIndex,
): Answer {
  const { ticket, defaults } = request
  switch (request.kind) {
    case 'size': {
      const briefs = request.runs.map(
        ({ id, values }) => [id, briefOf(safely(values, defaults, index))] as const,
      )
      return { kind: 'sized', ticket, briefs }
    }
    case 'sheet':
      return { kind: 'sheet', ticket, sheet: sheetOf(request.values, defaults, index) }
  }
}

function sheetOf(values: RunValues, defaults: RunValues, index: CatalogueIndex): Sheet {
  const outcome = safely(values, defaults, index)
  return { outcome, detail: outcome.ok ? detailOf(values, defaults, index) : null }
}

/** A bug in what is shown besides must not cost the answer, nor the worker. */
function detailOf(values: RunValues, defaults: RunValues, index: CatalogueIndex): RunDetail | null {
  try {
    return detailRun(values, defaults, index)
  } catch {
    return null
  }
}

/** One run that trips a bug must not take the other ten thousand with it. */
function safely(values: RunValues, defaults: RunValues, index: CatalogueIndex): RunOutcome {
  try {
    return sizeRun(values, defaults, index)
  } catch (error) {
    return {
      ok: false,
      issues: [stoppedIssue(error instanceof Error ? error.message : String(error))],
    }
  }
}

/** What stands where an answer should be when the calculation itself gave up. */
export function stoppedIssue(why: string) {
  return {
    column: 'tag',
    found: `the calculation stopped (${why.slice(0, 200)})`,
    allowed: 'other values of this run; please report this run, it should not happen',
  }
}
