/** The service limit: every interface and the jacket within what their materials stand, at the hottest and coldest medium. */
import { beyondCurveK } from '#solver/index.ts'
import type { Solution } from '#solver/types.ts'
import type { Settled } from './build-up.ts'
import type { BuildUpLayer, Problem } from './problem.ts'
import type { ConditionName, LimitResult, Note } from './result.ts'
import { getsCold, hottestFace, type States } from './states.ts'

/** A curve may be read this far beyond its ends; farther, the figure is not to be trusted. Source: data of the catalogue. */
const CURVE_REACH_K = 20

/** How a mean temperature beyond the curve is named. */
export const curveWords = 'mean temperature against its conductivity curve'

/** Differences below this are of the solver, not of the run [K]: a medium at the very maximum is within it. */
const SOLVED_K = 1e-6

/** One temperature against one end of a range: the margin is negative where it is broken. */
interface Stand {
  readonly marginK: number
  /** True for the stated maximum of a material or jacket. */
  readonly ofMaximum: boolean
  readonly value: number
  readonly rule: LimitResult['rule']
  readonly bound: number
  readonly what: string
  readonly condition: ConditionName
}

/** Service: the place nearest to its limit, over every interface and the jacket, hot and cold. */
export function serviceLimits(problem: Problem, settled: Settled, states: States): LimitResult[] {
  const stands = allStands(problem, settled, states)
  if (stands.length === 0) return []
  const worst = stands.reduce((a, b) => (b.marginK < a.marginK ? b : a))
  return [
    {
      limit: 'service',
      pass: worst.marginK >= -SOLVED_K,
      value: worst.value,
      rule: worst.rule,
      bound: worst.bound,
      unit: '°C',
      condition: worst.condition,
      what: worst.what,
    },
  ]
}

function allStands(problem: Problem, settled: Settled, states: States): Stand[] {
  return [
    ...standsOf(settled.layers, states.touch, 'touch'),
    ...(getsCold(problem) && states.damp ? standsOf(settled.layers, states.damp, 'damp') : []),
    ...jacketStands(problem, settled, states.touch),
  ]
}

function standsOf(
  layers: readonly BuildUpLayer[],
  state: Solution,
  condition: ConditionName,
): Stand[] {
  const stands: Stand[] = []
  const add = (
    value: number,
    bound: number,
    sign: 1 | -1,
    what: string,
    ofMaximum = false,
  ): void => {
    const rule = sign > 0 ? 'at most' : 'at least'
    stands.push({ marginK: sign * (bound - value), ofMaximum, value, rule, bound, what, condition })
  }
  for (const { interfaceTempsC } of state.faces) {
    layers.forEach(({ material }, index) => {
      const inner = interfaceTempsC[index] ?? 0
      const outer = interfaceTempsC[index + 1] ?? 0
      const hot = Math.max(inner, outer)
      const cold = Math.min(inner, outer)
      if (condition === 'touch' && material.serviceMaxC !== null) {
        add(hot, material.serviceMaxC, 1, `${material.name}, hottest side`, true)
      }
      if (condition === 'damp' && material.serviceMinC !== null) {
        add(cold, material.serviceMinC, -1, `${material.name}, coldest side`)
      }
      const mean = (inner + outer) / 2
      const beyondK = beyondCurveK(material.conductivity, mean)
      if (Math.abs(beyondK) > CURVE_REACH_K) {
        const sign = beyondK > 0 ? 1 : -1
        const bound = mean - beyondK + sign * CURVE_REACH_K
        add(mean, bound, sign, `${material.name}, ${curveWords}`)
      }
    })
  }
  return stands
}

function jacketStands({ finish }: Problem, settled: Settled, state: Solution): Stand[] {
  if (settled.layers.length === 0 || !finish || finish.surfaceMaxC === null) return []
  const value = hottestFace(state).surfaceTempC
  const bound = finish.surfaceMaxC
  const what = `${finish.name}, jacket`
  return [
    {
      marginK: bound - value,
      ofMaximum: true,
      value,
      rule: 'at most',
      bound,
      what,
      condition: 'touch',
    },
  ]
}

/** Above this share of a material's maximum a note is due. Source: layering rule `limit_90_percent` of the catalogue. */
const HEED_SHARE = 0.9

/** Every material and jacket that is near its maximum, though within it. */
export function serviceHeeds(problem: Problem, settled: Settled, states: States): Note[] {
  return allStands(problem, settled, states)
    .filter(
      ({ ofMaximum, marginK, value, bound }) =>
        ofMaximum && marginK >= -SOLVED_K && bound > 0 && value > HEED_SHARE * bound + SOLVED_K,
    )
    .map(({ what, value, bound }) => ({
      code: 'service-heed',
      text: `${what}: ${value.toFixed(0)} °C is above 90 % of the ${bound.toFixed(0)} °C it can stand.`,
    }))
}
