/** The limits of the first door: touch, loss, damp and service, each judged at its own condition on the worst face. */
import { beyondCurveK } from '#solver/index.ts'
import type { Face, Solution } from '#solver/types.ts'
import type { Settled } from './build-up.ts'
import type { BuildUpLayer, Limits, Problem } from './problem.ts'
import type { ConditionName, LimitResult } from './result.ts'
import type { States } from './states.ts'

/** Every limit of a run, judged on one solved build-up. */
export function judge(problem: Problem, settled: Settled, states: States): LimitResult[] {
  return [
    ...touchLimits(problem.limits, states.touch),
    ...lossLimits(problem.limits, states.loss),
    ...dampLimits(problem.limits, states.damp),
    ...serviceLimits(problem, settled, states),
  ]
}

const isHotter = (a: Face, b: Face): Face => (b.surfaceTempC > a.surfaceTempC ? b : a)
const isColder = (a: Face, b: Face): Face => (b.surfaceTempC < a.surfaceTempC ? b : a)

export const hottestFace = ({ faces }: Solution): Face => faces.reduce(isHotter)
const coldestFace = ({ faces }: Solution): Face => faces.reduce(isColder)

const onFace = (face: Face): string =>
  face.side === 'all round' ? 'surface' : `surface, ${face.side}`

function touchLimits({ maxSurfaceC, burn }: Limits, state: Solution): LimitResult[] {
  const face = hottestFace(state)
  const value = face.surfaceTempC
  const limits: LimitResult[] = []
  const common = { limit: 'touch', value, unit: '°C', condition: 'touch' } as const
  if (maxSurfaceC !== null) {
    limits.push({ ...common, pass: value <= maxSurfaceC, bound: maxSurfaceC, what: onFace(face) })
  }
  if (burn) {
    const what = `${onFace(face)}, ${burn.surface} touched for ${burn.contactS} s`
    limits.push({ ...common, pass: value < burn.thresholdC, bound: burn.thresholdC, what })
  }
  return limits
}

function lossLimits({ maxLossWPerM, maxLossWPerM2 }: Limits, state: Solution): LimitResult[] {
  const limits: LimitResult[] = []
  const common = { limit: 'loss', condition: 'loss' } as const
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
      bound,
      unit: '°C',
      condition: 'damp',
      what: onFace(face),
    },
  ]
}

/** A curve may be read this far beyond its ends; farther, the figure is not to be trusted. Source: data of the catalogue. */
const CURVE_REACH_K = 20

/** One temperature against one end of a range: the margin is negative where it is broken. */
interface Stand {
  readonly marginK: number
  readonly value: number
  readonly bound: number
  readonly what: string
  readonly condition: ConditionName
}

/** Service: the place nearest to its limit, over every interface and the jacket, hot and cold. */
function serviceLimits(problem: Problem, settled: Settled, states: States): LimitResult[] {
  const stands = [
    ...standsOf(settled.layers, states.touch, 'touch'),
    ...(states.damp ? standsOf(settled.layers, states.damp, 'damp') : []),
    ...jacketStands(problem, settled, states.touch),
  ]
  if (stands.length === 0) return []
  const worst = stands.reduce((a, b) => (b.marginK < a.marginK ? b : a))
  return [
    {
      limit: 'service',
      pass: worst.marginK >= 0,
      value: worst.value,
      bound: worst.bound,
      unit: '°C',
      condition: worst.condition,
      what: worst.what,
    },
  ]
}

function standsOf(
  layers: readonly BuildUpLayer[],
  state: Solution,
  condition: ConditionName,
): Stand[] {
  const stands: Stand[] = []
  const add = (value: number, bound: number, sign: 1 | -1, what: string): void => {
    stands.push({ marginK: sign * (bound - value), value, bound, what, condition })
  }
  for (const { interfaceTempsC } of state.faces) {
    layers.forEach(({ material }, index) => {
      const inner = interfaceTempsC[index] ?? 0
      const outer = interfaceTempsC[index + 1] ?? 0
      const hot = Math.max(inner, outer)
      const cold = Math.min(inner, outer)
      if (condition === 'touch' && material.serviceMaxC !== null) {
        add(hot, material.serviceMaxC, 1, `${material.name}, hottest side`)
      }
      if (condition === 'damp' && material.serviceMinC !== null) {
        add(cold, material.serviceMinC, -1, `${material.name}, coldest side`)
      }
      const mean = (inner + outer) / 2
      const beyondK = beyondCurveK(material.conductivity, mean)
      if (Math.abs(beyondK) > CURVE_REACH_K) {
        const sign = beyondK > 0 ? 1 : -1
        const bound = mean - beyondK + sign * CURVE_REACH_K
        add(mean, bound, sign, `${material.name}, mean temperature against its conductivity curve`)
      }
    })
  }
  return stands
}

function jacketStands({ finish }: Problem, settled: Settled, state: Solution): Stand[] {
  if (settled.layers.length === 0 || !finish || finish.surfaceMaxC === null) return []
  const value = hottestFace(state).surfaceTempC
  const bound = finish.surfaceMaxC
  return [
    { marginK: bound - value, value, bound, what: `${finish.name}, jacket`, condition: 'touch' },
  ]
}

/** Above this share of a material's maximum a note is due. Source: layering rule `limit_90_percent` of the catalogue. */
export const SERVICE_HEED_SHARE = 0.9
