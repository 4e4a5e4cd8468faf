/** What the figures of a run are told for: a metre of it, a square metre, or the whole piece. */
import type { RunValues } from '#model/fields.ts'
import type { Rating, RunMoney } from '#sizing/result.ts'
import type { QuantityName } from '#units/quantities.ts'

export type Per = RunMoney['per']

/** Spheres and vessels have a diameter but no metre that stands for the rest; a duct has the metre, a flat surface neither. */
export function perOf({ heatLossWPerM, outerDiameterM }: Rating): Per {
  if (heatLossWPerM !== null) return 'm'
  return outerDiameterM === null ? 'm2' : 'piece'
}

export const costQuantity: Readonly<Record<Per, QuantityName>> = {
  m: 'moneyPerLength',
  m2: 'moneyPerArea',
  piece: 'moneyPerPiece',
}

export const lossQuantity: Readonly<Record<Per, QuantityName>> = {
  m: 'heatLossPerLength',
  m2: 'heatFlux',
  piece: 'power',
}

/** Loss for what the figures are told for; null where it is not known. */
export function lossOf(rung: Rating): number | null {
  switch (perOf(rung)) {
    case 'm':
      return rung.heatLossWPerM
    case 'm2':
      return rung.heatFluxWPerM2
    case 'piece':
      return rung.heatLossW
  }
}

/** What the whole of a run is called: `for the sphere`. */
export function wholeWord({ shape }: RunValues): string {
  switch (shape) {
    case 'sphere':
    case 'vessel':
      return shape
    case 'flat':
      return 'surface'
    default:
      return 'run'
  }
}
