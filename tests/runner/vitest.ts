import { z } from 'zod'
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
  outcomes.push(await runProject('node'))
  if (whyNoBrowser === null) outcomes.push(await runProject('browser'))
  else {
    const why = `${whyNoBrowser}; a test over a table counts once`
    outcomes.push(notRun('vitest browser', await countBrowserTests(), why))
  }
}

async function runProject(project: 'node' | 'browser'): Promise<Outcome> {
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
  return judged(
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
