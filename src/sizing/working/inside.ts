/** The film inside a duct, worked out by the velocity of its air. */
import { airDensityKgPerM3, kelvin, nusseltInside } from '#solver/index.ts'
import type { Shape } from '#solver/types.ts'
import type { InsideAir, Problem } from '../problem.ts'
import { airSteps, pressureStep } from './air.ts'
import { Ledger } from './ledger.ts'
import { pedigreeOf } from './pedigree.ts'
import type { Section } from './types.ts'

/** Null where the film inside is given, the usual one, or none. */
export function insideSection({
  shape,
  insideAir,
  insideFilmWPerM2K,
  conditions,
}: Problem): Section | null {
  if (insideAir === null || insideFilmWPerM2K === null) return null
  const ledger = new Ledger('The film inside', null)
  const pressurePa = pressureStep(ledger, conditions.loss.around.altitudeM)
  ledger.given('Air in the duct', 'θ_i', insideAir.airC, '°C')
  ledger.step('The same, absolute', 'T', 'θ_i + 273.15', 'K', { value: kelvin(insideAir.airC) })
  airSteps(ledger, insideAir.airC, pressurePa)
  boreSteps(ledger, shape)
  velocitySteps(ledger, insideAir, shape, pressurePa)
  const reynolds = ledger.step('Reynolds number inside', 'Re', 'v × d_h / ν', '')
  nusseltSteps(ledger, { reynolds, prandtl: ledger.valueAt('Pr') })
  ledger.step('Film coefficient inside', 'h_i', 'Nu × λ_a / d_h', 'W/(m²·K)', {
    value: insideFilmWPerM2K,
  })
  return ledger.section()
}

/** Four times area over perimeter, the sheet being thin. */
function boreSteps(ledger: Ledger, shape: Shape): void {
  if (shape.kind === 'rect-duct') {
    ledger.given('Width of the duct', 'W', shape.widthM, 'm')
    ledger.given('Height of the duct', 'H', shape.heightM, 'm')
    ledger.step('Hydraulic diameter', 'd_h', '2 × W × H / (W + H)', 'm')
  } else if ('outerDiameterM' in shape) {
    ledger.given('Hydraulic diameter: that of the duct', 'd_h', shape.outerDiameterM, 'm')
  }
}

function velocitySteps(
  ledger: Ledger,
  { velocityMPerS, flowKgPerS, airC }: InsideAir,
  shape: Shape,
  pressurePa: number,
): void {
  if (flowKgPerS === null) {
    ledger.given('Velocity of the air', 'v', velocityMPerS, 'm/s')
    return
  }
  const area = shape.kind === 'rect-duct' ? 'W × H' : 'π / 4 × d_h^2'
  ledger.given('Flow', 'm', flowKgPerS, 'kg/s')
  ledger.step('Cross-section', 'A_i', area, 'm²')
  ledger.step('Velocity of the air', 'v', 'm / (ρ × A_i)', 'm/s', {
    value: velocityMPerS,
    source: `density of the air there, ${airDensityKgPerM3(airC, pressurePa).toPrecision(4)} kg/m³`,
  })
}

/** Ends of the straight line between laminar and turbulent flow. */
const LAMINAR_TO = 2300
const TURBULENT_FROM = 4000

function nusseltSteps(
  ledger: Ledger,
  flow: { readonly reynolds: number; readonly prandtl: number },
): void {
  const { reynolds } = flow
  const about = { value: nusseltInside(flow), ...pedigreeOf(nusseltInside, flow) }
  const words = 'Nusselt number inside'
  if (reynolds <= LAMINAR_TO) {
    ledger.step(`${words}: laminar`, 'Nu', '3.66', '', about)
    return
  }
  const isTurbulent = reynolds >= TURBULENT_FROM
  const at = isTurbulent ? 'Re' : String(TURBULENT_FROM)
  ledger.step(
    `Friction factor of a smooth pipe${isTurbulent ? '' : `, at Re ${TURBULENT_FROM}`}`,
    'f',
    `(1.58 × ln(${at}) − 3.28)^(−2)`,
    '',
  )
  const turbulent = `(f / 2 × (${at} − 1000) × Pr / (1 + 12.7 × sqrt(f / 2) × (Pr^(2 / 3) − 1)))`
  if (isTurbulent) {
    ledger.step(`${words}: turbulent`, 'Nu', turbulent, '', about)
    return
  }
  ledger.step(`${words} at that`, 'Nu_t', turbulent, '')
  ledger.step(
    `${words}: on the straight line between laminar and turbulent`,
    'Nu',
    `3.66 + (Re − ${LAMINAR_TO}) / (${TURBULENT_FROM} − ${LAMINAR_TO}) × (Nu_t − 3.66)`,
    '',
    about,
  )
}
