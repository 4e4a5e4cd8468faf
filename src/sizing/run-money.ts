import { yearlyEnergyCost, yearlyFuelKWh } from '#money/energy-cost.ts'
import { presentValueFactor } from '#money/present-value.ts'
import type { MoneyTerms, Problem } from './problem.ts'
import type { Rated } from './rating.ts'
import type { Rating, RunMoney } from './result.ts'

/** Money of a run: its terms, its totals, and where cost alone would have gone. */
export function runMoney(
  problem: Problem,
  terms: MoneyTerms,
  bareRated: Rated,
  ladder: readonly Rating[],
  chosenRated: Rated | null,
): RunMoney | null {
  const chosen = chosenRated?.rating ?? null
  const priced = ladder.filter((rung) => rung.money !== null)
  const cost = (rung: Rating): number => rung.money?.lifeCycle ?? Number.POSITIVE_INFINITY
  const cheapest = priced.length > 0 ? priced.reduce((a, b) => (cost(b) < cost(a) ? b : a)) : null
  if (!cheapest && !chosen) return null
  const { extent } = problem
  const bareFlow = bareRated.yearlyFlowPerUnit
  const chosenFlow = chosenRated?.yearlyFlowPerUnit ?? null
  const installed = chosen?.money?.installed ?? null
  const bareTotalW = bareRated.rating.yearlyMeanLossW
  const chosenTotalW = chosen?.yearlyMeanLossW ?? null
  const costOf = (flow: number): number => yearlyEnergyCost(flow, terms.energy)
  const installedTotal = installed === null || extent === null ? null : installed * extent
  const savingPerUnit = chosenFlow === null ? null : costOf(bareFlow) - costOf(chosenFlow)
  const savingStraight = savingPerUnit === null || extent === null ? null : savingPerUnit * extent
  const savingWithFittings =
    chosenTotalW === null || bareTotalW === null ? null : costOf(bareTotalW) - costOf(chosenTotalW)
  // A saving belongs to a price: that of fittings whose lagging has none is left out.
  const savingTotal = hasUnpricedFittings(problem) ? savingStraight : savingWithFittings
  const co2KgPerYear = (totalW: number): number | null =>
    terms.co2KgPerKWh === null ? null : yearlyFuelKWh(totalW, terms.energy) * terms.co2KgPerKWh
  const bareCo2Kg = bareTotalW === null ? null : co2KgPerYear(bareTotalW)
  const chosenCo2Kg = chosenTotalW === null ? null : co2KgPerYear(chosenTotalW)
  return {
    currency: terms.currency,
    per: bareRated.states.loss.unit,
    hoursPerYear: terms.energy.hoursPerYear,
    fuel: terms.fuelName,
    fuelPricePerKWh: terms.energy.fuelPricePerKWh,
    efficiency: bareFlow < 0 ? terms.energy.cop : terms.energy.efficiency,
    discount: terms.discount,
    growth: terms.growth,
    lifeYears: terms.lifeYears,
    presentValueFactor: presentValueFactor(terms),
    bareEnergyPerYear: costOf(bareFlow),
    installedTotal,
    savingPerYearTotal: savingTotal,
    paybackYears: paybackYears(installedTotal ?? installed, savingTotal ?? savingPerUnit),
    co2KgPerYear: chosenCo2Kg,
    co2SavedKgPerYear: bareCo2Kg === null || chosenCo2Kg === null ? null : bareCo2Kg - chosenCo2Kg,
    cheapestThicknessM: cheapest?.thicknessM ?? null,
    withinTwoPercentM: chosen ? flatRange(ladder, chosen) : null,
  }
}

/** Fittings that are lagged with the run: the prices held are those of a straight metre. */
export const hasUnpricedFittings = ({ fittings }: Problem): boolean =>
  !fittings.areBare && fittings.laggedLengthM > 0

/** Null where nothing is saved, or next to nothing. */
function paybackYears(installed: number | null, saving: number | null): number | null {
  if (installed === null || saving === null || saving <= 0) return null
  const years = installed / saving
  return Number.isFinite(years) ? years : null
}

/** Smallest and largest passing thickness that cost at most 2 % more than the chosen one. */
function flatRange(ladder: readonly Rating[], chosen: Rating): readonly [number, number] | null {
  if (!chosen.money) return null
  const most = chosen.money.lifeCycle * 1.02
  const near = ladder.filter(
    (rung) => rung.pass && rung.money !== null && rung.money.lifeCycle <= most,
  )
  const first = near[0]
  const last = near[near.length - 1]
  return first && last ? [first.thicknessM, last.thicknessM] : null
}
