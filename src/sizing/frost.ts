/** The frost limit: how long stagnant water takes to reach 0 °C and to freeze. */
import { coolingTimeS, FREEZING_C, freezingTimeS, solve } from '#solver/index.ts'
import type { Settled } from './build-up.ts'
import { equilibriumC } from './equilibrium.ts'
import type { FrostLimit, Problem } from './problem.ts'
import type { LimitResult } from './result.ts'
import { systemOf } from './states.ts'

const HOUR_S = 3600

/** Nearer to 0 °C than this the pipe would take years: it does not freeze [K]. */
const NEVER_K = 1e-6

/**
 * Hours until the water reaches 0 °C and freezes the stated fraction; null where frost is not asked about, and where
 * the place never gets the water to freeze.
 *
 * Water and pipe wall cool together, at one temperature throughout; the lagging holds no heat, and the resistance of
 * the wall and of the film inside are left out (an inside film that is given counts). The resistance from the water to
 * the place, per metre, is that of a steady solve: with the water midway between its start and 0 °C while it cools, at
 * 0 °C while it freezes. It is driven by the temperature that the pipe itself tends to, which lies below the air under a
 * cold sky. Against a cooling followed step by step from 60 °C or less this is never more than 2 % late, and early by
 * at most 7 % for lagged pipes and 18 % for bare ones: that far only where the air lies just below 0 °C and the film
 * weakens on the way; in air of −10 °C and from 20 °C by 2 % and 5 %. The figures of the water are those near 0 °C: at
 * 80 °C its heat capacity by volume is 3 % less.
 */
export function timeToFreezeH(problem: Problem, settled: Settled): number | null {
  const { frost } = problem.limits
  const condition = problem.conditions.frost
  if (frost === null || condition === null) return null
  const flowAt = (mediumC: number): number =>
    solve(systemOf(problem, settled, { ...condition, mediumC })).heatFlowWPerUnit
  const tendsToC = equilibriumC(condition, flowAt)
  if (tendsToC > FREEZING_C - NEVER_K) return null
  const resistanceAt = (mediumC: number): number => (mediumC - tendsToC) / flowAt(mediumC)
  const startC = condition.mediumC
  const coolingS = coolingTimeS({
    capacityJPerMK: frost.wallJPerMK + frost.waterJPerMK,
    resistanceMKPerW: resistanceAt((startC + FREEZING_C) / 2),
    startC,
    endC: FREEZING_C,
    airC: tendsToC,
  })
  const freezingS = frost.iceFraction === 0 ? 0 : iceTimeS(frost, resistanceAt(0), tendsToC)
  return coolingS === null || freezingS === null ? null : (coolingS + freezingS) / HOUR_S
}

const iceTimeS = (
  { iceFraction, boreM }: FrostLimit,
  resistanceMKPerW: number,
  airC: number,
): number | null => freezingTimeS({ iceFraction, boreM, resistanceMKPerW, airC })

export function frostLimits(problem: Problem, settled: Settled): LimitResult[] {
  const { frost } = problem.limits
  const value = timeToFreezeH(problem, settled)
  if (frost === null || value === null) return []
  return [
    {
      limit: 'frost',
      pass: value >= frost.hours,
      value,
      rule: 'at least',
      bound: frost.hours,
      unit: 'h',
      condition: 'frost',
      what: `standing water, until ${frozenWords(frost.iceFraction)}`,
    },
  ]
}

const frozenWords = (iceFraction: number): string =>
  iceFraction === 0 ? 'it reaches 0 °C' : `${Number((iceFraction * 100).toFixed(1))} % of it is ice`
