/** What is to be said beside the loss of a run: what it rests on, and of the notes of sizing those that bear on it. */
import type { MoneyTerms } from '#sizing/problem.ts'
import type { Note, RunResult } from '#sizing/result.ts'
import type { RunValues } from './fields.ts'
import { plain } from './resolve/findings.ts'
import type { Built, YearlyLoss } from './yearly-loss.ts'

/** Hours of a year, taken where none are given: the run is in service all the time. */
export const WHOLE_YEAR_H = 8760

/** Notes of sizing that say nothing of what is lost: of limits that are not judged here, of choosing, and of how to lay. */
const besideTheLoss: ReadonlySet<string> = new Set([
  // Touch.
  'contact-assumed',
  'out-of-reach',
  'reach-assumed',
  'threshold-missing',
  'threshold-recalled',
  'threshold-stricter',
  'touch-air-assumed',
  'touch-class-assumed',
  'touch-surroundings',
  // Damp and vapour.
  'cold-projections',
  'damp-air-assumed',
  'damp-not-judged',
  'damp-surroundings',
  'dew-margin-assumed',
  'humidity-over-ice',
  'vapour-open',
  'vapour-stops',
  'vapour-thin',
  'vapour-unknown',
  'vapour-wrong-side',
  // Frost, arrival, code, service.
  'arrival-unknown',
  'code-asks-nothing',
  'code-factor',
  'code-mean-assumed',
  'code-nominal-assumed',
  'code-recalled',
  'code-table',
  'flow-by-velocity',
  'frost-air-assumed',
  'frost-fraction-assumed',
  'frost-never',
  'frost-start-assumed',
  'frost-water-assumed',
  'heat-capacity',
  'service-heed',
  'service-unknown',
  // The cost as it is weighed; what the energy is priced with has a note of its own.
  'money-assumed',
  'money-not-weighed',
  'price-missing',
  'prices-illustrative',
  // How to lay it.
  'cladding-spacers',
  'form-unusual',
  'nesting',
  // What was measured.
  'survey-assumed',
])

export interface LossShown {
  readonly values: RunValues
  readonly result: RunResult
  readonly built: Built
  readonly terms: MoneyTerms | null
  readonly bare: YearlyLoss
  readonly asBuilt: YearlyLoss
}

export function notesOfLoss(shown: LossShown): readonly Note[] {
  const { values, result, built, bare } = shown
  const notes: Note[] = []
  if (values.hoursPerYear === undefined) {
    notes.push({
      code: 'hours-assumed',
      text: `The hours in service are not given: ${WHOLE_YEAR_H} h are taken, the whole year.`,
    })
  }
  const priced = pricedWith(shown)
  if (priced.length > 0) {
    notes.push({ code: 'energy-assumed', text: `The energy is priced with ${listed(priced)}.` })
  }
  if (bare.heatLossW === null) {
    notes.push({
      code: 'not-in-total',
      text: 'The length is not given: the run is listed, and not in the total.',
    })
  }
  if (built === 'thickest') {
    notes.push({
      code: 'built-thickest',
      text: 'No thickness meets every limit: as built is the thickest that can be bought.',
    })
  }
  if (isTurned(bare) || isTurned(shown.asBuilt)) {
    notes.push({
      code: 'sun-brings-more',
      text: 'The sun brings in more heat than goes out: nothing has to be made up, and the year counts as nothing.',
    })
  }
  return [...notes, ...result.notes.filter(({ code }) => !besideTheLoss.has(code))]
}

const isTurned = ({ heatLossW, yearlyMeanLossW }: YearlyLoss): boolean =>
  yearlyMeanLossW === 0 && heatLossW !== null && heatLossW !== 0

/** Everything in the cost and the CO2 that was not given with the run. */
function pricedWith({ values, terms, bare, asBuilt }: LossShown): string[] {
  if (terms === null) return []
  const { energy, fuelName, co2KgPerKWh, currency } = terms
  const means = [bare, asBuilt].map(({ yearlyMeanLossW }) => yearlyMeanLossW ?? 0)
  const gains = means.some((meanW) => meanW < 0)
  const loses = means.some((meanW) => meanW > 0) || !gains
  const assumed: string[] = []
  if (values.fuelPricePerKWh === undefined) {
    const price = `${plain(energy.fuelPricePerKWh, 4)} ${currency}/kWh`
    assumed.push(`${fuelName} at ${price} (illustrative)`)
  }
  if (loses && values.efficiency === undefined) {
    const none = values.fuel === undefined ? ' (none is given: fuel as useful heat)' : ''
    assumed.push(`an efficiency of ${plain(energy.efficiency, 2)}${none}`)
  }
  if (gains && values.cop === undefined) assumed.push(`a cooling COP of ${plain(energy.cop, 2)}`)
  if (co2KgPerKWh !== null) assumed.push(`${plain(co2KgPerKWh, 3)} kg of CO2 for each kWh of fuel`)
  return assumed
}

/** "a", "a and b", "a, b and c". */
function listed(parts: readonly string[]): string {
  const last = parts.at(-1) ?? ''
  return parts.length < 2 ? last : `${parts.slice(0, -1).join(', ')} and ${last}`
}
