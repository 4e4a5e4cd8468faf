/** Installed cost and cost over the life, for one unit of the run: a metre, a square metre, or the whole. */
import type { FinishPrice, PriceModel } from '#catalogue/types.ts'
import { yearlyEnergyCost } from '#money/energy-cost.ts'
import { layerFactor } from '#money/installed-cost.ts'
import { presentValueFactor } from '#money/present-value.ts'
import type { Settled } from '../build-up.ts'
import type { MoneyTerms, Problem } from '../problem.ts'
import type { Rating, RungMoney } from '../result.ts'
import { printNumber } from './digits.ts'
import { Ledger } from './ledger.ts'
import { sizeSteps } from './sizes.ts'
import type { Section, Table } from './types.ts'

const PRACTICE =
  'estimating practice, no single source; prices illustrative until you own a price book'

export interface MoneyWorking {
  readonly problem: Problem
  readonly settled: Settled
  readonly terms: MoneyTerms
  readonly money: RungMoney
  /** Heat flow to be made up for one unit, mean of the year [W]. */
  readonly yearlyFlowPerUnit: number
  readonly ladder: readonly Rating[]
}

export function moneySections(working: MoneyWorking): Section[] {
  return [installedSection(working), lifeSection(working)]
}

function installedSection({ problem, settled, terms, money }: MoneyWorking): Section {
  const { currency, labour } = terms
  const ledger = new Ledger('Money: installed cost', null)
  ledger.say(
    `Amounts in ${currency}, for a metre of run (a square metre of a flat surface, the whole of a sphere or vessel).`,
  )
  const parts: string[] = []
  if (settled.layers.length > 0) {
    ledger.given('Rate of labour', 'r', labour.ratePerHour, `${currency}/h`)
  }
  sizeSteps(ledger, problem.shape, settled)
  settled.layers.forEach(({ material, piecesM }, index) => {
    if (!material.price) return
    const layer = index + 1
    const pieces = Math.max(1, piecesM.length)
    ledger.given('Pieces laid over each other', `n_${layer}`, pieces, '')
    ledger.given('Factor on labour for so many', `k_${layer}`, layerFactor(labour, pieces), '')
    parts.push(layerCost(ledger, layer, material.price, currency))
  })
  const finishPrice = problem.finish?.price
  if (finishPrice && settled.layers.length > 0) {
    ledger.step('Area of the finish', 'A_f', `A_${settled.layers.length}`, 'm²')
    parts.push(finishCost(ledger, finishPrice, currency))
  }
  if (parts.length === 0)
    ledger.given('Installed cost: nothing is laid', 'C', money.installed, currency)
  else {
    ledger.step('Installed cost', 'C', parts.join(' + '), currency, {
      value: money.installed,
      source: PRACTICE,
    })
  }
  return ledger.section()
}

/** Material with waste, and labour, of one layer; gives the symbol. */
function layerCost(ledger: Ledger, layer: number, price: PriceModel, currency: string): string {
  const number = (value: number): string => printNumber(value, 12)
  ledger.step(
    `Material of layer ${layer}: by volume, by area and by piece, with waste`,
    `M_${layer}`,
    `(${number(price.perM3)} × V_${layer} + (${number(price.perM2)} × A_${layer} + ${number(price.perM)}) × n_${layer}) × (1 + ${number(price.wasteFraction)})`,
    currency,
  )
  ledger.step(
    `Labour of layer ${layer}`,
    `t_${layer}`,
    `(${number(price.labourHoursPerM)} + ${number(price.labourHoursPerM2)} × A_${layer}) × k_${layer}`,
    'h',
  )
  ledger.step(`Layer ${layer}, installed`, `C_${layer}`, `M_${layer} + t_${layer} × r`, currency)
  return `C_${layer}`
}

function finishCost(ledger: Ledger, price: FinishPrice, currency: string): string {
  const number = (value: number): string => printNumber(value, 12)
  ledger.step(
    'Material of the finish, with waste',
    'M_f',
    `${number(price.perM2)} × A_f × (1 + ${number(price.wasteFraction)})`,
    currency,
  )
  ledger.step(
    'Labour of the finish',
    't_f',
    `${number(price.labourHoursPerM)} + ${number(price.labourHoursPerM2)} × A_f`,
    'h',
  )
  ledger.step('Finish, installed', 'C_f', 'M_f + t_f × r', currency)
  return 'C_f'
}

function lifeSection({ terms, money, yearlyFlowPerUnit, ladder }: MoneyWorking): Section {
  const { currency, energy } = terms
  const ledger = new Ledger('Money: energy and cost over the life', null)
  ledger.given('Heat flow to be made up, mean of the year', 'Φ', yearlyFlowPerUnit, 'W')
  ledger.given('Hours in service', 't', energy.hoursPerYear, 'h')
  ledger.step('Heat in a year', 'E', 'abs(Φ) × t / 1000', 'kWh')
  ledger.given(
    yearlyFlowPerUnit < 0 ? 'Cold for each unit of electricity' : 'Efficiency of the heat source',
    'η',
    yearlyFlowPerUnit < 0 ? energy.cop : energy.efficiency,
    '',
  )
  ledger.given(
    `Price of the fuel (${terms.fuelName})`,
    'c',
    energy.fuelPricePerKWh,
    `${currency}/kWh`,
  )
  ledger.step('Energy in the first year', 'K', 'E / η × c', currency, {
    value: yearlyEnergyCost(yearlyFlowPerUnit, energy),
  })
  ledger.given('Discount rate a year', 'i', terms.discount, '')
  ledger.given('Growth of the fuel price a year', 'g', terms.growth, '')
  ledger.given('Life', 'n', terms.lifeYears, 'years')
  const ratio = ledger.step('What a year later costs today', 'w', '(1 + g) / (1 + i)', '')
  ledger.step(
    'Present-value factor: the sum of w to the power of each year',
    'F',
    Math.abs(1 - ratio) < 1e-6 ? 'n × w^((n + 1) / 2)' : 'w × (1 − w^n) / (1 − w)',
    '',
    {
      value: presentValueFactor(terms),
      source: 'common financial mathematics, payments at year end',
    },
  )
  ledger.given('Installed cost', 'C', money.installed, currency)
  ledger.step('Cost over the life', 'LCC', 'C + K × F', currency, { value: money.lifeCycle })
  ledger.table(ladderTable(ladder, currency))
  return ledger.section()
}

const amount = (value: number | undefined): string => value?.toFixed(2) ?? ''

function ladderTable(ladder: readonly Rating[], currency: string): Table {
  return {
    headers: [
      'Lagging mm',
      'Meets limits',
      `Installed ${currency}`,
      `Energy a year ${currency}`,
      `Life ${currency}`,
    ],
    rows: ladder.map(({ thicknessM, pass, money }) => [
      printNumber(thicknessM * 1000, 5),
      pass ? 'yes' : 'no',
      amount(money?.installed),
      amount(money?.energyPerYear),
      amount(money?.lifeCycle),
    ]),
  }
}
