/** What one runner did. */
export interface Outcome {
  readonly name: string
  readonly passed: number
  readonly failed: number
  readonly notRun: number
  /** Why some were not run. */
  readonly why?: string
}

export function total(outcomes: readonly Outcome[]): { passed: number; failed: number } {
  const sum = (key: 'passed' | 'failed') => outcomes.reduce((all, one) => all + one[key], 0)
  return { passed: sum('passed'), failed: sum('failed') }
}

/**
 * The outcome of a runner by its own report. One that ends with an error although no test failed (a broken
 * file, an error outside any test, no report at all) counts as one failure.
 */
export function judged(
  name: string,
  exitCode: number,
  counts: { passed: number; failed: number; skipped: number } | null,
): Outcome {
  if (!counts) return { name, passed: 0, failed: 1, notRun: 0 }
  const { passed, failed, skipped } = counts
  return {
    name,
    passed,
    failed: exitCode !== 0 && failed === 0 ? 1 : failed,
    notRun: skipped,
    why: 'skipped by the tests themselves',
  }
}

export const notRun = (name: string, count: number, why: string): Outcome => ({
  name,
  passed: 0,
  failed: 0,
  notRun: count,
  why,
})
