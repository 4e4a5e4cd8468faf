/** Free convection by the detailed formulas, as lines: from T, ν, Pr, λ_a and the difference ΔT above to h_n. */
import {
  type FaceShape,
  isDriving,
  nusseltHorizontalCylinder,
  nusseltPlateDrivingFlow,
  nusseltPlateHinderedFlow,
  nusseltSlenderCylinder,
  nusseltSphere,
  nusseltVerticalPlate,
  TURBULENT_RAYLEIGH,
} from '#solver/index.ts'
import type { Ledger } from './ledger.ts'
import { pedigreeOf } from './pedigree.ts'

const RAYLEIGH = (length: string): string => `9.80665 × ΔT × ${length}^3 × Pr / (T × ν^2)`

export interface FreeConvection {
  readonly shape: FaceShape
  readonly excessK: number
  /** Of the larger film, where an inclined pipe lies between two. */
  readonly inclinedFilm: 'lower' | 'higher'
}

export function freeSteps(ledger: Ledger, { shape, excessK, inclinedFilm }: FreeConvection): void {
  const prandtl = ledger.valueAt('Pr')
  if (shape.flow === 'inclined-cylinder') {
    uprightSteps(ledger, shape, prandtl)
    ledger.step('Coefficient as of an upright pipe', 'h_u', 'Nu × λ_a / L', 'W/(m²·K)')
    const lying = ledger.step('Rayleigh number on the diameter', 'Ra_D', RAYLEIGH('D_w'), '')
    lyingCylinder(ledger, 'Nu_D', 'Ra_D', { rayleigh: lying, prandtl })
    ledger.step('Coefficient as of a lying pipe', 'h_l', 'Nu_D × λ_a / D_w', 'W/(m²·K)')
    const isHigher = inclinedFilm === 'higher'
    ledger.step(
      isHigher
        ? 'Free convection: the larger of the two, since a loss is asked'
        : 'Free convection: the smaller of the two, since a temperature is asked',
      'h_n',
      isHigher ? 'max(h_u, h_l)' : 'min(h_u, h_l)',
      'W/(m²·K)',
    )
    return
  }
  if (shape.flow === 'vertical-cylinder') uprightSteps(ledger, shape, prandtl)
  else {
    const rayleigh = ledger.step('Rayleigh number', 'Ra', RAYLEIGH('L'), '')
    nusseltStep(ledger, shape, excessK, { rayleigh, prandtl })
  }
  ledger.step('Coefficient of free convection', 'h_n', 'Nu × λ_a / L', 'W/(m²·K)')
}

interface Flow {
  readonly rayleigh: number
  readonly prandtl: number
}

function nusseltStep(ledger: Ledger, { flow }: FaceShape, excessK: number, free: Flow): void {
  switch (flow) {
    case 'horizontal-cylinder':
      lyingCylinder(ledger, 'Nu', 'Ra', free)
      break
    case 'vertical-plate':
      plate(ledger, 'Nu', free)
      break
    case 'sphere':
      ledger.step('Divisor for the Prandtl number', 'P', '(1 + (0.469 / Pr)^(9 / 16))^(4 / 9)', '')
      ledger.step(
        'Nusselt number of a sphere',
        'Nu',
        '2 + 0.589 × Ra^(1 / 4) / P × (1 + 7.44e-8 × Ra / P^4)^(1 / 12)',
        '',
        { value: nusseltSphere(free), ...pedigreeOf(nusseltSphere, free) },
      )
      break
    case 'up':
    case 'down':
      lyingPlate(ledger, isDriving(flow, excessK), free)
      break
    default:
      throw new Error(`No free convection of its own: ${flow}`)
  }
}

function lyingCylinder(ledger: Ledger, symbol: string, rayleigh: string, free: Flow): void {
  ledger.step(
    'Nusselt number of a lying cylinder',
    symbol,
    `(0.6 + 0.387 × ${rayleigh}^(1 / 6) / (1 + (0.559 / Pr)^(9 / 16))^(8 / 27))^2`,
    '',
    {
      value: nusseltHorizontalCylinder(free),
      ...pedigreeOf(nusseltHorizontalCylinder, free),
    },
  )
}

function plate(ledger: Ledger, symbol: string, free: Flow): void {
  ledger.step(
    'Nusselt number of an upright plate',
    symbol,
    '(0.825 + 0.387 × Ra^(1 / 6) / (1 + (0.492 / Pr)^(9 / 16))^(8 / 27))^2',
    '',
    { value: nusseltVerticalPlate(free), ...pedigreeOf(nusseltVerticalPlate, free) },
  )
}

function uprightSteps(ledger: Ledger, shape: FaceShape, prandtl: number): void {
  const rayleigh = ledger.step('Rayleigh number on the height', 'Ra', RAYLEIGH('L'), '')
  if (rayleigh > TURBULENT_RAYLEIGH) {
    plate(ledger, 'Nu', { rayleigh, prandtl })
    return
  }
  const slender = { rayleigh, prandtl, slenderness: shape.freeLengthM / shape.windLengthM }
  plate(ledger, 'Nu_p', slender)
  ledger.step(
    'Nusselt number of a thin upright cylinder',
    'Nu_c',
    '4 / 3 × (7 × Ra × Pr / (5 × (20 + 21 × Pr)))^(1 / 4) + 4 × (272 + 315 × Pr) × L / (35 × (64 + 63 × Pr) × D_w)',
    '',
    { value: nusseltSlenderCylinder(slender), ...pedigreeOf(nusseltSlenderCylinder, slender) },
  )
  ledger.step(
    'The larger of the two, while the flow is laminar (Ra up to 1e9)',
    'Nu',
    'max(Nu_p, Nu_c)',
    '',
  )
}

function lyingPlate(ledger: Ledger, isFlowDriven: boolean, free: Flow): void {
  const words = isFlowDriven
    ? 'Nusselt number of a lying surface that buoyancy carries the air away from'
    : 'Nusselt number of a lying surface that buoyancy holds the air against'
  const formula = isFlowDriven ? drivenFormula(free.rayleigh) : '0.27 × Ra^(1 / 4)'
  const used = isFlowDriven ? nusseltPlateDrivingFlow : nusseltPlateHinderedFlow
  ledger.step(words, 'Nu', formula, '', {
    value: used(free),
    ...pedigreeOf(used, free),
    ...(isFlowDriven && { validity: `of ${nusseltPlateDrivingFlow.pedigree.equation}` }),
  })
}

/** The range of the formula that serves; its ranges are those of `nusseltPlateDrivingFlow`. */
function drivenFormula(rayleigh: number): string {
  if (rayleigh < 200) return '0.96 × Ra^(1 / 6)'
  if (rayleigh < 1e4) return '0.59 × Ra^(1 / 4)'
  if (rayleigh < 8e6) return '0.54 × Ra^(1 / 4)'
  return '0.15 × cbrt(Ra)'
}
