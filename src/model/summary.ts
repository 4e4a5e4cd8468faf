/** The figures above the schedule: sums over all runs that are sized so far. */
import type { Run } from './job.ts'
import type { RunBrief } from './run-brief.ts'

export interface Summary {
  readonly runs: number
  /** Runs that have an answer already. */
  readonly sized: number
  readonly lengthM: number
  /** Null where nothing is sized yet. */
  readonly bareLossW: number | null
  readonly laggedLossW: number | null
  /** One sum per currency, since they do not add up. */
  readonly installed: ReadonlyMap<string, number>
  /** Of the runs with a price, in one currency; null where nothing is saved, or currencies are mixed. */
  readonly paybackYears: number | null
  readonly failing: number
  readonly heeding: number
}

export function summarise(runs: readonly Run[], briefs: ReadonlyMap<string, RunBrief>): Summary {
  const installed = new Map<string, number>()
  let [sized, lengthM, savingPerYear, failing, heeding] = [0, 0, 0, 0, 0]
  let [bareLossW, laggedLossW]: [number | null, number | null] = [null, null]
  for (const run of runs) {
    // The shell of a vessel is no length of pipe.
    if (run.values.shape !== 'vessel') lengthM += run.values.lengthM ?? 0
    const brief = briefs.get(run.id)
    if (!brief) continue
    sized++
    if (brief.state === 'fails') failing++
    if (brief.state === 'heed') heeding++
    if (!brief.ok || brief.bareLossW === null || brief.laggedLossW === null) continue
    // Heat lost and heat gained both cost money: cold runs count with their size, not their sign.
    bareLossW = (bareLossW ?? 0) + Math.abs(brief.bareLossW)
    laggedLossW = (laggedLossW ?? 0) + Math.abs(brief.laggedLossW)
    if (brief.currency === null || brief.installedTotal === null) continue
    installed.set(brief.currency, (installed.get(brief.currency) ?? 0) + brief.installedTotal)
    savingPerYear += brief.savingPerYearTotal ?? 0
  }
  const [total] = installed.values()
  const isPlain = installed.size === 1 && total !== undefined && savingPerYear > 0
  const paybackYears = isPlain ? total / savingPerYear : null
  return {
    runs: runs.length,
    sized,
    lengthM,
    bareLossW,
    laggedLossW,
    installed,
    paybackYears,
    failing,
    heeding,
  }
}
