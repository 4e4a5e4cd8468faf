/** The limits of a run, each judged at its own condition; touch, loss and damp here, on the worst face, the others beside. */
import type { Face, Solution } from '#solver/types.ts'
import { arrivalLimits } from './arrival.ts'
import type { Settled } from './build-up.ts'
import { codeLimits } from './code.ts'
import { frostLimits } from './frost.ts'
import type { Limits, Problem } from './problem.ts'
import type { LimitResult } from './result.ts'
import { serviceLimits } from './service.ts'
import { spaceLimits } from './space.ts'
import { hottestFace, type States } from './states.ts'

/** Every limit of a run, judged on one solved build-up; the bare run's states are those of its bare fittings. */
export function judge(
  problem: Problem,
  settled: Settled,
  states: States,
  bareStates: States,
): LimitResult[] {
  return [
    ...touchLimits(problem.limits, states.touch, settled.layers.length === 0),
    ...lossLimits(problem.limits, states.loss),
    ...dampLimits(problem.limits, states.damp),
    ...frostLimits(problem, settled),
    ...arrivalLimits(problem, settled, states, bareStates),
    ...codeLimits(problem, settled),
    ...spaceLimits(problem, settled, states.loss),
    ...serviceLimits(problem, settled, states),
  ]
}

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
