import type { Layer, Shape, SideName } from './types.ts'

/**
 * A layered wall reduced to its outer area: heat flux there times `forms[j]` is the integral of λ dT across layer j.
 */
export interface Wall {
  /** Conduction form of each layer, inside to outside [m]. */
  readonly formsM: readonly number[]
  /** Outer area over inner area: the inside film works on the inner one. */
  readonly outerOverInner: number
  /** Outer area per metre of run [m²/m]; null for a flat surface. */
  readonly outerAreaM2PerM: number | null
  readonly outerDiameterM: number | null
  readonly faces: readonly FaceShape[]
}

export type FlowKind =
  | 'horizontal-cylinder'
  | 'vertical-cylinder'
  | 'vertical-plate'
  | 'up'
  | 'down'

/** One face as its films see it. */
export interface FaceShape {
  readonly side: SideName
  readonly flow: FlowKind
  /** Length in the free-convection number: diameter, height, or area over perimeter [m]. */
  readonly freeLengthM: number
  /** Length in the wind number [m]. */
  readonly windLengthM: number
  /** Share of the outer area, 0 to 1. */
  readonly share: number
}

/** Reduces a shape with its layers to a wall. Source of the cylinder and flat forms: Fourier's law. */
export function wallOf(shape: Shape, layers: readonly Layer[]): Wall {
  switch (shape.kind) {
    case 'pipe':
      return cylinderWall(shape, layers)
    case 'rect-duct':
      return rectangularWall(shape, layers)
    case 'flat':
      return flatWall(shape, layers)
  }
}

/** Form of a cylindrical layer on the outer area: r_e·ln(r_out/r_in). */
function cylinderWall(shape: Extract<Shape, { kind: 'pipe' }>, layers: readonly Layer[]): Wall {
  const innerRadiusM = shape.outerDiameterM / 2
  const outerRadiusM = layers.reduce((radiusM, layer) => radiusM + layer.thicknessM, innerRadiusM)
  const formsM: number[] = []
  let radiusM = innerRadiusM
  for (const { thicknessM } of layers) {
    // log1p keeps the digits of a thin layer on a large radius.
    formsM.push(outerRadiusM * Math.log1p(thicknessM / radiusM))
    radiusM += thicknessM
  }
  const outerDiameterM = 2 * outerRadiusM
  const upright = shape.orientation === 'vertical'
  return {
    formsM,
    outerOverInner: outerRadiusM / innerRadiusM,
    outerAreaM2PerM: Math.PI * outerDiameterM,
    outerDiameterM,
    faces: [
      {
        side: 'all round',
        flow: upright ? 'vertical-cylinder' : 'horizontal-cylinder',
        freeLengthM: upright ? shape.riseM : outerDiameterM,
        windLengthM: outerDiameterM,
        share: 1,
      },
    ],
  }
}

/**
 * Rectangular duct with the mean-perimeter form R_l = 2d/(λ(P_i + P_e)), P_e = P_i + 8d, layer by layer.
 *
 * Side faces are vertical plates of the outer height; top and bottom are taken as long strips, area over perimeter =
 * half the outer width; the wind runs across the duct, over height and width. A riser is a vertical plate of its height
 * all round, and the wind runs over its mean side. Source: ISO 12241:2022 as quoted in a public building-energy model; Incropera, example 9.3.
 */
function rectangularWall(
  shape: Extract<Shape, { kind: 'rect-duct' }>,
  layers: readonly Layer[],
): Wall {
  const { widthM, heightM } = shape
  const innerPerimeterM = 2 * (widthM + heightM)
  const totalM = layers.reduce((sumM, layer) => sumM + layer.thicknessM, 0)
  const outerPerimeterM = innerPerimeterM + 8 * totalM
  const formsM: number[] = []
  let perimeterM = innerPerimeterM
  for (const { thicknessM } of layers) {
    const nextM = perimeterM + 8 * thicknessM
    formsM.push((outerPerimeterM * 2 * thicknessM) / (perimeterM + nextM))
    perimeterM = nextM
  }
  const outerWidthM = widthM + 2 * totalM
  const outerHeightM = heightM + 2 * totalM
  const lying: FaceShape[] = [
    face(
      'side',
      'vertical-plate',
      outerHeightM,
      outerHeightM,
      (2 * outerHeightM) / outerPerimeterM,
    ),
    face('top', 'up', outerWidthM / 2, outerWidthM, outerWidthM / outerPerimeterM),
    face('bottom', 'down', outerWidthM / 2, outerWidthM, outerWidthM / outerPerimeterM),
  ]
  return {
    formsM,
    outerOverInner: outerPerimeterM / innerPerimeterM,
    outerAreaM2PerM: outerPerimeterM,
    outerDiameterM: null,
    faces:
      shape.riseM === null
        ? lying
        : [face('all round', 'vertical-plate', shape.riseM, outerPerimeterM / 4, 1)],
  }
}

const face = (
  side: SideName,
  flow: FlowKind,
  freeLengthM: number,
  windLengthM: number,
  share: number,
): FaceShape => ({ side, flow, freeLengthM, windLengthM, share })

/** Flat surface: form = thickness. The wind is taken over the same length as free convection: short, so never too little loss. */
function flatWall(shape: Extract<Shape, { kind: 'flat' }>, layers: readonly Layer[]): Wall {
  return {
    formsM: layers.map((layer) => layer.thicknessM),
    outerOverInner: 1,
    outerAreaM2PerM: null,
    outerDiameterM: null,
    faces: [
      {
        side: 'all round',
        flow: shape.facing === 'vertical' ? 'vertical-plate' : shape.facing,
        freeLengthM: shape.characteristicLengthM,
        windLengthM: shape.characteristicLengthM,
        share: 1,
      },
    ],
  }
}
