import { z } from 'zod'
import { electronBinary } from '../../electron/binary.mjs'
import { hasDisplay } from '../../electron/browser.mjs'
import { judged, notRun, type Outcome } from './outcome.ts'
import { runTool, withReport } from './tool.ts'

const tool = { package: '@playwright/test', bin: 'playwright' }
type Project = 'host' | 'app' | 'electron'

const reportSchema = z.object({
  stats: z.object({ expected: z.int(), unexpected: z.int(), flaky: z.int(), skipped: z.int() }),
})

/** `whyNoBrowser`: why there is no Chromium, or null where there is one. */
export async function runPlaywright(
  whyNoBrowser: string | null,
  outcomes: Outcome[],
): Promise<void> {
  await runOrCount('playwright', ['host', 'app'], whyNoBrowser, outcomes)
  await runOrCount('playwright electron', ['electron'], whyNoElectron(), outcomes)
}

function whyNoElectron(): string | null {
  if (!electronBinary()) return "Electron's binary is not on this machine"
  return hasDisplay() ? null : 'Electron needs a display'
}

async function runOrCount(
  name: string,
  projects: readonly Project[],
  whyNot: string | null,
  outcomes: Outcome[],
): Promise<void> {
  const chosen = projects.map((project) => `--project=${project}`)
  if (whyNot !== null) return void outcomes.push(notRun(name, await count(chosen), whyNot))
  console.log(`\n== ${name}`)
  const { exitCode, report } = await withReport((file) =>
    runTool(tool, ['test', ...chosen, '--reporter=list,json'], {
      env: { PLAYWRIGHT_JSON_OUTPUT_FILE: file },
    }),
  )
  const stats = reportSchema.safeParse(report).data?.stats
  outcomes.push(
    judged(
      name,
      exitCode,
      // Nothing is retried, so none is flaky.
      stats ? { passed: stats.expected, failed: stats.unexpected, skipped: stats.skipped } : null,
    ),
  )
}

/** By Playwright's own listing, which needs no browser. */
async function count(chosen: readonly string[]): Promise<number> {
  const { report } = await withReport((file) =>
    runTool(tool, ['test', ...chosen, '--list', '--reporter=json'], {
      env: { PLAYWRIGHT_JSON_OUTPUT_FILE: file },
      isShown: false,
    }),
  )
  const suites = z.object({ suites: z.array(z.unknown()) }).safeParse(report).data?.suites ?? []
  return suites.reduce((sum: number, suite) => sum + specsIn(suite), 0)
}

const suiteSchema = z.object({
  specs: z.array(z.object({ tests: z.array(z.unknown()) })),
  suites: z.array(z.unknown()).optional(),
})

function specsIn(suite: unknown): number {
  const { specs, suites = [] } = suiteSchema.parse(suite)
  const own = specs.reduce((sum, spec) => sum + spec.tests.length, 0)
  return suites.reduce((sum: number, inner) => sum + specsIn(inner), own)
}
