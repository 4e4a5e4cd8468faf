/** Survey: the conductivity that the lagging as it stands must have, and how far that may be off. */
import { type FaceShape, wallOf } from '#solver/index.ts'
import type { System } from '#solver/types.ts'
import type { SurveyReading } from '../problem.ts'
import type { SurveyResult } from '../result.ts'
import type { Ledger } from './ledger.ts'

const UNIT = 'W/(m·K)'
const WORDS = 'Conductivity that the lagging as it stands must have'

/** The lines of the fluxes, q and q_1l to q_3h with their shares w_1 to w_3, must stand above. */
export function effectiveSteps(
  ledger: Ledger,
  system: System,
  reading: SurveyReading,
  survey: SurveyResult,
): void {
  const { effectiveWPerMK, measuredSurfaceC } = survey
  if (effectiveWPerMK === null) return
  const { faces } = wallOf(system.shape, system.layers)
  const inside = system.insideFilmWPerM2K
  ledger.given('Medium on the day', 'θ_i', system.mediumC, '°C')
  ledger.given('Surface, as measured', 'θ_s', measuredSurfaceC, '°C')
  formLines(ledger, faces, inside)
  if (inside !== null && areUnlike(faces)) {
    foundByFaces(ledger, faces, survey)
    return
  }
  const at = (flux: string, surface: string): string => {
    if (areUnlike(faces)) return `${flux} / ((θ_i − ${surface}) × G)`
    return inside === null
      ? `${flux} × F / (θ_i − ${surface})`
      : `F / ((θ_i − ${surface}) / ${flux} − a / h_i)`
  }
  ledger.step(WORDS, 'λ', at('q', 'θ_s'), UNIT, { value: effectiveWPerMK.value })
  ledger.given('How far the thermometer may be off', 'k', reading.thermometerK, 'K')
  ledger.step('Surface at the low end', 'θ_l', 'θ_s − k', '°C')
  ledger.step('Surface at the high end', 'θ_h', 'θ_s + k', '°C')
  const changes = readings.map((of, index) => {
    const end = index + 1
    const [low, high] = index === 0 ? ['θ_l', 'θ_h'] : ['θ_s', 'θ_s']
    ledger.step(`Conductivity with the ${of} low`, `λ_${end}l`, at(`q_${end}l`, low), UNIT)
    ledger.step(`Conductivity with the ${of} high`, `λ_${end}h`, at(`q_${end}h`, high), UNIT)
    return `(w_${end} × (λ_${end}h − λ_${end}l))^2`
  })
  ledger.step('How far that may be off', 'u_λ', `sqrt(${changes.join(' + ')})`, UNIT, {
    value: effectiveWPerMK.plusMinus,
  })
}

/** In the order of `variations`. */
export const readings = ['thermometer', 'air', 'emissivity'] as const

const formOf = ({ formsM }: FaceShape): number => formsM.reduce((sumM, formM) => sumM + formM, 0)

/** Faces of a vessel differ in form; those of a duct have one. */
const areUnlike = (faces: readonly FaceShape[]): boolean =>
  faces.some((face) => formOf(face) !== formOf(faces[0] ?? face))

function formLines(ledger: Ledger, faces: readonly FaceShape[], inside: number | null): void {
  const [first] = faces
  if (!first) return
  if (inside !== null) ledger.given('Film coefficient inside', 'h_i', inside, 'W/(m²·K)')
  if (!areUnlike(faces)) {
    ledger.given('Form of all layers', 'F', formOf(first), 'm')
    if (inside !== null) ledger.given('Outer area over inner area', 'a', first.outerOverInner, '')
    return
  }
  faces.forEach((face, index) => {
    ledger.given(`Form of all layers on the ${face.side}`, `F_${index + 1}`, formOf(face), 'm')
    if (inside !== null) {
      ledger.given('Outer area over inner area there', `o_${index + 1}`, face.outerOverInner, '')
    }
  })
  if (inside !== null) return
  const terms = faces.map((_, index) => `a_${index + 1} / F_${index + 1}`)
  ledger.step('Share over form of all faces', 'G', terms.join(' + '), '1/m')
}

/** With a film inside faces of several forms give no formula for λ: the flux is repeated from it. */
function foundByFaces(
  ledger: Ledger,
  faces: readonly FaceShape[],
  { effectiveWPerMK, heatFluxWPerM2 }: SurveyResult,
): void {
  if (effectiveWPerMK === null) return
  ledger.given(
    `${WORDS}, found by search; the next line repeats q`,
    'λ',
    effectiveWPerMK.value,
    UNIT,
  )
  const terms = faces.map((_, index) => {
    const at = index + 1
    return `a_${at} / (F_${at} / λ + o_${at} / h_i)`
  })
  ledger.step(
    'Flux that such lagging lets through',
    'q_L',
    `(θ_i − θ_s) × (${terms.join(' + ')})`,
    'W/m²',
    { value: heatFluxWPerM2.value },
  )
  ledger.given(
    'How far that may be off, the same search at the low and high end of each reading',
    'u_λ',
    effectiveWPerMK.plusMinus,
    UNIT,
  )
}
