/** What the section drawing shows of one rung: sizes, layers and temperatures, without pixels. */
import type { RunValues } from '#model/fields.ts'
import type { Rating } from '#sizing/result.ts'

/** The bare thing in the middle. Half sizes in metres, since all is drawn from the middle outwards. */
export type Core =
  | {
      readonly kind: 'round'
      readonly radiusM: number
      /** A sphere is cut through its middle; heat spreads in it faster than around a cylinder. */
      readonly isSphere: boolean
      /** Depth of the axis below the ground [m]; null in the air. */
      readonly buriedM: number | null
    }
  | { readonly kind: 'box'; readonly halfWidthM: number; readonly halfHeightM: number }
  | { readonly kind: 'slab'; readonly facing: 'side' | 'up' | 'down' }

/** Lagging between two interfaces whose temperatures are known; depths from the bare surface outwards. */
interface Stretch {
  readonly fromM: number
  readonly toM: number
  readonly innerC: number
  readonly outerC: number
}

export interface SectionView {
  readonly core: Core
  readonly stretches: readonly Stretch[]
  /** Depths at which one piece ends and the next begins [m]. */
  readonly jointsM: readonly number[]
  readonly thicknessM: number
  readonly mediumC: number
  readonly surfaceC: number
}

/** Null where the values do not say enough to draw the shape. */
export function sectionView(values: RunValues, bare: Rating, shown: Rating): SectionView | null {
  const core = coreOf(values, bare)
  if (!core) return null
  // Steam may be given by its pressure: then the inside of the lagging is as hot as the steam.
  const mediumC = values.mediumC ?? shown.interfaceTempsC[0] ?? bare.surfaceTempC
  return {
    core,
    stretches: stretches(values, shown),
    jointsM: ends(shown.piecesM).slice(0, -1),
    thicknessM: shown.thicknessM,
    mediumC,
    surfaceC: shown.surfaceTempC,
  }
}

/**
 * Temperature at a depth of the lagging [°C]: with the logarithm of the radius around a cylinder, with its inverse
 * around a sphere, straight through anything flat.
 */
export function temperatureAtC(view: SectionView, depthM: number): number {
  const stretch = view.stretches.find((one) => depthM <= one.toM) ?? view.stretches.at(-1)
  if (!stretch) return view.surfaceC
  const { fromM, toM, innerC, outerC } = stretch
  const inside = Math.min(toM, Math.max(fromM, depthM))
  const passed = resistanceTo(view.core)
  const share = (passed(inside) - passed(fromM)) / (passed(toM) - passed(fromM))
  return innerC + (outerC - innerC) * share
}

/** What rises with depth as the resistance to heat does, up to a factor and a constant. */
function resistanceTo(core: Core): (depthM: number) => number {
  if (core.kind !== 'round') return (depthM) => depthM
  const { radiusM, isSphere } = core
  return isSphere ? (depthM) => -1 / (radiusM + depthM) : (depthM) => Math.log(radiusM + depthM)
}

/** Thin shells, outermost first, each to be drawn over the one before: outer depth and mean temperature. */
export function shells(view: SectionView, count: number): { outerM: number; tempC: number }[] {
  if (view.thicknessM === 0) return []
  return Array.from({ length: count }, (_, at) => {
    const outerM = (view.thicknessM * (count - at)) / count
    return { outerM, tempC: temperatureAtC(view, outerM - view.thicknessM / count / 2) }
  })
}

function coreOf(values: RunValues, bare: Rating): Core | null {
  if (bare.outerDiameterM !== null) {
    const isBurial = values.shape === 'pipe' || values.shape === 'round-duct'
    return {
      kind: 'round',
      radiusM: bare.outerDiameterM / 2,
      isSphere: values.shape === 'sphere',
      buriedM: (isBurial ? values.buryDepthM : undefined) ?? null,
    }
  }
  if (values.shape === 'flat') {
    const facing = values.orientation
    return { kind: 'slab', facing: facing === 'up' || facing === 'down' ? facing : 'side' }
  }
  const [widthM, heightM] = rectangle(values)
  return widthM && heightM
    ? { kind: 'box', halfWidthM: widthM / 2, halfHeightM: heightM / 2 }
    : null
}

/** Width and height of a duct, from its own columns or from a size like `600 x 400` in millimetres. */
function rectangle(values: RunValues): readonly [number | undefined, number | undefined] {
  const named = /(\d+(?:\.\d+)?)\s*[x×]\s*(\d+(?:\.\d+)?)/i.exec(values.size ?? '')
  const fromSize = (at: 1 | 2) => (named?.[at] === undefined ? undefined : Number(named[at]) / 1000)
  return [values.widthM ?? fromSize(1), values.heightM ?? fromSize(2)]
}

/** Between two interfaces lies one layer, made of one piece or more. */
function stretches(values: RunValues, shown: Rating): Stretch[] {
  const { thicknessM, interfaceTempsC, surfaceTempC } = shown
  if (thicknessM === 0) return []
  const endsM = layerEndsM(values, shown)
  const isMatched = interfaceTempsC.length === endsM.length + 1
  const edgesM = isMatched ? [0, ...endsM] : [0, thicknessM]
  const tempsC = isMatched ? interfaceTempsC : [interfaceTempsC[0] ?? surfaceTempC, surfaceTempC]
  return edgesM.slice(1).map((toM, at) => ({
    fromM: edgesM[at] ?? 0,
    toM,
    innerC: tempsC[at] ?? surfaceTempC,
    outerC: tempsC[at + 1] ?? surfaceTempC,
  }))
}

/** Where each layer ends [m]: the one written `?` takes what the others leave of the whole. */
function layerEndsM({ layers }: RunValues, { thicknessM }: Rating): number[] {
  if (layers === undefined) return [thicknessM]
  const givenM = layers.split(';').map((layer) => Number(layer.split(':')[1]) / 1000)
  const fixedM = givenM.reduce((sum, layerM) => sum + (Number.isFinite(layerM) ? layerM : 0), 0)
  return ends(givenM.map((layerM) => (Number.isFinite(layerM) ? layerM : thicknessM - fixedM)))
}

/** Running sums: where each part ends. */
function ends(partsM: readonly number[]): number[] {
  let depthM = 0
  return partsM.map((partM) => {
    depthM += partM
    return depthM
  })
}
