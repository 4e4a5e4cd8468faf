/** The benchmark: its arguments, its figures, and how they are told. */
import { cpus, loadavg } from 'node:os'
import { parseArgs } from 'node:util'
import { ladderMsAllThreads, ladderMsOneThread } from './ladders.ts'
import { randomRuns, readRuns } from './runs.ts'
import { measureSolves, type SolveFigures, solvesOf } from './solves.ts'

export interface BenchFigures extends SolveFigures {
  readonly ladder10kOneThreadMs: number
  readonly ladder10kAllThreadsMs: number
}

/** The exit code: 0, or 2 where arguments or list are not as they should be. */
export async function bench(words: readonly string[]): Promise<0 | 2> {
  try {
    const { values } = parseArgs({
      args: [...words],
      options: { runs: { type: 'string' }, json: { type: 'boolean', default: false } },
    })
    const runs = values.runs === undefined ? randomRuns() : readRuns(values.runs)
    if (!values.json) tellMachine(values.runs ?? 'random pipes over the whole input range')
    const solves = measureSolves(solvesOf(runs))
    const figures: BenchFigures = {
      ...solves,
      ladder10kOneThreadMs: ladderMsOneThread(runs),
      ladder10kAllThreadsMs: await ladderMsAllThreads(runs),
    }
    console.log(values.json ? JSON.stringify(figures) : asText(figures))
    return 0
  } catch (error) {
    console.error(error instanceof Error ? error.message : String(error))
    return 2
  }
}

function tellMachine(what: string): void {
  const [cpu] = cpus()
  console.log(
    `${cpu?.model ?? 'unknown processor'}, ${cpus().length} cores, Node ${process.version}`,
  )
  console.log(`Load ${loadavg()[0]?.toFixed(1)} before the start; ${what}.\n`)
}

const words: Readonly<Record<keyof BenchFigures, string>> = {
  nsPerSolve: 'One solve, ns',
  solvesPerSecond: 'Solves a second, one thread',
  filmEvaluationsMedian: 'Film evaluations of a solve, median',
  filmEvaluationsMax: 'Film evaluations of a solve, most',
  ladder10kOneThreadMs: 'Ladders of 10 000 runs, one thread, ms',
  ladder10kAllThreadsMs: 'Ladders of 10 000 runs, all threads, ms',
}

function asText(figures: BenchFigures): string {
  return (Object.keys(words) as (keyof BenchFigures)[])
    .map((key) => {
      const value = Math.round(figures[key]).toLocaleString('en')
      return `${words[key].padEnd(45)}${value.padStart(12)}`
    })
    .join('\n')
}
