/** The losses of a list, summed: heat lost and heat gained apart, since the one does not make up for the other. */
import { gainsHeat, type RunLoss } from './run-loss.ts'

export interface LossSum {
  /** Runs that are in the sum. */
  readonly runs: number
  /** Positive outwards, at the loss condition [W]. */
  readonly bareHeatLossW: number
  readonly asBuiltHeatLossW: number
  /** What has to be made up, mean of the year [W]. */
  readonly bareYearlyMeanLossW: number
  readonly asBuiltYearlyMeanLossW: number
  readonly bareHeatKWh: number
  readonly asBuiltHeatKWh: number
  readonly savedHeatKWh: number
  /** One for each currency, since they do not add up. */
  readonly costs: readonly CostSum[]
  readonly bareCo2Kg: number
  readonly asBuiltCo2Kg: number
  readonly savedCo2Kg: number
}

export interface CostSum {
  readonly currency: string
  readonly bare: number
  readonly asBuilt: number
  readonly saved: number
}

export interface LossTotal {
  /** Runs that have to be heated when bare. */
  readonly lost: LossSum
  /** Runs that have to be cooled: their flows are negative. */
  readonly gained: LossSum
  /** Tags of runs without a length: in neither sum. */
  readonly withoutLength: readonly string[]
  /** Tags of runs whose heat is in a sum, and its cost is not, for want of a fuel. */
  readonly withoutFuel: readonly string[]
}

export function totalLoss(losses: readonly RunLoss[]): LossTotal {
  const counted = losses.filter(({ bare }) => bare.heatLossW !== null)
  return {
    lost: sumOf(counted.filter((loss) => !gainsHeat(loss))),
    gained: sumOf(counted.filter(gainsHeat)),
    withoutLength: losses.filter(({ bare }) => bare.heatLossW === null).map(({ tag }) => tag),
    withoutFuel: counted.filter(({ fuel }) => fuel === null).map(({ tag }) => tag),
  }
}

function sumOf(losses: readonly RunLoss[]): LossSum {
  const sum = (figure: (loss: RunLoss) => number | null): number =>
    losses.reduce((total, loss) => total + (figure(loss) ?? 0), 0)
  return {
    runs: losses.length,
    bareHeatLossW: sum(({ bare }) => bare.heatLossW),
    asBuiltHeatLossW: sum(({ asBuilt }) => asBuilt.heatLossW),
    bareYearlyMeanLossW: sum(({ bare }) => bare.yearlyMeanLossW),
    asBuiltYearlyMeanLossW: sum(({ asBuilt }) => asBuilt.yearlyMeanLossW),
    bareHeatKWh: sum(({ bare }) => bare.heatKWh),
    asBuiltHeatKWh: sum(({ asBuilt }) => asBuilt.heatKWh),
    savedHeatKWh: sum(({ saved }) => saved.heatKWh),
    costs: costsOf(losses),
    bareCo2Kg: sum(({ bare }) => bare.co2Kg),
    asBuiltCo2Kg: sum(({ asBuilt }) => asBuilt.co2Kg),
    savedCo2Kg: sum(({ saved }) => saved.co2Kg),
  }
}

function costsOf(losses: readonly RunLoss[]): CostSum[] {
  const byCurrency = new Map<string, { bare: number; asBuilt: number; saved: number }>()
  for (const { currency, bare, asBuilt, saved } of losses) {
    if (currency === null) continue
    const sum = byCurrency.get(currency) ?? { bare: 0, asBuilt: 0, saved: 0 }
    sum.bare += bare.cost ?? 0
    sum.asBuilt += asBuilt.cost ?? 0
    sum.saved += saved.cost ?? 0
    byCurrency.set(currency, sum)
  }
  return Array.from(byCurrency, ([currency, sum]) => ({ currency, ...sum }))
}
