/** Money of one rung: installed cost and energy, per metre of run or per m² of a flat surface. */
import { type EnergyTerms, yearlyEnergyCost } from '#money/energy-cost.ts'
import { installedCost, type PricedLayer } from '#money/installed-cost.ts'
import { presentValueFactor } from '#money/present-value.ts'
import type { Shape } from '#solver/types.ts'
import type { Settled } from './build-up.ts'
import type { MoneyTerms, Problem } from './problem.ts'
import type { RungMoney } from './result.ts'

/** Cross-section of the bare shape grown by a thickness: perimeter [m] and area [m²]; per m² for a flat surface. */
function grown(shape: Shape, thicknessM: number): { perimeterM: number; areaM2: number } {
  switch (shape.kind) {
    case 'pipe': {
      const diameterM = shape.outerDiameterM + 2 * thicknessM
      return { perimeterM: Math.PI * diameterM, areaM2: (Math.PI * diameterM * diameterM) / 4 }
    }
    case 'rect-duct': {
      const widthM = shape.widthM + 2 * thicknessM
      const heightM = shape.heightM + 2 * thicknessM
      return { perimeterM: 2 * (widthM + heightM), areaM2: widthM * heightM }
    }
    case 'flat':
      return { perimeterM: 1, areaM2: thicknessM }
  }
}

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
      volumeM3: outer.areaM2 - inner.areaM2,
      outerAreaM2: outer.perimeterM,
      pieces: Math.max(1, piecesM.length),
    })
  }
  if (problem.finish && !problem.finish.price) return null
  const finish = problem.finish?.price
    ? { price: problem.finish.price, outerAreaM2: grown(problem.shape, depthM).perimeterM }
    : null
  return installedCost(priced, finish, terms.labour)
}

/** Heat flow per metre of run, or per m² of a flat surface [W/m or W/m²]. */
export const flowPerUnit = (rating: {
  readonly heatLossWPerM: number | null
  readonly heatFluxWPerM2: number
}): number => rating.heatLossWPerM ?? rating.heatFluxWPerM2

export function rungMoney(
  problem: Problem,
  settled: Settled,
  terms: MoneyTerms,
  heatFlow: number,
): RungMoney | null {
  const installed = installedCostOf(problem, settled, terms)
  if (installed === null) return null
  const energyPerYear = energyCost(heatFlow, terms.energy)
  return {
    installed,
    energyPerYear,
    lifeCycle: installed + energyPerYear * presentValueFactor(terms),
  }
}

export const energyCost = (heatFlow: number, energy: EnergyTerms): number =>
  yearlyEnergyCost(heatFlow, energy)
