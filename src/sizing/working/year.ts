/** What the run loses in a year: heat, fuel, money and CO2. */
import { yearlyEnergyCost, yearlyFuelKWh, yearlyKWh } from '#money/energy-cost.ts'
import type { Settled } from '../build-up.ts'
import type { Problem } from '../problem.ts'
import { isMadeUp, MONTH_DAYS, runLoss, yearlyRunLossW } from '../run-loss.ts'
import type { States } from '../states.ts'
import { Ledger } from './ledger.ts'
import type { Section } from './types.ts'

export interface YearWorking {
  readonly problem: Problem
  readonly settled: Settled
  readonly states: States
  readonly bareStates: States
  readonly title: string
}

/** Null where the length is not known. */
export function yearSection(working: YearWorking): Section | null {
  const { problem, settled, states, bareStates, title } = working
  const meanW = yearlyRunLossW(problem, settled, states, bareStates)
  if (meanW === null) return null
  const ledger = new Ledger(`${title}: the year`, null)
  if (states.months.length === 0) {
    ledger.given('Loss of the run, which stands for the whole year', 'Q', meanW, 'W')
  } else monthSteps(ledger, working, meanW)
  const { hoursPerYear, money } = problem
  if (hoursPerYear === null) {
    ledger.say('Hours in service are not given: there is no heat of a year.')
    return ledger.section()
  }
  ledger.given('Hours in service', 't', hoursPerYear, 'h')
  ledger.step('Heat in a year', 'E', 'abs(Q) × t / 1000', 'kWh', {
    value: yearlyKWh(meanW, hoursPerYear),
  })
  if (!money) return ledger.section()
  const { energy, currency, co2KgPerKWh } = money
  ledger.given(
    meanW < 0 ? 'Cold for each unit of electricity' : 'Efficiency of the heat source',
    'η',
    meanW < 0 ? energy.cop : energy.efficiency,
    '',
  )
  ledger.step(`Fuel in a year (${money.fuelName})`, 'E_f', 'E / η', 'kWh', {
    value: yearlyFuelKWh(meanW, energy),
  })
  ledger.given('Price of the fuel', 'c', energy.fuelPricePerKWh, `${currency}/kWh`)
  ledger.step('Cost of a year', 'K', 'E_f × c', currency, {
    value: yearlyEnergyCost(meanW, energy),
  })
  if (co2KgPerKWh !== null) {
    ledger.given('CO2 of the fuel', 'e', co2KgPerKWh, 'kg/kWh')
    ledger.step('CO2 of a year', 'm_CO2', 'E_f × e', 'kg')
  }
  return ledger.section()
}

const MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
]

function monthSteps(
  ledger: Ledger,
  { problem, settled, states, bareStates }: YearWorking,
  meanW: number,
): void {
  const yearlyW = runLoss(problem, settled, states.loss, bareStates.loss)?.totalW ?? 0
  ledger.say(
    'Each month is solved like the loss condition, with the air of that month. A month in which heat flows the other way needs no making up and counts as nothing.',
  )
  states.months.forEach((state, index) => {
    const bareState = bareStates.months[index] ?? bareStates.loss
    const lossW = runLoss(problem, settled, state, bareState)?.totalW ?? 0
    const counts = isMadeUp(lossW, yearlyW)
    ledger.given(
      `${MONTHS[index] ?? 'Month'}${counts ? '' : ', in which heat flows the other way'}`,
      `Q_${index + 1}`,
      counts ? lossW : 0,
      'W',
    )
  })
  const terms = states.months.map((_, index) => `${MONTH_DAYS[index]} × Q_${index + 1}`)
  ledger.step('Mean of the year', 'Q', `(${terms.join(' + ')}) / 365`, 'W', { value: meanW })
}
