import { soilResistanceMKPerW } from './ground.ts'
import { DOME_RADIUS_PER_DIAMETER, headOuterAreaM2 } from './heads.ts'
import type { Layer, Shape, SideName, Unit } from './types.ts'

/** A layered wall reduced to its outer area. */
export interface Wall {
  readonly unit: Unit
  /** Outer area of one unit [m²]. */
  readonly outerAreaM2PerUnit: number
  readonly outerDiameterM: number | null
  readonly faces: readonly FaceShape[]
}

export type FlowKind =
  | 'horizontal-cylinder'
  | 'vertical-cylinder'
  | 'inclined-cylinder'
  | 'vertical-plate'
  | 'up'
  | 'down'
  | 'sphere'
  | 'ground'

/** One face as its layers and its films see it. */
export interface FaceShape extends Conduction {
  readonly side: SideName
  readonly flow: FlowKind
  /** Length in the free-convection number: diameter, height, or area over perimeter [m]. */
  readonly freeLengthM: number
  /** Length in the wind number [m]. */
  readonly windLengthM: number
  /** Share of the outer area, 0 to 1. */
  readonly share: number
  /** Coefficient of the soil around a buried pipe, on its outer area [W/(m²·K)]; 0 elsewhere. */
  readonly groundWPerM2K: number
}

/** Heat flux on the outer area times `formsM[j]` is the integral of λ dT across layer j. */
interface Conduction {
  /** Conduction form of each layer, inside to outside [m]. */
  readonly formsM: readonly number[]
  /** Outer area over inner area: the inside film works on the inner one. */
  readonly outerOverInner: number
}

/** Reduces a shape with its layers to a wall. Source of the cylinder, sphere and flat forms: Fourier's law. */
export function wallOf(shape: Shape, layers: readonly Layer[]): Wall {
  switch (shape.kind) {
    case 'pipe':
      return pipeWall(shape, layers)
    case 'buried-pipe':
      return buriedWall(shape, layers)
    case 'rect-duct':
      return rectangularWall(shape, layers)
    case 'flat':
      return flatWall(shape, layers)
    case 'sphere':
      return sphereWall(shape, layers)
    case 'vessel':
      return vesselWall(shape, layers)
  }
}

type Of<K extends Shape['kind']> = Extract<Shape, { kind: K }>

const totalThicknessM = (layers: readonly Layer[]): number => {
  let totalM = 0
  for (const { thicknessM } of layers) totalM += thicknessM
  return totalM
}

/** Form of a cylindrical layer on the outer area: r_e·ln(r_out/r_in). */
function cylinderConduction(innerRadiusM: number, layers: readonly Layer[]): Conduction {
  const outerRadiusM = innerRadiusM + totalThicknessM(layers)
  const formsM: number[] = []
  let radiusM = innerRadiusM
  for (const { thicknessM } of layers) {
    // log1p keeps the digits of a thin layer on a large radius.
    formsM.push(outerRadiusM * Math.log1p(thicknessM / radiusM))
    radiusM += thicknessM
  }
  return { formsM, outerOverInner: outerRadiusM / innerRadiusM }
}

/** Form of a spherical layer on the outer area: r_e²·(1/r_in − 1/r_out). */
function sphereConduction(innerRadiusM: number, layers: readonly Layer[]): Conduction {
  const outerRadiusM = innerRadiusM + totalThicknessM(layers)
  const formsM: number[] = []
  let radiusM = innerRadiusM
  for (const { thicknessM } of layers) {
    const nextM = radiusM + thicknessM
    formsM.push((outerRadiusM * outerRadiusM * thicknessM) / (radiusM * nextM))
    radiusM = nextM
  }
  return { formsM, outerOverInner: (outerRadiusM / innerRadiusM) ** 2 }
}

function planeConduction(layers: readonly Layer[]): Conduction {
  return { formsM: layers.map((layer) => layer.thicknessM), outerOverInner: 1 }
}

const face = (
  side: SideName,
  flow: FlowKind,
  lengths: { readonly freeM: number; readonly windM: number },
  share: number,
  conduction: Conduction,
): FaceShape => ({
  side,
  flow,
  freeLengthM: lengths.freeM,
  windLengthM: lengths.windM,
  share,
  groundWPerM2K: 0,
  formsM: conduction.formsM,
  outerOverInner: conduction.outerOverInner,
})

function pipeWall(shape: Of<'pipe'>, layers: readonly Layer[]): Wall {
  const conduction = cylinderConduction(shape.outerDiameterM / 2, layers)
  const diameterM = shape.outerDiameterM + 2 * totalThicknessM(layers)
  const freeM = shape.orientation === 'horizontal' ? diameterM : shape.riseM
  const lengths = { freeM, windM: diameterM }
  return {
    unit: 'm',
    outerAreaM2PerUnit: Math.PI * diameterM,
    outerDiameterM: diameterM,
    faces: [face('all round', `${shape.orientation}-cylinder`, lengths, 1, conduction)],
  }
}

/** In place of soil that is not there, for a pipe whose layers reach up out of it: hardly any resistance [W/(m²·K)]. */
const NO_SOIL_W_PER_M2_K = 1e4

/** The soil is the film of a buried pipe: 1/(R_E·π·D_e) on its outer area, towards the temperature of the surface. */
function buriedWall(shape: Of<'buried-pipe'>, layers: readonly Layer[]): Wall {
  const conduction = cylinderConduction(shape.outerDiameterM / 2, layers)
  const diameterM = shape.outerDiameterM + 2 * totalThicknessM(layers)
  const areaM2PerM = Math.PI * diameterM
  const soilMKPerW = soilResistanceMKPerW({
    depthM: shape.depthM,
    outerDiameterM: diameterM,
    soilWPerMK: shape.soilWPerMK,
  })
  const lengths = { freeM: diameterM, windM: diameterM }
  return {
    unit: 'm',
    outerAreaM2PerUnit: areaM2PerM,
    outerDiameterM: diameterM,
    faces: [
      {
        ...face('all round', 'ground', lengths, 1, conduction),
        groundWPerM2K:
          soilMKPerW === null
            ? NO_SOIL_W_PER_M2_K
            : Math.min(1 / (soilMKPerW * areaM2PerM), NO_SOIL_W_PER_M2_K),
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
function rectangularWall(shape: Of<'rect-duct'>, layers: readonly Layer[]): Wall {
  const { widthM, heightM } = shape
  const innerPerimeterM = 2 * (widthM + heightM)
  const totalM = totalThicknessM(layers)
  const outerPerimeterM = innerPerimeterM + 8 * totalM
  const formsM: number[] = []
  let perimeterM = innerPerimeterM
  for (const { thicknessM } of layers) {
    const nextM = perimeterM + 8 * thicknessM
    formsM.push((outerPerimeterM * 2 * thicknessM) / (perimeterM + nextM))
    perimeterM = nextM
  }
  const conduction = { formsM, outerOverInner: outerPerimeterM / innerPerimeterM }
  const outerWidthM = widthM + 2 * totalM
  const outerHeightM = heightM + 2 * totalM
  const across = { freeM: outerWidthM / 2, windM: outerWidthM }
  const upright = { freeM: outerHeightM, windM: outerHeightM }
  const acrossShare = outerWidthM / outerPerimeterM
  return {
    unit: 'm',
    outerAreaM2PerUnit: outerPerimeterM,
    outerDiameterM: null,
    faces:
      shape.riseM === null
        ? [
            face(
              'side',
              'vertical-plate',
              upright,
              (2 * outerHeightM) / outerPerimeterM,
              conduction,
            ),
            face('top', 'up', across, acrossShare, conduction),
            face('bottom', 'down', across, acrossShare, conduction),
          ]
        : [
            face(
              'all round',
              'vertical-plate',
              { freeM: shape.riseM, windM: outerPerimeterM / 4 },
              1,
              conduction,
            ),
          ],
  }
}

/** Flat surface: form = thickness. The wind is taken over the same length as free convection: short, so never too little loss. */
function flatWall(shape: Of<'flat'>, layers: readonly Layer[]): Wall {
  const lengthM = shape.characteristicLengthM
  const flow = shape.facing === 'vertical' ? 'vertical-plate' : shape.facing
  const lengths = { freeM: lengthM, windM: lengthM }
  return {
    unit: 'm2',
    outerAreaM2PerUnit: 1,
    outerDiameterM: null,
    faces: [face('all round', flow, lengths, 1, planeConduction(layers))],
  }
}

function sphereWall(shape: Of<'sphere'>, layers: readonly Layer[]): Wall {
  const diameterM = shape.outerDiameterM + 2 * totalThicknessM(layers)
  const conduction = sphereConduction(shape.outerDiameterM / 2, layers)
  const lengths = { freeM: diameterM, windM: diameterM }
  return {
    unit: 'piece',
    outerAreaM2PerUnit: Math.PI * diameterM * diameterM,
    outerDiameterM: diameterM,
    faces: [face('all round', 'sphere', lengths, 1, conduction)],
  }
}

/**
 * Vessel: the shell as a cylinder, two heads as discs or domes; one piece. A dome conducts as the half sphere of its
 * area and is cooled as a sphere of the vessel's diameter; a disc conducts straight through to its outer area.
 */
function vesselWall(shape: Of<'vessel'>, layers: readonly Layer[]): Wall {
  const { outerDiameterM: bareM, shellLengthM, orientation, heads } = shape
  const thicknessM = totalThicknessM(layers)
  const diameterM = bareM + 2 * thicknessM
  const shellAreaM2 = Math.PI * diameterM * shellLengthM
  const headAreaM2 = headOuterAreaM2(heads, bareM, thicknessM)
  const areaM2 = shellAreaM2 + 2 * headAreaM2
  const shellFreeM = orientation === 'horizontal' ? diameterM : shellLengthM
  const shell = face(
    'shell',
    `${orientation}-cylinder`,
    { freeM: shellFreeM, windM: diameterM },
    shellAreaM2 / areaM2,
    cylinderConduction(bareM / 2, layers),
  )
  const headConduction =
    heads === 'domed'
      ? sphereConduction(bareM * DOME_RADIUS_PER_DIAMETER, layers)
      : planeConduction(layers)
  const head = (side: SideName, flow: FlowKind, freeM: number, count: 1 | 2): FaceShape =>
    face(side, flow, { freeM, windM: diameterM }, (count * headAreaM2) / areaM2, headConduction)
  return {
    unit: 'piece',
    outerAreaM2PerUnit: areaM2,
    outerDiameterM: diameterM,
    faces: [
      shell,
      ...(heads === 'domed'
        ? [head('heads', 'sphere', diameterM, 2)]
        : orientation === 'horizontal'
          ? [head('heads', 'vertical-plate', diameterM, 2)]
          : [
              head('top head', 'up', diameterM / 4, 1),
              head('bottom head', 'down', diameterM / 4, 1),
            ]),
    ],
  }
}
