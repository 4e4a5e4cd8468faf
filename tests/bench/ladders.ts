/** What the ladders of 10 000 runs cost: looked up, solved on 12 rungs, judged, priced, chosen, with their reasons. */
import { availableParallelism } from 'node:os'
import { Worker } from 'node:worker_threads'
import type { RunValues } from '#model/fields.ts'
import type { CatalogueIndex } from '#model/resolve/index-catalogue.ts'
import type { Problem, Step } from '#sizing/problem.ts'
import { size } from '#sizing/size.ts'
import { problemOf, shippedCatalogue } from './runs.ts'

const RUNS = 10_000
const RUNGS = 12
const ROUNDS = 3

/** The given runs over and over, up to as many as are asked for. */
const repeated = (runs: readonly RunValues[], count: number): RunValues[] =>
  Array.from({ length: count }, (_, n) => runs[n % runs.length] ?? {})

/** Milliseconds of one thread, the best of three rounds. */
export function ladderMsOneThread(runs: readonly RunValues[]): number {
  const index = shippedCatalogue()
  const all = repeated(runs, RUNS)
  sizeLadders(all.slice(0, RUNS / 10), index)
  return Math.min(
    ...Array.from({ length: ROUNDS }, () => {
      const start = performance.now()
      sizeLadders(all, index)
      return performance.now() - start
    }),
  )
}

export function sizeLadders(runs: readonly RunValues[], index: CatalogueIndex): void {
  for (const values of runs) {
    const problem = asLadder(problemOf(values, index))
    const { ladder } = size(problem)
    // A bare run has no ladder.
    if (problem.layers.length > 0 && ladder.length !== RUNGS)
      throw new Error(`${values.tag} has ${ladder.length} rungs`)
  }
}

/** The same run on twelve rungs, judged by loss, touch and damp, weighed with money where it is, without months. */
function asLadder(problem: Problem): Problem {
  const { layers, limits, conditions } = problem
  const sized = Math.max(
    layers.findIndex(({ thicknessM }) => thicknessM === null),
    0,
  )
  return {
    ...problem,
    layers: layers.map((layer, index) =>
      index === sized ? { ...layer, thicknessM: null } : layer,
    ),
    steps: twelve(problem.steps),
    conditions: { ...conditions, months: [], frost: null, survey: null },
    survey: null,
    limits: { ...limits, frost: null, arrival: null, code: null, maxOuterDiameterM: null },
  }
}

/** The first twelve; a shorter ladder goes on by 20 mm. */
function twelve(steps: readonly Step[]): Step[] {
  const found = steps.slice(0, RUNGS)
  while (found.length < RUNGS) {
    const thicknessM = (found.at(-1)?.thicknessM ?? 0) + 0.02
    found.push({ thicknessM, nominalThicknessM: null, piecesM: [thicknessM] })
  }
  return found
}

/** Milliseconds with a thread for each core, the best of three rounds; the threads are started and warm before. */
export async function ladderMsAllThreads(runs: readonly RunValues[]): Promise<number> {
  const threads = availableParallelism()
  const share = Math.ceil(RUNS / threads)
  const all = repeated(runs, RUNS)
  const workers = Array.from({ length: threads }, (_, n) => {
    const workerData = all.slice(n * share, (n + 1) * share)
    return new Worker(new URL('./ladder-worker.ts', import.meta.url), { workerData })
  })
  try {
    await Promise.all(workers.map(answer))
    let bestMs = Number.POSITIVE_INFINITY
    for (let round = 0; round < ROUNDS; round += 1) {
      const start = performance.now()
      const answers = workers.map(answer)
      for (const worker of workers) worker.postMessage('again')
      await Promise.all(answers)
      bestMs = Math.min(bestMs, performance.now() - start)
    }
    return bestMs
  } finally {
    await Promise.all(workers.map((worker) => worker.terminate()))
  }
}

const answer = (worker: Worker): Promise<void> =>
  new Promise((done, fail) => {
    worker.once('message', () => done())
    worker.once('error', fail)
  })
