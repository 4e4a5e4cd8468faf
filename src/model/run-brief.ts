/** What the schedule shows of a sized run: small, since ten thousand of them cross from the worker to the window. */
import type { Governing, Issue, LimitResult, RunOutcome, RunResult } from '#sizing/result.ts'

/** Said by a shape first: disc, lozenge, triangle. */
export type RunState = 'passes' | 'heed' | 'fails'

export interface SizedBrief {
  readonly ok: true
  readonly state: RunState
  /** Of the chosen rung; null where none passes. */
  readonly thicknessM: number | null
  readonly nominalThicknessM: number | null
  /** Null for what has no metre that stands for the rest, and where no rung passes. */
  readonly heatLossWPerM: number | null
  readonly heatFluxWPerM2: number | null
  readonly surfaceTempC: number | null
  /** Of the bare thing: that of steam, whose pressure was given. */
  readonly insideTempC: number | null
  readonly governing: Governing
  /** A sphere or a vessel, of which only the whole loss says something. */
  readonly isPiece: boolean
  /** Of the whole run [W]. */
  readonly bareLossW: number | null
  readonly laggedLossW: number | null
  readonly currency: string | null
  readonly installedTotal: number | null
  readonly savingPerYearTotal: number | null
}
export interface UnsizedBrief {
  readonly ok: false
  /** A run that is only not finished is no mistake yet. */
  readonly state: 'heed' | 'fails'
  readonly issues: readonly Issue[]
}
export type RunBrief = SizedBrief | UnsizedBrief

export function briefOf(outcome: RunOutcome): RunBrief {
  return outcome.ok ? sizedBrief(outcome.result) : unsizedBrief(outcome.issues)
}

export function unsizedBrief(issues: readonly Issue[]): UnsizedBrief {
  return { ok: false, state: issues.every(isMissing) ? 'heed' : 'fails', issues }
}

/** Whether a value was not given, rather than given wrong. */
export function isMissing({ found }: Issue): boolean {
  return found === '' || found === 'nothing'
}

function sizedBrief(result: RunResult): SizedBrief {
  const { chosen, bare, money } = result
  return {
    ok: true,
    state: stateOf(result),
    thicknessM: chosen?.thicknessM ?? null,
    nominalThicknessM: chosen?.nominalThicknessM ?? null,
    heatLossWPerM: chosen?.heatLossWPerM ?? null,
    heatFluxWPerM2: chosen?.heatFluxWPerM2 ?? null,
    surfaceTempC: chosen?.surfaceTempC ?? null,
    insideTempC: bare.interfaceTempsC[0] ?? null,
    governing: result.governing,
    isPiece: bare.heatLossWPerM === null && bare.outerDiameterM !== null,
    bareLossW: bare.heatLossW,
    laggedLossW: chosen?.heatLossW ?? null,
    currency: money?.currency ?? null,
    installedTotal: money?.installedTotal ?? null,
    savingPerYearTotal: money?.savingPerYearTotal ?? null,
  }
}

function stateOf({ chosen }: RunResult): RunState {
  if (!chosen?.pass) return 'fails'
  return chosen.limits.some((limit) => limitState(limit) === 'heed') ? 'heed' : 'passes'
}

/** Kelvin: closer to its bound than the film correlations are sure of the surface. */
const closeK = 0.5

/** A limit that is not met fails; one that is met by a hair needs a look. */
export function limitState({ pass, unit, value, bound }: LimitResult): RunState {
  if (!pass) return 'fails'
  return unit === '°C' && Math.abs(value - bound) < closeK ? 'heed' : 'passes'
}
