/** Money of one rung: installed cost and energy, per metre of run, per m² of a flat surface, or per piece. */
import { yearlyEnergyCost } from '#money/energy-cost.ts'
import { installedCost, type PricedLayer } from '#money/installed-cost.ts'
import { presentValueFactor } from '#money/present-value.ts'
import { grown } from '#solver/index.ts'
import type { Settled } from './build-up.ts'
import type { MoneyTerms, Problem } from './problem.ts'
import type { RungMoney } from './result.ts'

/** Installed cost of a settled build-up; null where a price is missing (never zero). */
export function installedCostOf(
  problem: Problem,
  settled: Settled,
  terms: MoneyTerms,
): number | null {
  if (settled.layers.length === 0) return 0
  const priced: PricedLayer[] = []
  let depthM = 0
  for (const { material, thicknessM, piecesM } of settled.layers) {
    if (!material.price) return null
    const inner = grown(problem.shape, depthM)
    depthM += thicknessM ?? 0
    const outer = grown(problem.shape, depthM)
    priced.push({
      price: material.price,
      volumeM3: outer.volumeM3 - inner.volumeM3,
      outerAreaM2: outer.areaM2,
      pieces: Math.max(1, piecesM.length),
    })
  }
  if (problem.finish && !problem.finish.price) return null
  const finish = problem.finish?.price
    ? { price: problem.finish.price, outerAreaM2: grown(problem.shape, depthM).areaM2 }
    : null
  return installedCost(priced, finish, terms.labour)
}

export function rungMoney(
  problem: Problem,
  settled: Settled,
  terms: MoneyTerms,
  heatFlow: number,
): RungMoney | null {
  const installed = installedCostOf(problem, settled, terms)
  if (installed === null) return null
  const energyPerYear = yearlyEnergyCost(heatFlow, terms.energy)
  return {
    installed,
    energyPerYear,
    lifeCycle: installed + energyPerYear * presentValueFactor(terms),
  }
}
