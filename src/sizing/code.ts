/** The code limit: thickness or resistance not less, loss not more, than a table asks. */
import { between, type Point } from '#catalogue/figure.ts'
import { conductivityAtWPerMK, solve } from '#solver/index.ts'
import type { Settled } from './build-up.ts'
import type { CodeAsk, CodeThickness, CodeThicknessRow, Problem } from './problem.ts'
import type { LimitResult } from './result.ts'
import { systemOf } from './states.ts'

export function codeLimits(problem: Problem, settled: Settled): LimitResult[] {
  const { code } = problem.limits
  return code === null ? [] : code.asks.map((ask) => judged(problem, settled, code.table, ask))
}

/** Figures this near are the same, by share: 1.5 in is 0.0381 m, not 0.038099999999999995. */
const SAME = 1e-9

type Standing = Pick<LimitResult, 'pass' | 'value' | 'rule' | 'bound'>

const atLeast = (value: number, bound: number): Standing => ({
  pass: value >= bound * (1 - SAME),
  value,
  rule: 'at least',
  bound,
})

const atMost = (value: number, bound: number): Standing => ({
  pass: value <= bound * (1 + SAME),
  value,
  rule: 'at most',
  bound,
})

function judged(problem: Problem, settled: Settled, table: string, ask: CodeAsk): LimitResult {
  const common = { limit: 'code', condition: 'code' } as const
  switch (ask.kind) {
    case 'thickness': {
      const ownWPerMK = effectiveWPerMK(settled, ask)
      const stands = atLeast(settled.thicknessM, requiredThicknessM(ask, ownWPerMK))
      const of = ownWPerMK === null ? '' : ` at ${Number(ownWPerMK.toFixed(4))} W/mK`
      return { ...common, ...stands, unit: 'm', what: `thickness${of}, ${table}` }
    }
    case 'resistance': {
      const stands = atLeast(resistanceM2KPerW(settled, ask.ratingMeanC), ask.resistanceM2KPerW)
      return { ...common, ...stands, unit: 'm²K/W', what: `resistance without films, ${table}` }
    }
    case 'loss': {
      const state = solve(systemOf(problem, settled, ask.condition))
      const stands = atMost(Math.abs(state.heatFlowWPerUnit), ask.maxLossWPerM)
      return { ...common, ...stands, unit: 'W/m', what: `heat flow per metre, ${table}` }
    }
  }
}

/** Thickness over conductivity of the layers, at the table's mean temperature [m²K/W]. */
function resistanceM2KPerW({ layers }: Settled, ratingMeanC: number): number {
  return layers.reduce(
    (sum, { material, thicknessM }) =>
      sum + (thicknessM ?? 0) / conductivityAtWPerMK(material.conductivity, ratingMeanC),
    0,
  )
}

/**
 * Conductivity of the one material that would resist as much as the layers do on this pipe, at the table's mean
 * temperature [W/(m·K)]: of a single layer its own. Null for a bare run.
 */
function effectiveWPerMK(
  { layers, thicknessM }: Settled,
  { radiusM, ratingMeanC }: CodeThickness,
): number | null {
  if (thicknessM === 0) return null
  let innerM = radiusM
  let sum = 0
  for (const { material, thicknessM: ownM } of layers) {
    const form = Math.log1p((ownM ?? 0) / innerM)
    sum += form / conductivityAtWPerMK(material.conductivity, ratingMeanC)
    innerM += ownM ?? 0
  }
  return Math.log1p(thicknessM / radiusM) / sum
}

/**
 * Thickness that the table asks of a material on this pipe [m]; of no material (a bare run) that of its first row.
 *
 * `none`: as its row says. `conductivity-range`: so within the range of a row, else converted from the upper end of the
 * nearest. `equal-loss`: converted from the row's own. `interpolate`: straight between the rows; below the first as the
 * first, above the last converted from it, since nothing says more.
 */
export function requiredThicknessM(ask: CodeThickness, ownWPerMK: number | null): number {
  const { rows, conversion, radiusM } = ask
  const [first] = rows
  if (first === undefined) return 0
  if (ownWPerMK === null) return first.thicknessM
  const own = rows.find((row) => holds(row, ownWPerMK))
  const nearest = own ?? nearestRow(rows, first, ownWPerMK)
  const convertedM = (): number => converted(nearest, ownWPerMK, radiusM)
  switch (conversion) {
    case 'none':
      return nearest.thicknessM
    case 'conductivity-range':
      return own ? own.thicknessM : convertedM()
    case 'equal-loss':
      return convertedM()
    case 'interpolate':
      return own ? own.thicknessM : (interpolatedM(rows, ownWPerMK) ?? convertedM())
  }
}

const holds = ({ rangeWPerMK }: CodeThicknessRow, ownWPerMK: number): boolean =>
  rangeWPerMK === null ||
  (ownWPerMK >= rangeWPerMK[0] * (1 - SAME) && ownWPerMK <= rangeWPerMK[1] * (1 + SAME))

/** The row whose range begins last below a conductivity that none holds; the first where none does. */
const nearestRow = (
  rows: readonly CodeThicknessRow[],
  first: CodeThicknessRow,
  ownWPerMK: number,
): CodeThicknessRow =>
  rows.findLast(({ rangeWPerMK }) => rangeWPerMK !== null && rangeWPerMK[0] < ownWPerMK) ?? first

/** What conducts far too well would need more metres than there are numbers for; so much is as good as never [m]. */
const BEYOND_ANY_M = 1000

/**
 * Thickness of another conductivity that resists as much on the same pipe [m]: T = r[(1 + t/r)^(K/k) − 1], k the upper
 * end of the row's range. Source: Standard 90.1, note to its pipe table, as quoted in ASHRAE Handbook Fundamentals 2021,
 * ch. 23; the films, which change with the diameter, are left out of it.
 */
function converted(
  { thicknessM, rangeWPerMK }: CodeThicknessRow,
  ownWPerMK: number,
  radiusM: number,
): number {
  if (rangeWPerMK === null) return thicknessM
  const form = Math.log1p(thicknessM / radiusM) * (ownWPerMK / rangeWPerMK[1])
  return Math.min(radiusM * Math.expm1(form), BEYOND_ANY_M)
}

/** Between the two rows around a conductivity; the first row's below it; null above the last. */
function interpolatedM(rows: readonly CodeThicknessRow[], ownWPerMK: number): number | null {
  const points = rows.flatMap(({ rangeWPerMK, thicknessM }): Point[] =>
    rangeWPerMK === null ? [] : [[rangeWPerMK[1], thicknessM]],
  )
  const [first] = points
  return first && ownWPerMK <= first[0] ? first[1] : between(points, ownWPerMK)
}
