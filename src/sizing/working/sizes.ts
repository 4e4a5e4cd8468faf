/** Areas and volumes of layers as lines, for one unit of the run: what is bought. */
import { grown } from '#solver/index.ts'
import type { Shape } from '#solver/types.ts'
import type { Settled } from '../build-up.ts'
import { DOME_FORMULA } from './geometry.ts'
import type { Ledger } from './ledger.ts'

/** Puts down s_j, A_j (outer area) and V_j (volume) of every layer. */
export function sizeSteps(ledger: Ledger, shape: Shape, { layers }: Settled): void {
  const unit = perUnit(shape)
  bareSizes(ledger, shape)
  let depthM = 0
  layers.forEach(({ material, thicknessM }, index) => {
    const layer = index + 1
    const inner = grown(shape, depthM)
    depthM += thicknessM ?? 0
    const outer = grown(shape, depthM)
    ledger.given(
      `Thickness of layer ${layer}, ${material.name}`,
      `s_${layer}`,
      thicknessM ?? 0,
      'm',
    )
    outerSizes(ledger, shape, layer)
    ledger.step(
      `Outer area of layer ${layer}`,
      `A_${layer}`,
      areaFormula(shape, layer),
      `m²${unit}`,
      {
        value: outer.areaM2,
      },
    )
    ledger.step(
      `Volume of layer ${layer}`,
      `V_${layer}`,
      volumeFormula(shape, layer),
      `m³${unit}`,
      {
        value: outer.volumeM3 - inner.volumeM3,
      },
    )
  })
}

function perUnit({ kind }: Shape): string {
  if (kind === 'flat') return '/m²'
  return kind === 'sphere' || kind === 'vessel' ? '' : '/m'
}

function bareSizes(ledger: Ledger, shape: Shape): void {
  switch (shape.kind) {
    case 'flat':
      break
    case 'rect-duct':
      ledger.given('Width', 'W_0', shape.widthM, 'm')
      ledger.given('Height', 'H_0', shape.heightM, 'm')
      break
    case 'vessel':
      ledger.given('Outer diameter of the bare vessel', 'D_0', shape.outerDiameterM, 'm')
      ledger.given('Length of the shell', 'L_0', shape.shellLengthM, 'm')
      if (shape.heads === 'domed') {
        ledger.step(
          'Radius of the half sphere as large as a head, by the diameter',
          'k',
          DOME_FORMULA,
          '',
        )
        ledger.step('Radius of that half sphere', 'r_0', 'k × D_0', 'm')
      } else ledger.given('Depth of layers on a head', 'u_0', 0, 'm')
      break
    default:
      ledger.given('Outer diameter of the bare thing', 'D_0', shape.outerDiameterM, 'm')
  }
}

function outerSizes(ledger: Ledger, shape: Shape, layer: number): void {
  const inner = layer - 1
  if (shape.kind === 'flat') return
  if (shape.kind === 'rect-duct') {
    ledger.step(`Width over layer ${layer}`, `W_${layer}`, `W_${inner} + 2 × s_${layer}`, 'm')
    ledger.step(`Height over layer ${layer}`, `H_${layer}`, `H_${inner} + 2 × s_${layer}`, 'm')
    return
  }
  ledger.step(`Diameter over layer ${layer}`, `D_${layer}`, `D_${inner} + 2 × s_${layer}`, 'm')
  if (shape.kind !== 'vessel') return
  if (shape.heads === 'domed') {
    ledger.step(`Radius over layer ${layer}`, `r_${layer}`, `r_${inner} + s_${layer}`, 'm')
  } else ledger.step(`Depth over layer ${layer}`, `u_${layer}`, `u_${inner} + s_${layer}`, 'm')
}

function areaFormula(shape: Shape, layer: number): string {
  switch (shape.kind) {
    case 'flat':
      return '1'
    case 'rect-duct':
      return `2 × (W_${layer} + H_${layer})`
    case 'sphere':
      return `π × D_${layer}^2`
    case 'vessel':
      return shape.heads === 'domed'
        ? `π × D_${layer} × L_0 + 4 × π × r_${layer}^2`
        : `π × D_${layer} × L_0 + π / 2 × D_${layer}^2`
    default:
      return `π × D_${layer}`
  }
}

function volumeFormula(shape: Shape, layer: number): string {
  const inner = layer - 1
  switch (shape.kind) {
    case 'flat':
      return `s_${layer}`
    case 'rect-duct':
      return `W_${layer} × H_${layer} − W_${inner} × H_${inner}`
    case 'sphere':
      return `π / 6 × (D_${layer}^3 − D_${inner}^3)`
    case 'vessel': {
      const shell = `π / 4 × L_0 × (D_${layer}^2 − D_${inner}^2)`
      return shape.heads === 'domed'
        ? `${shell} + 4 / 3 × π × (r_${layer}^3 − r_${inner}^3)`
        : `${shell} + π / 2 × (D_${layer}^2 × u_${layer} − D_${inner}^2 × u_${inner})`
    }
    default:
      return `π / 4 × (D_${layer}^2 − D_${inner}^2)`
  }
}

/** Area of a closed end over the layers: the cross-section of the run, A_E. */
export function endSteps(ledger: Ledger, shape: Shape, thicknessM: number): void {
  if (shape.kind !== 'rect-duct' && shape.kind !== 'pipe' && shape.kind !== 'buried-pipe') return
  const value = grown(shape, thicknessM).volumeM3
  ledger.given('Thickness over the end', 's', thicknessM, 'm')
  if (shape.kind === 'rect-duct') {
    ledger.given('Width', 'W', shape.widthM, 'm')
    ledger.given('Height', 'H', shape.heightM, 'm')
    ledger.step('Area of an end, over the layers', 'A_E', '(W + 2 × s) × (H + 2 × s)', 'm²', {
      value,
    })
    return
  }
  ledger.given('Outer diameter of the bare pipe', 'D', shape.outerDiameterM, 'm')
  ledger.step('Area of an end, over the layers', 'A_E', 'π / 4 × (D + 2 × s)^2', 'm²', { value })
}
