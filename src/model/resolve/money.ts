/** Whether the cost is weighed, and on what terms. */
import type { MoneyTerms } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'

/** Terms taken where none are given; each is said in a note. Source: a judgement, for the user to replace. */
export const usualMoney = { discount: 0.08, growth: 0.02, lifeYears: 15, cop: 3 }

export function resolveMoney(
  values: RunValues,
  gainsHeat: boolean,
  index: CatalogueIndex,
  findings: Findings,
): MoneyTerms | null {
  const fuel = values.fuel === undefined ? null : index.fuel(values.fuel)
  if (fuel && !fuel.ok) findings.fault('fuel', values.fuel ?? '', fuel.message)
  const canWeigh = values.fuel !== undefined && values.hoursPerYear !== undefined
  if (!(values.money ?? canWeigh)) return null
  if (values.hoursPerYear === undefined) {
    findings.fault(
      'hoursPerYear',
      'nothing',
      'the running hours a year, since the cost is to be weighed',
    )
  }
  if (!fuel && values.fuelPricePerKWh === undefined) {
    findings.fault(
      'fuel',
      'nothing',
      'a fuel of the catalogue, or fuel_price_per_kwh and efficiency',
    )
  }
  const row = fuel?.ok ? fuel.item : null
  const fuelPricePerKWh = values.fuelPricePerKWh ?? row?.pricePerKWh ?? null
  if (row && fuelPricePerKWh === null) {
    findings.fault(
      'fuelPricePerKWh',
      'nothing',
      `a price per kWh: the catalogue holds none for ${row.name}`,
    )
  }
  if (values.hoursPerYear === undefined || fuelPricePerKWh === null) return null
  noteTerms(values, row?.name ?? null, fuelPricePerKWh, row?.efficiency ?? 1, gainsHeat, findings)
  return {
    energy: {
      fuelPricePerKWh,
      efficiency: values.efficiency ?? row?.efficiency ?? 1,
      cop: values.cop ?? usualMoney.cop,
      hoursPerYear: values.hoursPerYear,
    },
    fuelName: row?.name ?? 'fuel',
    co2KgPerKWh: row?.co2KgPerKWh ?? null,
    currency: values.currency ?? index.catalogue.labour.currency,
    discount: values.discount ?? usualMoney.discount,
    growth: values.growth ?? usualMoney.growth,
    lifeYears: values.lifeYears ?? usualMoney.lifeYears,
    labour: index.catalogue.labour,
  }
}

function noteTerms(
  values: RunValues,
  fuelName: string | null,
  fuelPricePerKWh: number,
  efficiency: number,
  gainsHeat: boolean,
  findings: Findings,
): void {
  findings.note(
    'prices-illustrative',
    'Material and labour prices are illustrative: put your own price book in their place before you quote.',
  )
  const assumed: string[] = []
  if (values.fuelPricePerKWh === undefined) {
    assumed.push(`${fuelName ?? 'fuel'} at ${plain(fuelPricePerKWh, 4)} per kWh (illustrative)`)
  }
  if (gainsHeat) {
    if (values.cop === undefined) assumed.push(`a cooling COP of ${usualMoney.cop}`)
  } else if (values.efficiency === undefined) {
    assumed.push(`an efficiency of ${plain(efficiency, 2)}`)
  }
  if (values.discount === undefined)
    assumed.push(`a discount rate of ${plain(usualMoney.discount * 100)} %`)
  if (values.growth === undefined)
    assumed.push(`a price growth of ${plain(usualMoney.growth * 100)} % a year`)
  if (values.lifeYears === undefined) assumed.push(`a life of ${usualMoney.lifeYears} years`)
  if (assumed.length > 0)
    findings.note('money-assumed', `Cost is weighed with ${assumed.join(', ')}.`)
}
