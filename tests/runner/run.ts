import { findChromium } from '../chromium.ts'
import { builds, checks, names, runSteps } from './checks.ts'
import { installChromium } from './install-chromium.ts'
import { type Outcome, total } from './outcome.ts'
import { runPlaywright } from './playwright.ts'
import { runVitest } from './vitest.ts'

/** Runs all there is to run and prints the sum; the exit code. */
export async function run(what: 'checks' | 'everything'): Promise<number> {
  const outcomes: Outcome[] = []
  await runSteps(checks, outcomes)
  if (what === 'checks') await runSteps(names, outcomes)
  else {
    await runSteps(builds, outcomes)
    const why = findChromium() ? null : await installChromium()
    await runVitest(why, outcomes)
    await runPlaywright(why, outcomes)
  }
  return summarise(outcomes)
}

function summarise(outcomes: readonly Outcome[]): number {
  console.log('')
  for (const outcome of outcomes) console.log(line(outcome))
  const { passed, failed } = total(outcomes)
  console.log(`${passed} passed, ${failed} failed`)
  return failed > 0 ? 1 : 0
}

function line({ name, passed, failed, notRun, why }: Outcome): string {
  const parts = [
    passed > 0 || notRun === 0 ? `${passed} passed` : null,
    failed > 0 ? `${failed} FAILED` : null,
    notRun > 0 ? `${notRun} not run (${why})` : null,
  ]
  return `${name.padEnd(22)} ${parts.filter((part) => part !== null).join(', ')}`
}
