/** Layers read beyond the ends of their conductivity curve. */
import { beyondCurveK } from '#solver/index.ts'
import type { Solution } from '#solver/types.ts'
import type { Settled } from './build-up.ts'
import type { Note } from './result.ts'

/** How the solver, to which a layer is a number and a state the only one, says the same. */
export const EXTRAPOLATED = 'conductivity-extrapolated'

/** One note for each such layer, by its name, at the face and the condition that are farthest beyond. */
export function curveNotes({ layers }: Settled, states: readonly Solution[]): Note[] {
  const faces = states.flatMap((state) => state.faces)
  return layers.flatMap(({ material: { name, conductivity } }, index) => {
    if (conductivity.kind === 'constant') return []
    const beyondK = faces
      .map(({ interfaceTempsC: tempsC }) =>
        beyondCurveK(conductivity, ((tempsC[index] ?? 0) + (tempsC[index + 1] ?? 0)) / 2),
      )
      .reduce((a, b) => (Math.abs(b) > Math.abs(a) ? b : a), 0)
    if (beyondK === 0) return []
    const ends = [conductivity.pointsC.at(0), conductivity.pointsC.at(-1)]
    const [first, last] = ends.map((endC) => String(endC ?? 0).replace('-', '−'))
    return [
      {
        code: EXTRAPOLATED,
        text: `${name}: its mean temperature is up to ${Math.max(1, Math.abs(beyondK)).toFixed(0)} K ${beyondK > 0 ? 'above' : 'below'} the conductivity curve, which holds from ${first} to ${last} °C.`,
      },
    ]
  })
}
