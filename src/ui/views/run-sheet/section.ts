/** What the section drawing shows of one rung: sizes, layers and temperatures, without pixels. */
import type { RunValues } from '#model/fields.ts'
import type { Rating } from '#sizing/result.ts'

/** The bare thing in the middle. Half sizes in metres, since all is drawn from the middle outwards. */
export type Core =
  | { readonly kind: 'round'; readonly radiusM: number }
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
  const mediumC = values.mediumC ?? bare.interfaceTempsC[0] ?? bare.surfaceTempC
  return {
    core,
    stretches: stretches(shown),
    jointsM: joints(shown.piecesM).slice(0, -1),
    thicknessM: shown.thicknessM,
    mediumC,
    surfaceC: shown.surfaceTempC,
  }
}

/** Temperature at a depth of the lagging [°C]: logarithmic around a cylinder, straight through anything flat. */
export function temperatureAtC(view: SectionView, depthM: number): number {
  const stretch = view.stretches.find((one) => depthM <= one.toM) ?? view.stretches.at(-1)
  if (!stretch) return view.surfaceC
  const { fromM, toM, innerC, outerC } = stretch
  const inside = Math.min(toM, Math.max(fromM, depthM))
  const share =
    view.core.kind === 'round'
      ? Math.log((view.core.radiusM + inside) / (view.core.radiusM + fromM)) /
        Math.log((view.core.radiusM + toM) / (view.core.radiusM + fromM))
      : (inside - fromM) / (toM - fromM)
  return innerC + (outerC - innerC) * share
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
  if (bare.outerDiameterM !== null) return { kind: 'round', radiusM: bare.outerDiameterM / 2 }
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

/** Interfaces belong to pieces where their numbers match; pieces of one material are one stretch. */
function stretches({ piecesM, interfaceTempsC, thicknessM, surfaceTempC }: Rating): Stretch[] {
  if (thicknessM === 0) return []
  const isPerPiece = interfaceTempsC.length === piecesM.length + 1
  const endsM = isPerPiece ? [0, ...joints(piecesM)] : [0, thicknessM]
  const tempsC = isPerPiece ? interfaceTempsC : [interfaceTempsC[0] ?? surfaceTempC, surfaceTempC]
  return endsM.slice(1).map((toM, at) => ({
    fromM: endsM[at] ?? 0,
    toM,
    innerC: tempsC[at] ?? surfaceTempC,
    outerC: tempsC[at + 1] ?? surfaceTempC,
  }))
}

function joints(piecesM: readonly number[]): number[] {
  let depthM = 0
  return piecesM.map((pieceM) => {
    depthM += pieceM
    return depthM
  })
}
