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
  noteOtherWay(values, gainsHeat, findings)
  const missing = missingToWeigh(values, gainsHeat)
  if (!(values.money ?? missing.length === 0)) {
    if (values.money === undefined && namesEnergy(values))
      findings.note(
        'money-not-weighed',
        `The cost is not weighed. For that, give ${missing.join(' and ')}.`,
      )
    return null
  }
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

/** A price of energy stands for a fuel only with what it is turned into heat or cold by. */
function missingToWeigh(values: RunValues, gainsHeat: boolean): readonly string[] {
  const { fuel, fuelPricePerKWh, hoursPerYear } = values
  const share = gainsHeat ? 'cop' : 'efficiency'
  const missing: string[] = []
  if (fuel === undefined && fuelPricePerKWh === undefined) missing.push('fuel')
  else if (fuel === undefined && values[share] === undefined) missing.push(`${share} or fuel`)
  return hoursPerYear === undefined ? [...missing, 'hours_per_year'] : missing
}

/** Hours alone serve the yearly heat, and terms of the job serve other runs: only energy is named to weigh its cost. */
const namesEnergy = ({ fuel, fuelPricePerKWh }: RunValues): boolean =>
  fuel !== undefined || fuelPricePerKWh !== undefined

/** Beside each other they may be terms of a job, of which each run uses its own. */
function noteOtherWay(
  { efficiency, cop }: RunValues,
  gainsHeat: boolean,
  findings: Findings,
): void {
  if (gainsHeat && efficiency !== undefined && cop === undefined)
    findings.note('unused', 'efficiency is not used: the run gains heat, which cop prices.')
  if (!gainsHeat && cop !== undefined && efficiency === undefined)
    findings.note('unused', 'cop is not used: the run loses heat, which efficiency prices.')
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
