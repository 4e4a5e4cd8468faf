/** Life-cycle cost of volume-priced lagging under one film coefficient, which can be worked out by hand. */
import { type EnergyTerms, yearlyEnergyCost } from '#money/energy-cost.ts'
import { installedCost } from '#money/installed-cost.ts'
import { presentValueFactor } from '#money/present-value.ts'

const from = { source: 'test', confidence: 'estimate' } as const
const labour = { ...from, ratePerHour: 0, layerFactors: [1], currency: 'units' }

export interface Case {
  readonly perM3: number
  readonly perM?: number
  readonly energy: EnergyTerms
  readonly discount: number
  readonly lifeYears: number
}

export function lifeCycle(money: Case, volumeM3: number, heatW: number): number {
  const price = {
    ...from,
    materialId: 'm',
    perM3: money.perM3,
    perM2: 0,
    perM: money.perM ?? 0,
    labourHoursPerM: 0,
    labourHoursPerM2: 0,
    wasteFraction: 0,
  }
  const installed = installedCost([{ price, volumeM3, outerAreaM2: 0, pieces: 1 }], null, labour)
  const factor = presentValueFactor({ ...money, growth: 0 })
  return installed + yearlyEnergyCost(heatW, money.energy) * factor
}

/** The thickness of least cost, on a ladder of hundredths of a millimetre [m]. */
export function leastM(cost: (thicknessM: number) => number): number {
  let best = 1e-5
  for (let step = 1; step <= 40_000; step += 1) {
    if (cost(step * 1e-5) < cost(best)) best = step * 1e-5
  }
  return best
}

/** Heat flow through a lagged pipe with one film coefficient [W/m]. */
export function pipeW(
  pipe: { D: number; lambda: number; h: number; dT: number },
  thicknessM: number,
): number {
  const De = pipe.D + 2 * thicknessM
  return (Math.PI * pipe.dT) / (Math.log(De / pipe.D) / (2 * pipe.lambda) + 1 / (pipe.h * De))
}
export const pipeM3 = (D: number, thicknessM: number): number =>
  (Math.PI / 4) * ((D + 2 * thicknessM) ** 2 - D ** 2)

export const perYear = (fuelPricePerKWh: number, hoursPerYear: number): EnergyTerms => ({
  fuelPricePerKWh,
  efficiency: 1,
  cop: 1,
  hoursPerYear,
})
