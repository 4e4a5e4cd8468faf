/** Exact thickness at which a limit begins to pass, between and beyond the rungs. */
import { bracketedRoot } from '#solver/index.ts'
import { arrival } from './arrival.ts'
import { bare, type Settled, settle } from './build-up.ts'
import { judgeBy } from './limits.ts'
import type { Limits, Problem } from './problem.ts'
import type { LimitEnd, LimitName, LimitResult } from './result.ts'
import { overallSizeM } from './space.ts'
import { solveStates } from './states.ts'

const THINNEST_M = 1e-4
/** Where the search ends: well beyond what is bought as lagging [m]. */
const THICKEST_M = 0.6
const EXACT_M = 1e-7

/** How far one limit is from its bound, in its own unit: negative passes, on whichever side of it that is. */
const shortfall = ({ pass, value, bound }: LimitResult): number =>
  (pass ? -1 : 1) * Math.abs(value - bound)

/** The thickest sized layer that is looked at [m]: a buried run has to stay under the ground. */
export function searchedUpToM({ shape, layers }: Problem): number {
  if (shape.kind !== 'buried-pipe') return THICKEST_M
  const roomM = shape.depthM - shape.outerDiameterM / 2 - fixedThicknessM(layers)
  return Math.min(THICKEST_M, Math.max(THINNEST_M, roomM - THINNEST_M))
}

const fixedThicknessM = (layers: Problem['layers']): number =>
  layers.reduce((sum, layer) => sum + (layer.thicknessM ?? 0), 0)

function settledAt(problem: Problem, thicknessM: number): Settled {
  return settle(problem.layers, { thicknessM, nominalThicknessM: null, piecesM: [thicknessM] })
}

/**
 * The worst shortfall of the limits of one name by the thickness of the sized layer; negative where that limit is not
 * judged. The bare run is solved once, and no month: no limit looks at them.
 */
function shortfallOf(given: Problem, limit: LimitName): (thicknessM: number) => number {
  const problem: Problem = { ...given, conditions: { ...given.conditions, months: [] } }
  const bareStates = solveStates(problem, bare)
  return (thicknessM) => {
    const settled = settledAt(problem, thicknessM)
    const states = solveStates(problem, settled)
    const arrives = () => arrival(problem, settled, states, bareStates)
    const judged = judgeBy(limit, { problem, settled, states, arrives })
    return Math.max(Number.NEGATIVE_INFINITY, ...judged.map(shortfall))
  }
}

/** Where a limit begins to pass, between a thickness of the sized layer that fails it and one that passes [m]. */
export function passesFromM(
  problem: Problem,
  limit: LimitName,
  between: { readonly failsM: number; readonly passesM: number },
): number {
  const shortfallAt = shortfallOf(problem, limit)
  return bracketedRoot(
    (thicknessM) => -shortfallAt(thicknessM),
    { low: between.failsM, high: between.passesM },
    { width: EXACT_M, value: 0 },
  ).at
}

/**
 * Thickness of the sized layer from which a limit passes for good [m]; 0 where every thickness does, null where none up
 * to 600 mm does. Looked for from the thick end over the rungs, since a thin layer on a small pipe may lose more than
 * none: the limit may pass, fail and pass again.
 */
function continuousThicknessM(problem: Problem, limit: LimitName): number | null {
  const thickestM = searchedUpToM(problem)
  const stepsM = problem.steps.map((step) => step.thicknessM).filter((stepM) => stepM < thickestM)
  const thicknessesM = [THINNEST_M, ...stepsM, thickestM]
  const shortfallAt = shortfallOf(problem, limit)
  const last = thicknessesM.findLastIndex((thicknessM) => shortfallAt(thicknessM) > 0)
  const failsM = thicknessesM[last]
  if (failsM === undefined) return 0
  const passesM = thicknessesM[last + 1]
  return passesM === undefined ? null : passesFromM(problem, limit, { failsM, passesM })
}

/** The same as a thickness of the whole build-up, fixed layers included [m]. */
export function wholeThicknessM(problem: Problem, limit: LimitName): number | null {
  const sizedM = continuousThicknessM(problem, limit)
  if (sizedM === null || sizedM === 0) return sizedM
  return sizedM + fixedThicknessM(problem.layers)
}

/**
 * The exact ends of the limits a problem sets, for the ladder picture, as thicknesses of the whole build-up like its
 * rungs. Service has no thickness end; space has an upper one.
 */
export function limitEnds(problem: Problem): LimitEnd[] {
  if (!problem.layers.some((layer) => layer.thicknessM === null)) return []
  const ends: LimitEnd[] = limitsWithLowerEnd(problem.limits).map((limit) => ({
    limit,
    fromM: wholeThicknessM(problem, limit),
    upToM: null,
  }))
  const bareM = overallSizeM(problem, 0)
  const { maxOuterDiameterM } = problem.limits
  if (maxOuterDiameterM !== null && bareM !== null) {
    ends.push({ limit: 'space', fromM: 0, upToM: Math.max(0, (maxOuterDiameterM - bareM) / 2) })
  }
  return ends
}

/** The limits a run asks for that lagging meets from some thickness on: what it can be sized by. */
export function limitsWithLowerEnd(limits: Limits): LimitName[] {
  const set: LimitName[] = []
  if (limits.maxSurfaceC !== null || limits.burn !== null) set.push('touch')
  if (limits.maxLossWPerM !== null || limits.maxLossWPerM2 !== null) set.push('loss')
  if (limits.damp !== null) set.push('damp')
  if (limits.frost !== null) set.push('frost')
  if (limits.arrival !== null && limits.arrival.maxDropK !== null) set.push('arrival')
  if (limits.code !== null) set.push('code')
  return set
}
