/** What a run loses in a year, bare and as built: the answer of the command `loss`. SI; heat flow positive outwards. */
import { type EnergyTerms, yearlyEnergyCost, yearlyFuelKWh, yearlyKWh } from '#money/energy-cost.ts'
import type { MoneyTerms } from '#sizing/problem.ts'
import type { Note, Rating, RunResult } from '#sizing/result.ts'
import type { RunValues } from './fields.ts'
import { notesOfLoss, WHOLE_YEAR_H } from './loss-notes.ts'
import { Findings } from './resolve/findings.ts'
import type { CatalogueIndex } from './resolve/index-catalogue.ts'
import { resolveMoney } from './resolve/money.ts'
import type { Built, YearlyLoss } from './yearly-loss.ts'

export interface RunLoss {
  readonly tag: string
  readonly built: Built
  readonly thicknessM: number
  readonly nominalThicknessM: number | null
  readonly hoursPerYear: number
  readonly fuel: string | null
  readonly currency: string | null
  readonly bare: YearlyLoss
  readonly asBuilt: YearlyLoss
  readonly saved: Saved
  readonly notes: readonly Note[]
}

/** Bare less as built, of a year. */
export interface Saved {
  readonly heatKWh: number | null
  readonly cost: number | null
  readonly co2Kg: number | null
}

/** The values are those the run was sized with, the defaults of the job included. */
export function lossOfRun(values: RunValues, result: RunResult, index: CatalogueIndex): RunLoss {
  const hoursPerYear = values.hoursPerYear ?? WHOLE_YEAR_H
  const terms = fuelTerms({ ...values, hoursPerYear }, index)
  const { rating, built } = builtOf(result)
  const bare = yearlyLoss(result.bare, hoursPerYear, terms)
  const asBuilt = yearlyLoss(rating, hoursPerYear, terms)
  return {
    tag: result.tag,
    built,
    thicknessM: rating.thicknessM,
    nominalThicknessM: rating.nominalThicknessM,
    hoursPerYear,
    fuel: terms?.fuelName ?? null,
    currency: terms?.currency ?? null,
    bare,
    asBuilt,
    saved: {
      heatKWh: less(bare.heatKWh, asBuilt.heatKWh),
      cost: less(bare.cost, asBuilt.cost),
      co2Kg: less(bare.co2Kg, asBuilt.co2Kg),
    },
    notes: notesOfLoss({ values, result, built, terms, bare, asBuilt }),
  }
}

/** What the heat costs, whether or not the cost was weighed in sizing; null where no fuel or no price is known. */
function fuelTerms(values: RunValues, index: CatalogueIndex): MoneyTerms | null {
  return resolveMoney({ ...values, money: true }, false, index, new Findings())
}

function builtOf(result: RunResult): { readonly rating: Rating; readonly built: Built } {
  const { chosen, governing, ladder, bare } = result
  if (chosen) {
    const built = governing === 'fixed' || governing === 'bare' ? governing : 'chosen'
    return { rating: chosen, built }
  }
  const thickest = ladder.at(-1)
  return thickest ? { rating: thickest, built: 'thickest' } : { rating: bare, built: 'bare' }
}

function yearlyLoss(rating: Rating, hoursPerYear: number, terms: MoneyTerms | null): YearlyLoss {
  const { heatLossWPerM, heatFluxWPerM2, heatLossW, yearlyMeanLossW } = rating
  const of = (figure: (meanW: number) => number | null): number | null =>
    yearlyMeanLossW === null ? null : figure(yearlyMeanLossW)
  const energy: EnergyTerms | null = terms?.energy ?? null
  const co2KgPerKWh = terms?.co2KgPerKWh ?? null
  return {
    heatLossWPerM,
    heatFluxWPerM2,
    heatLossW,
    yearlyMeanLossW,
    heatKWh: of((meanW) => yearlyKWh(meanW, hoursPerYear)),
    cost: of((meanW) => (energy ? yearlyEnergyCost(meanW, energy) : null)),
    co2Kg: of((meanW) =>
      energy && co2KgPerKWh !== null ? yearlyFuelKWh(meanW, energy) * co2KgPerKWh : null,
    ),
  }
}

/**
 * Whether the run has to be cooled to make up for what comes in. One that is hotter than its air has not, however much
 * the sun brings.
 */
export const gainsHeat = ({ bare }: RunLoss): boolean => (bare.yearlyMeanLossW ?? 0) < 0

const less = (bare: number | null, asBuilt: number | null): number | null =>
  bare === null || asBuilt === null ? null : bare - asBuilt
