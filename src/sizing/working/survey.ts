/** Survey: from the surface as measured to what passes through it and how well the lagging conducts. */
import { filmOf, fluxOf, radiates, radiationWPerM2K, wallOf, weatherOf } from '#solver/index.ts'
import type { Face, System } from '#solver/types.ts'
import { settle } from '../build-up.ts'
import type { Condition, Problem } from '../problem.ts'
import type { SurveyResult } from '../result.ts'
import { systemOf } from '../states.ts'
import { variations } from '../survey.ts'
import { filmSteps } from './film.ts'
import { Ledger } from './ledger.ts'
import { conditionWords } from './state.ts'
import type { Section } from './types.ts'

export function surveySections(problem: Problem, survey: SurveyResult | null): Section[] {
  const condition = problem.conditions.survey
  if (condition === null || survey === null) return []
  const system = systemOf(problem, settle(problem.layers, null), condition)
  const films = filmSections(system, condition, survey.measuredSurfaceC)
  return [...films, tellingSection(problem, system, survey)]
}

function filmSections(system: System, condition: Condition, measuredC: number): Section[] {
  const isBare = system.layers.length === 0
  return wallOf(system.shape, system.layers).faces.map((shape) => {
    const { airC, surroundingsC } = system.around
    const film = filmOf(shape, weatherOf(system), system.film, system.inclinedFilm)
    const excessK = measuredC - airC
    const convectionWPerM2K = film(excessK)
    const radiation = radiates(shape, system.film)
      ? radiationWPerM2K(system.emissivity, measuredC, surroundingsC)
      : 0
    const face: Face = {
      side: shape.side,
      surfaceTempC: measuredC,
      heatFluxWPerM2:
        convectionWPerM2K * excessK +
        radiation * (measuredC - surroundingsC) -
        system.sunAbsorbedWPerM2,
      convectionWPerM2K,
      radiationWPerM2K: radiation,
      interfaceTempsC: [],
      share: shape.share,
      closure: 'closed',
    }
    const of = shape.side === 'all round' ? '' : `, ${shape.side}`
    const ledger = new Ledger(`Survey: outer film${of}`, conditionWords(condition, isBare))
    filmSteps(ledger, {
      system,
      shape,
      face,
      sunWPerM2: condition.sunWPerM2,
      sky: condition.sky,
      solarAbsorptance: isBare ? condition.bareSolarAbsorptance : condition.solarAbsorptance,
      surfaceWords: 'Surface, as measured',
    })
    return ledger.section()
  })
}

function tellingSection(problem: Problem, system: System, survey: SurveyResult): Section {
  const ledger = new Ledger('Survey: what it says', null)
  for (const { text } of survey.notes) ledger.say(text)
  const { unit } = fluxOf(system, survey.measuredSurfaceC)
  const wall = wallOf(system.shape, system.layers)
  wall.faces.forEach(({ share, side }, index) => {
    if (wall.faces.length > 1) ledger.given(`Share of the ${side}`, `a_${index + 1}`, share, '')
  })
  ledger.given('Flux on the outer area, mean', 'q', survey.heatFluxWPerM2.value, 'W/m²')
  uncertaintySteps(ledger, problem, system, survey)
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
  conductivityLines(ledger, system, survey)
  if (survey.expectedSurfaceC !== null) {
    ledger.given('Surface that the run as given would have', 'θ_x', survey.expectedSurfaceC, '°C')
  }
  return ledger.section()
}

/** What the flux would be with each reading as far off as is believed, and the three together. */
function uncertaintySteps(
  ledger: Ledger,
  { survey: reading }: Problem,
  system: System,
  survey: SurveyResult,
): void {
  if (reading === null) return
  const day = { system, surfaceTempC: survey.measuredSurfaceC }
  const readings = ['thermometer', 'air', 'emissivity']
  const changes = variations(day, reading).map(({ low, high, share }, index) => {
    const at = index + 1
    const of = readings[index] ?? 'reading'
    const fluxOn = (of: typeof low): number => fluxOf(of.system, of.surfaceTempC).heatFluxWPerM2
    ledger.given(
      `Flux with the ${of} at the low end of what is believed`,
      `q_${at}l`,
      fluxOn(low),
      'W/m²',
    )
    ledger.given(`Flux with the ${of} at the high end`, `q_${at}h`, fluxOn(high), 'W/m²')
    ledger.given('Share of their difference that is one half width', `w_${at}`, share, '')
    ledger.step(`What the ${of} changes`, `d_${at}`, `w_${at} × (q_${at}h − q_${at}l)`, 'W/m²')
    return `d_${at}^2`
  })
  ledger.step('How far the flux may be off', 'u_q', `sqrt(${changes.join(' + ')})`, 'W/m²', {
    value: survey.heatFluxWPerM2.plusMinus,
    source: 'independent errors: root of the sum of squares',
  })
}

function conductivityLines(ledger: Ledger, system: System, survey: SurveyResult): void {
  const { effectiveWPerMK, soundWPerMK } = survey
  if (effectiveWPerMK !== null) {
    const words = 'Conductivity that the lagging as it stands must have'
    const { value } = effectiveWPerMK
    const [shape] = wallOf(system.shape, system.layers).faces
    if (system.shape.kind === 'vessel' || !shape) ledger.given(words, 'λ', value, 'W/(m·K)')
    else {
      const form = shape.formsM.reduce((sum, formM) => sum + formM, 0)
      ledger.given('Medium on the day', 'θ_i', system.mediumC, '°C')
      ledger.given('Surface, as measured', 'θ_s', survey.measuredSurfaceC, '°C')
      ledger.given('Form of all layers', 'F', form, 'm')
      const inside = system.insideFilmWPerM2K
      if (inside !== null) {
        ledger.given('Outer area over inner area', 'a', shape.outerOverInner, '')
        ledger.given('Film coefficient inside', 'h_i', inside, 'W/(m²·K)')
      }
      const formula = inside === null ? 'q × F / (θ_i − θ_s)' : 'F / ((θ_i − θ_s) / q − a / h_i)'
      ledger.step(words, 'λ', formula, 'W/(m·K)', { value })
    }
    ledger.given(
      'How far that may be off, worked out from the readings as for the flux',
      'u_λ',
      effectiveWPerMK.plusMinus,
      'W/(m·K)',
    )
  }
  if (soundWPerMK !== null) {
    ledger.given('Conductivity of the build-up as given', 'λ_n', soundWPerMK, 'W/(m·K)')
  }
}
