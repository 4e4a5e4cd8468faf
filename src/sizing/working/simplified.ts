/** The simplified films as lines, to h_c. */
import {
  branchUsed,
  type FaceShape,
  isCylinder,
  simplifiedFreePipe,
  simplifiedFreeWall,
  simplifiedWindOnPipe,
  simplifiedWindOnWall,
  type TwoBranchFormula,
} from '#solver/index.ts'
import { printNumber } from './digits.ts'
import type { Ledger } from './ledger.ts'
import { pedigreeOf } from './pedigree.ts'

export interface SimplifiedFilm {
  readonly shape: FaceShape
  readonly windMPerS: number
  readonly excessK: number
  readonly inclinedFilm: 'lower' | 'higher'
  readonly convectionWPerM2K: number
}

/** The larger of the equation for still air and the one for wind. */
export function simplifiedSteps(ledger: Ledger, film: SimplifiedFilm): void {
  const { shape, windMPerS, excessK, inclinedFilm, convectionWPerM2K } = film
  const differenceK = Math.abs(excessK)
  const diameterM = shape.windLengthM
  const liesAlone = shape.flow === 'horizontal-cylinder'
  const isInclined = shape.flow === 'inclined-cylinder'
  if (liesAlone || isInclined) {
    branchStep(
      ledger,
      { words: 'Still air at a lying pipe', symbol: 'h_l' },
      simplifiedFreePipe,
      { differenceK, diameterM },
      { laminar: '1.25 × (ΔT / D_w)^(1 / 4)', turbulent: '1.21 × cbrt(ΔT)' },
    )
  }
  if (!liesAlone) {
    branchStep(
      ledger,
      { words: 'Still air at an upright wall or pipe', symbol: 'h_u' },
      simplifiedFreeWall,
      { differenceK, heightM: shape.freeLengthM },
      { laminar: '1.32 × (ΔT / L)^(1 / 4)', turbulent: '1.74 × cbrt(ΔT)' },
    )
  }
  const still = isInclined
    ? inclinedFilm === 'higher'
      ? 'max(h_u, h_l)'
      : 'min(h_u, h_l)'
    : liesAlone
      ? 'h_l'
      : 'h_u'
  if (windMPerS > 0) windStep(ledger, shape, windMPerS)
  ledger.step(
    windMPerS > 0
      ? 'Coefficient of convection: the larger of still air and wind'
      : 'Coefficient of convection',
    'h_c',
    windMPerS > 0 ? `max(${still}, h_w)` : still,
    'W/(m²·K)',
    { value: convectionWPerM2K },
  )
}

function windStep(ledger: Ledger, shape: FaceShape, windMPerS: number): void {
  const lengthM = shape.windLengthM
  const named = { words: 'Wind', symbol: 'h_w' }
  if (isCylinder(shape.flow)) {
    branchStep(
      ledger,
      named,
      simplifiedWindOnPipe,
      { windMPerS, diameterM: lengthM },
      {
        laminar: '8.1e-3 / D_w + 3.14 × sqrt(v / D_w)',
        turbulent: '8.9 × v^0.9 / D_w^0.1',
      },
    )
  } else {
    branchStep(
      ledger,
      named,
      simplifiedWindOnWall,
      { windMPerS, lengthM },
      {
        laminar: '3.96 × sqrt(v / L_w)',
        turbulent: '5.76 × (v^4 / L_w)^0.2',
      },
    )
  }
}

function branchStep<Inputs extends object>(
  ledger: Ledger,
  { words, symbol }: { readonly words: string; readonly symbol: string },
  formula: TwoBranchFormula<Inputs>,
  inputs: Inputs,
  branches: Readonly<Record<'laminar' | 'turbulent', string>>,
): void {
  const { branch, number, value, switchValue } = branchUsed(formula, inputs)
  const { source, validity } = pedigreeOf(formula, inputs)
  const sides = value <= switchValue ? 'up to' : 'above'
  const which = `${branch} branch: ${number} is ${printNumber(value, 4)}, ${sides} ${printNumber(switchValue, 4)}`
  ledger.step(words, symbol, branches[branch], 'W/(m²·K)', {
    value: formula(inputs),
    source,
    validity: validity === null ? which : `${which}; ${validity}`,
  })
}
