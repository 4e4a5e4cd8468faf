/** What the run loses in a year: heat, fuel, money and CO2. */
import { yearlyEnergyCost, yearlyFuelKWh, yearlyKWh } from '#money/energy-cost.ts'
import type { Settled } from '../build-up.ts'
import type { Problem } from '../problem.ts'
import { isMadeUp, MONTH_DAYS, madeUpWay, runLoss, yearlyRunLossW } from '../run-loss.ts'
import type { States } from '../states.ts'
import { printNumber } from './digits.ts'
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
    wholeYearSteps(ledger, working, meanW)
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

/** The loss at the loss condition stands for the whole year, as far as it has to be made up. */
function wholeYearSteps(ledger: Ledger, working: YearWorking, meanW: number): void {
  const lossW = lossAtCondition(working)
  if (lossW === meanW) {
    ledger.given('Loss of the run, which stands for the whole year', 'Q', meanW, 'W')
    return
  }
  ledger.say(
    'The sun turns the flow of heat round. What it brings needs no making up and counts as nothing.',
  )
  ledger.given('Loss of the run, as above', 'Q_0', lossW, 'W')
  ledger.step('What of it has to be made up', 'Q', `${lossW < 0 ? 'max' : 'min'}(0, Q_0)`, 'W', {
    value: meanW,
  })
}

const lossAtCondition = ({ problem, settled, states, bareStates }: YearWorking): number =>
  runLoss(problem, settled, states.loss, bareStates.loss)?.totalW ?? 0

function monthSteps(ledger: Ledger, working: YearWorking, meanW: number): void {
  const { problem, settled, states, bareStates } = working
  const way = madeUpWay(problem, lossAtCondition(working))
  ledger.say(
    'Each month is solved like the loss condition, with the air of that month; surroundings stay as far from the air as they are over the year. A month in which heat flows the other way needs no making up and counts as nothing.',
  )
  const losses = states.months.map(
    (state, index) =>
      runLoss(problem, settled, state, bareStates.months[index] ?? bareStates.loss)?.totalW ?? 0,
  )
  losses.forEach((lossW, index) => {
    const other = isMadeUp(lossW, way) ? '' : ', in which heat flows the other way'
    ledger.given(`${MONTHS[index] ?? 'Month'}${other}`, `Q_${index + 1}`, lossW, 'W')
  })
  const isMixed = losses.some((lossW) => !isMadeUp(lossW, way))
  const only = way < 0 ? 'min' : 'max'
  const terms = losses.map((_, index) => {
    const symbol = `Q_${index + 1}`
    return `${MONTH_DAYS[index]} × ${isMixed ? `${only}(0, ${symbol})` : symbol}`
  })
  ledger.step('Mean of the year', 'Q', `(${terms.join(' + ')}) / 365`, 'W', { value: meanW })
  ledger.table({
    headers: ['Month', 'Air °C', 'Days', 'Share', 'Loss W', 'Counts as W'],
    rows: losses.map((lossW, index) => {
      const days = MONTH_DAYS[index] ?? 0
      const airC = problem.conditions.months[index]?.around.airC ?? 0
      return [
        MONTHS[index] ?? '',
        printNumber(airC, 4),
        String(days),
        printNumber(days / 365, 4),
        printNumber(lossW, 5),
        printNumber(isMadeUp(lossW, way) ? lossW : 0, 5),
      ]
    }),
  })
}
