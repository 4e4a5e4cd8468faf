/** The limits of a run, each judged at its own condition; touch, loss and damp here, on the worst face, the others beside. */
import type { Face, Solution } from '#solver/types.ts'
import { type Arrival, arrivalLimits } from './arrival.ts'
import type { Settled } from './build-up.ts'
import { codeLimits } from './code.ts'
import { frostLimits } from './frost.ts'
import type { Limits, Problem } from './problem.ts'
import type { LimitName, LimitResult } from './result.ts'
import { serviceLimits } from './service.ts'
import { spaceLimits } from './space.ts'
import { hottestFace, type States } from './states.ts'

/** One solved build-up, as its limits ask about it. */
export interface Judged {
  readonly problem: Problem
  readonly settled: Settled
  readonly states: States
  /** How the medium arrives: a search, and gone through only for the limit that asks. */
  readonly arrives: () => Arrival | null
}

/** In the order of the results; none where the run does not ask for the limit. */
const judges: Readonly<Record<LimitName, (judged: Judged) => LimitResult[]>> = {
  touch: ({ problem, settled, states }) =>
    touchLimits(problem.limits, states.touch, settled.layers.length === 0),
  loss: ({ problem, states }) => lossLimits(problem.limits, states.loss),
  damp: ({ problem, states }) => dampLimits(problem.limits, states.damp),
  frost: ({ problem, settled }) => frostLimits(problem, settled),
  arrival: ({ problem, arrives }) => arrivalLimits(problem, arrives()),
  code: ({ problem, settled }) => codeLimits(problem, settled),
  space: ({ problem, settled, states }) => spaceLimits(problem, settled, states.loss),
  service: ({ problem, settled, states }) => serviceLimits(problem, settled, states),
}

export const judge = (judged: Judged): LimitResult[] =>
  Object.values(judges).flatMap((limitsOf) => limitsOf(judged))

export const judgeBy = (limit: LimitName, judged: Judged): LimitResult[] => judges[limit](judged)

const isColder = (a: Face, b: Face): Face => (b.surfaceTempC < a.surfaceTempC ? b : a)

const coldestFace = ({ faces }: Solution): Face => faces.reduce(isColder)

const onFace = (face: Face): string =>
  face.side === 'all round' ? 'surface' : `surface, ${face.side}`

function touchLimits(limits: Limits, state: Solution, isBare: boolean): LimitResult[] {
  const { maxSurfaceC } = limits
  const burn = isBare ? limits.bareBurn : limits.burn
  const face = hottestFace(state)
  const value = face.surfaceTempC
  const found: LimitResult[] = []
  const common = { limit: 'touch', value, unit: '°C', condition: 'touch' } as const
  if (maxSurfaceC !== null) {
    found.push({
      ...common,
      pass: value <= maxSurfaceC,
      rule: 'at most',
      bound: maxSurfaceC,
      what: onFace(face),
    })
  }
  if (burn) {
    found.push({
      ...common,
      pass: value < burn.thresholdC,
      rule: 'below',
      bound: burn.thresholdC,
      what: `${onFace(face)}, ${burn.surface} touched for ${burn.contact}`,
    })
  }
  return found
}

function lossLimits({ maxLossWPerM, maxLossWPerM2 }: Limits, state: Solution): LimitResult[] {
  const limits: LimitResult[] = []
  const common = { limit: 'loss', rule: 'at most', condition: 'loss' } as const
  if (maxLossWPerM !== null && state.heatLossWPerM !== null) {
    const value = Math.abs(state.heatLossWPerM)
    limits.push({
      ...common,
      pass: value <= maxLossWPerM,
      value,
      bound: maxLossWPerM,
      unit: 'W/m',
      what: 'heat flow per metre',
    })
  }
  if (maxLossWPerM2 !== null) {
    const value = Math.abs(state.heatFluxWPerM2)
    limits.push({
      ...common,
      pass: value <= maxLossWPerM2,
      value,
      bound: maxLossWPerM2,
      unit: 'W/m²',
      what: 'heat flux on the outer area',
    })
  }
  return limits
}

function dampLimits({ damp }: Limits, state: Solution | null): LimitResult[] {
  if (damp === null || state === null) return []
  const face = coldestFace(state)
  const bound = damp.dewPointC + damp.marginK
  return [
    {
      limit: 'damp',
      pass: face.surfaceTempC >= bound,
      value: face.surfaceTempC,
      rule: 'at least',
      bound,
      unit: '°C',
      condition: 'damp',
      what: onFace(face),
    },
  ]
}
