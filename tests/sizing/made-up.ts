/** Rungs, limits and money made up by hand, and the reason that they give. */
import { type ReasonFacts, writeReason } from '#sizing/reason.ts'
import type { LimitName, LimitResult, LimitUnit, Rating, RunMoney } from '#sizing/result.ts'

export const limit = (
  name: LimitName,
  value: number,
  bound: number,
  own: Partial<LimitResult> & { readonly unit?: LimitUnit } = {},
): LimitResult => ({
  limit: name,
  pass: value <= bound,
  value,
  rule: 'at most',
  bound,
  unit: name === 'loss' ? 'W/m' : '°C',
  condition: name === 'touch' ? 'touch' : 'loss',
  what: name === 'loss' ? 'heat flow per metre' : 'surface',
  ...own,
})

export const rung = (
  thicknessMm: number,
  limits: readonly LimitResult[],
  lifeCycle: number | null = null,
  nominalInch: number | null = null,
): Rating => ({
  thicknessM: thicknessMm / 1000,
  nominalThicknessM: nominalInch === null ? null : nominalInch * 0.0254,
  piecesM: [thicknessMm / 1000],
  outerDiameterM: null,
  heatLossWPerM: null,
  heatFluxWPerM2: 0,
  heatLossW: null,
  fittingsLossW: null,
  yearlyMeanLossW: null,
  yearlyKWh: null,
  surfaceTempC: 41.26,
  convectionWPerM2K: 0,
  radiationWPerM2K: 0,
  interfaceTempsC: [],
  touchSurfaceC: 0,
  timeToFreezeH: null,
  arrivalTempC: null,
  condensateKgPerS: null,
  limits,
  pass: limits.every(({ pass }) => pass),
  money: lifeCycle === null ? null : { installed: 0, energyPerYear: 0, lifeCycle },
})

export const moneyOf = (own: Partial<RunMoney>): RunMoney => ({
  currency: 'EUR',
  per: 'm',
  hoursPerYear: 8000,
  fuel: 'gas',
  fuelPricePerKWh: 0.1,
  efficiency: 0.9,
  discount: 0.05,
  growth: 0,
  lifeYears: 20,
  presentValueFactor: 12,
  bareEnergyPerYear: 1,
  installedTotal: null,
  savingPerYearTotal: null,
  paybackYears: null,
  co2KgPerYear: null,
  co2SavedKgPerYear: null,
  cheapestThicknessM: null,
  withinTwoPercentM: null,
  ...own,
})

export function reason(
  governing: ReasonFacts['governing'],
  ladder: readonly Rating[],
  chosenMm: number | null,
  own: Partial<ReasonFacts> = {},
): string {
  const bare = rung(0, [])
  const chosen = ladder.find(({ thicknessM }) => thicknessM * 1000 === chosenMm) ?? null
  return writeReason({
    bare,
    chosen: chosenMm === 0 ? bare : chosen,
    governing,
    ladder,
    limits: chosen?.limits ?? [],
    money: null,
    mattThicknessM: null,
    unmet: [],
    ...own,
  })
}
