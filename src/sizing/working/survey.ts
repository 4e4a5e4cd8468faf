/** Survey: from the surface as measured to what passes through it and how well the lagging conducts. */
import { fluxOf, wallOf } from '#solver/index.ts'
import type { System } from '#solver/types.ts'
import { settle } from '../build-up.ts'
import type { Problem, SurveyReading } from '../problem.ts'
import type { SurveyResult } from '../result.ts'
import { systemOf } from '../states.ts'
import { variations } from '../survey.ts'
import { Ledger } from './ledger.ts'
import { effectiveSteps, readings } from './survey-conductivity.ts'
import { readingSections } from './survey-films.ts'
import type { Section } from './types.ts'

/** The reading itself, what it says, and the same reading at each end of what may be believed. */
export function surveySections(problem: Problem, survey: SurveyResult | null): Section[] {
  const condition = problem.conditions.survey
  const { survey: reading } = problem
  if (condition === null || survey === null || reading === null) return []
  const system = systemOf(problem, settle(problem.layers, null), condition)
  const day = { system, surfaceTempC: survey.measuredSurfaceC }
  const ends = variations(day, reading).flatMap(({ low, high }, index) =>
    [low, high].flatMap((end, isHigh) =>
      readingSections({
        ...end,
        condition,
        title: `Survey, ${readings[index] ?? 'reading'} ${isHigh === 1 ? 'high' : 'low'}`,
        surfaceWords: index === 0 ? 'Surface, at that end' : 'Surface, as measured',
      }),
    ),
  )
  return [
    ...readingSections({
      ...day,
      condition,
      title: 'Survey',
      surfaceWords: 'Surface, as measured',
    }),
    ...ends,
    tellingSection(problem, reading, system, survey),
  ]
}

function tellingSection(
  problem: Problem,
  reading: SurveyReading,
  system: System,
  survey: SurveyResult,
): Section {
  const ledger = new Ledger('Survey: what it says', null)
  for (const { text } of survey.notes) ledger.say(text)
  const { unit } = fluxOf(system, survey.measuredSurfaceC)
  const wall = wallOf(system.shape, system.layers)
  wall.faces.forEach(({ share, side }, index) => {
    if (wall.faces.length > 1) ledger.given(`Share of the ${side}`, `a_${index + 1}`, share, '')
  })
  ledger.given('Flux on the outer area, as above', 'q', survey.heatFluxWPerM2.value, 'W/m²')
  uncertaintySteps(ledger, reading, system, survey)
  if (survey.heatLossWPerM !== null || survey.heatLossW !== null) {
    const area = unit === 'm' ? 'm²/m' : 'm²'
    ledger.given('Outer area', 'A', wall.outerAreaM2PerUnit, area)
    ledger.step('Loss of one unit', 'Φ', 'q × A', unit === 'm' ? 'W/m' : 'W')
  }
  if (survey.heatLossW !== null && problem.extent !== null) {
    ledger.given(
      unit === 'm' ? 'Length' : unit === 'm2' ? 'Area' : 'Pieces',
      'l',
      problem.extent,
      unit === 'm' ? 'm' : unit === 'm2' ? 'm²' : '',
    )
    ledger.step('Loss of the run, without fittings', 'Q', 'Φ × l', 'W', {
      value: survey.heatLossW.value,
    })
    ledger.step('How far that may be off', 'u_Q', 'u_q × A × l', 'W', {
      value: survey.heatLossW.plusMinus,
    })
  }
  effectiveSteps(ledger, system, reading, survey)
  if (survey.soundWPerMK !== null) {
    ledger.given(
      'Conductivity of the build-up as given, at the same two temperatures',
      'λ_n',
      survey.soundWPerMK,
      'W/(m·K)',
    )
  }
  if (survey.expectedSurfaceC !== null) {
    ledger.given('Surface that the run as given would have', 'θ_x', survey.expectedSurfaceC, '°C')
  }
  return ledger.section()
}

/** What the flux would be with each reading as far off as is believed, and the three together. */
function uncertaintySteps(
  ledger: Ledger,
  reading: SurveyReading,
  system: System,
  survey: SurveyResult,
): void {
  const day = { system, surfaceTempC: survey.measuredSurfaceC }
  const changes = variations(day, reading).map(({ low, high, share }, index) => {
    const at = index + 1
    const of = readings[index] ?? 'reading'
    const fluxOn = (end: typeof low): number => fluxOf(end.system, end.surfaceTempC).heatFluxWPerM2
    ledger.given(`Flux with the ${of} low, as above`, `q_${at}l`, fluxOn(low), 'W/m²')
    ledger.given(`Flux with the ${of} high, as above`, `q_${at}h`, fluxOn(high), 'W/m²')
    ledger.given('Share of their difference that is one half width', `w_${at}`, share, '')
    ledger.step(`What the ${of} changes`, `d_${at}`, `w_${at} × (q_${at}h − q_${at}l)`, 'W/m²')
    return `d_${at}^2`
  })
  ledger.step('How far the flux may be off', 'u_q', `sqrt(${changes.join(' + ')})`, 'W/m²', {
    value: survey.heatFluxWPerM2.plusMinus,
    source: 'independent errors: root of the sum of squares',
  })
}
