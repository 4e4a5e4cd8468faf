/** From the surface inwards: each layer at the flux of the film, up to the medium, where the balance must close. */
import { sources } from '#solver/index.ts'
import type { Settled } from '../build-up.ts'
import { conductivitySteps } from './conductivity.ts'
import type { FaceAt } from './face.ts'
import type { Ledger } from './ledger.ts'

/** Symbol of the interface outside layer j: the last is the surface. */
const side = (layer: number, count: number): string => (layer === count ? 'θ_s' : `θ_${layer}`)

export function layerSteps(ledger: Ledger, at: FaceAt, settled: Settled): void {
  const { system, shape, face } = at
  const { layers } = settled
  const count = layers.length
  const { insideFilmWPerM2K } = system
  ledger.given('Medium', 'θ_i', system.mediumC, '°C')
  ledger.given('Surface, as above', 'θ_s', face.surfaceTempC, '°C')
  ledger.given('Flux, as above', 'q', face.heatFluxWPerM2, 'W/m²')
  const resistances: string[] = []
  for (let layer = count; layer >= 1; layer -= 1) {
    const material = layers[layer - 1]?.material
    if (!material) continue
    const innerC = face.interfaceTempsC[layer - 1] ?? face.surfaceTempC
    const outerC = face.interfaceTempsC[layer] ?? face.surfaceTempC
    const outer = side(layer, count)
    const isConstant = material.conductivity.kind === 'constant'
    const found = `θ_${layer - 1}f`
    ledger.given(`Form of layer ${layer}`, `F_${layer}`, shape.formsM[layer - 1] ?? 0, 'm')
    if (!isConstant) {
      ledger.given(
        `Inner side of layer ${layer}, as found; the last line of the layer repeats it`,
        found,
        innerC,
        '°C',
      )
    }
    conductivitySteps(ledger, {
      layer,
      name: material.name,
      conductivity: material.conductivity,
      innerC,
      outerC,
      inner: found,
      outer,
    })
    ledger.step(
      `Resistance of layer ${layer} on the outer area`,
      `R_${layer}`,
      `F_${layer} / λ_${layer}`,
      'm²·K/W',
    )
    resistances.push(`R_${layer}`)
    ledger.step(
      layer === 1 ? 'Bare thing under the layers' : `Between layers ${layer - 1} and ${layer}`,
      `θ_${layer - 1}`,
      `${outer} + q × R_${layer}`,
      '°C',
      { value: innerC },
    )
  }
  if (insideFilmWPerM2K !== null) {
    ledger.given('Outer area over inner area', 'a', shape.outerOverInner, '')
    ledger.given('Film coefficient inside', 'h_i', insideFilmWPerM2K, 'W/(m²·K)')
    ledger.step('Resistance of the film inside', 'R_i', 'a / h_i', 'm²·K/W')
    resistances.push('R_i')
  }
  if (holdsNothing(at)) {
    ledger.say('The layers are so thin that they hold nothing back: there is no balance to repeat.')
    return
  }
  ledger.step(
    'Balance: the flux that all resistances let through, which must be q',
    'q_L',
    `(θ_i − θ_s) / ${resistances.length === 1 ? resistances[0] : `(${resistances.toReversed().join(' + ')})`}`,
    'W/m²',
    { value: face.heatFluxWPerM2, source: `resistances in series: ${sources.ashrae2021ch23}` },
  )
}

/** A drop below this cannot be read off two temperatures [K]. */
const NOTHING_K = 1e-8

const holdsNothing = ({ system, face }: FaceAt): boolean =>
  Math.abs(system.mediumC - face.surfaceTempC) < NOTHING_K && Math.abs(face.heatFluxWPerM2) > 0
