import { z } from 'zod'
import { faultOf } from '../published/report.ts'
import { judged, notRun, type Outcome } from './outcome.ts'
import { runTool, withReport } from './tool.ts'

const tool = { package: 'vitest' }

const reportSchema = z.object({
  numPassedTests: z.int(),
  numFailedTests: z.int(),
  numPendingTests: z.int(),
  numTodoTests: z.int(),
})

/** `whyNoBrowser`: why there is no Chromium, or null where there is one. */
export async function runVitest(whyNoBrowser: string | null, outcomes: Outcome[]): Promise<void> {
  const { outcome, report } = await runProject('node')
  outcomes.push(outcome, await judgePublished(report))
  if (whyNoBrowser === null) outcomes.push((await runProject('browser')).outcome)
  else {
    const why = `${whyNoBrowser}; a test over a table counts once`
    outcomes.push(notRun('vitest browser', await countBrowserTests(), why))
  }
}

/** Whether the committed table of printed figures is what the tests just found. */
async function judgePublished(report: unknown): Promise<Outcome> {
  const fault = await faultOf(report)
  if (fault !== null) console.error(`\n${fault}`)
  const [passed, failed] = fault === null ? [1, 0] : [0, 1]
  return { name: 'printed figures', passed, failed, notRun: 0 }
}

async function runProject(
  project: 'node' | 'browser',
): Promise<{ outcome: Outcome; report: unknown }> {
  console.log(`\n== vitest ${project}`)
  const { exitCode, report } = await withReport((file) =>
    runTool(tool, [
      'run',
      `--project=${project}`,
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${file}`,
    ]),
  )
  const counts = reportSchema.safeParse(report).data
  const outcome = judged(
    `vitest ${project}`,
    exitCode,
    counts
      ? {
          passed: counts.numPassedTests,
          failed: counts.numFailedTests,
          skipped: counts.numPendingTests + counts.numTodoTests,
        }
      : null,
  )
  return { outcome, report }
}

/** By Vitest's own listing, which reads the files without running them. */
async function countBrowserTests(): Promise<number> {
  const { report } = await withReport((file) =>
    runTool(tool, ['list', '--project=browser', '--static-parse', `--json=${file}`], {
      isShown: false,
    }),
  )
  return z.array(z.unknown()).safeParse(report).data?.length ?? 0
}
