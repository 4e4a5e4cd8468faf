/** Code: what the rows of a table ask, and what the layers make of it. */
import { conductivityAtWPerMK, solve } from '#solver/index.ts'
import type { Settled } from '../build-up.ts'
import { codeLimits } from '../code.ts'
import type { CodeAsk, CodeThickness, Problem } from '../problem.ts'
import type { LimitResult } from '../result.ts'
import { systemOf } from '../states.ts'
import { interpolation, literal } from './conductivity.ts'
import { MINUS } from './formula.ts'
import { Ledger } from './ledger.ts'
import { verdict } from './limits.ts'
import { stateSections } from './state.ts'
import type { Section } from './types.ts'

export function codeSections(problem: Problem, settled: Settled): Section[] {
  const { code } = problem.limits
  if (code === null) return []
  const limits = codeLimits(problem, settled)
  return code.asks.flatMap((ask, index) => {
    const limit = limits[index]
    const many = code.asks.length > 1 ? `, ${index + 1}` : ''
    return limit ? askSections(problem, settled, ask, limit, many) : []
  })
}

function askSections(
  problem: Problem,
  settled: Settled,
  ask: CodeAsk,
  limit: LimitResult,
  many: string,
): Section[] {
  const ledger = new Ledger(`Limit: code${many}`, null)
  const before: Section[] = []
  if (ask.kind === 'loss') {
    const { condition } = ask
    const solution = solve(systemOf(problem, settled, condition))
    before.push(...stateSections({ problem, settled, condition, solution, title: `Code${many}` }))
    ledger.given('Flux on the outer area', 'q', solution.heatFluxWPerM2, 'W/m²')
    ledger.given('Outer area of a metre', 'A', solution.outerAreaM2PerUnit, 'm²/m')
    ledger.step('Loss or gain of a metre', 'Φ', 'abs(q × A)', 'W/m', { value: limit.value })
  } else {
    conductivitiesAt(ledger, settled, ask.ratingMeanC)
    if (ask.kind === 'thickness') thicknessSteps(ledger, settled, ask, limit.bound)
    else if (settled.layers.length > 0) {
      const terms = settled.layers.map((_, index) => `s_${index + 1} / λ_${index + 1}`)
      ledger.step('Resistance of the layers, films left out', 'R', terms.join(' + '), 'm²·K/W', {
        value: limit.value,
      })
    }
  }
  verdict(ledger, limit, '')
  return [...before, ledger.section()]
}

/** s_j and λ_j of every layer, λ at the mean temperature of the table. */
function conductivitiesAt(ledger: Ledger, { layers }: Settled, ratingMeanC: number): void {
  ledger.given('Mean temperature that the table compares at', 'θ_m', ratingMeanC, '°C')
  layers.forEach(({ material, thicknessM }, index) => {
    const { conductivity, name } = material
    const layer = index + 1
    ledger.given(`Thickness of layer ${layer}, ${name}`, `s_${layer}`, thicknessM ?? 0, 'm')
    const value = conductivityAtWPerMK(conductivity, ratingMeanC)
    const words = `Conductivity of layer ${layer} there`
    if (conductivity.kind === 'constant') ledger.given(words, `λ_${layer}`, value, 'W/(m·K)')
    else {
      const formula = interpolation(conductivity, ratingMeanC, 'θ_m')
      ledger.step(words, `λ_${layer}`, formula, 'W/(m·K)', { value })
    }
  })
}

function thicknessSteps(
  ledger: Ledger,
  { layers }: Settled,
  ask: CodeThickness,
  boundM: number,
): void {
  ledger.given('Outer radius of the pipe', 'r_0', ask.radiusM, 'm')
  layers.forEach((_, index) => {
    ledger.step(
      `Radius over layer ${index + 1}`,
      `r_${index + 1}`,
      `r_${index} + s_${index + 1}`,
      'm',
    )
  })
  const count = layers.length
  if (count > 0) {
    const sum = layers.map((_, index) => `ln(r_${index + 1} / r_${index}) / λ_${index + 1}`)
    ledger.step(
      'Conductivity of the layers as one material on this pipe',
      'K',
      `ln(r_${count} / r_0) / (${sum.join(' + ')})`,
      'W/(m·K)',
    )
  }
  askedStep(ledger, ask, boundM)
}

const STANDARD_90_1 =
  'Standard 90.1, note to its pipe table, as quoted in ASHRAE Handbook Fundamentals 2021, ch. 23'
const SAME = 1e-9

/** The thickness that the table asks for, T: as a row says, between two rows, or carried over from one. */
function askedStep(ledger: Ledger, { rows, radiusM }: CodeThickness, boundM: number): void {
  const isBound = (value: number): boolean => Math.abs(value - boundM) <= SAME * boundM
  if (rows.some(({ thicknessM }) => isBound(thicknessM))) {
    ledger.given('Thickness of the row of the table', 'T', boundM, 'm')
    return
  }
  const conductivity = ledger.valueAt('K')
  const points = rows.flatMap(({ thicknessM, rangeWPerMK }) =>
    rangeWPerMK ? [{ thicknessM, at: rangeWPerMK[1] }] : [],
  )
  for (const { thicknessM, at } of points) {
    const carriedM = radiusM * ((1 + thicknessM / radiusM) ** (conductivity / at) - 1)
    if (!isBound(carriedM)) continue
    ledger.given('Thickness of the nearest row', 't', thicknessM, 'm')
    ledger.given('Conductivity that it belongs to', 'k', at, 'W/(m·K)')
    const formula = 'r_0 × ((1 + t / r_0)^(K / k) − 1)'
    ledger.step('Thickness that resists as much on this pipe', 'T', formula, 'm', {
      value: boundM,
      source: STANDARD_90_1,
    })
    return
  }
  const next = points.findIndex(({ at }) => at >= conductivity)
  const [lower, upper] = [points[next - 1], points[next]]
  if (lower && upper) {
    const rise = `(${literal(upper.thicknessM)} ${MINUS} ${literal(lower.thicknessM)})`
    const share = `(K ${MINUS} ${literal(lower.at)}) / (${literal(upper.at)} ${MINUS} ${literal(lower.at)})`
    const formula = `${literal(lower.thicknessM)} + ${rise} × ${share}`
    ledger.step('Thickness between the two rows around K', 'T', formula, 'm', { value: boundM })
  } else ledger.given('Thickness asked for: beyond any', 'T', boundM, 'm')
}
