import type { Conductivity } from './types.ts'

/**
 * λ of a material at one temperature [W/(m·K)], as the solver extends a curve: flat below its cold end, the last slope
 * above its hot end (flat if that slope falls).
 */
export function conductivityAtWPerMK(conductivity: Conductivity, tempC: number): number {
  if (conductivity.kind === 'constant') return conductivity.conductivityWPerMK
  const segment = segmentAt(conductivity, tempC, 1)
  return segment.startWPerMK + segment.slope * (tempC - segment.startC)
}

/**
 * Temperature difference across a layer that carries a given flow [K].
 *
 * `outerC` is the temperature of its outer side [°C]; `flow` is q·G, heat flux [W/m²] times conduction form [m],
 * positive outwards, so that the result is inner minus outer temperature. For a `point` curve this inverts
 * ∫λ dT = q·G (Kirchhoff's transform, exact); for a `mean` curve λ is read at the layer's mean temperature.
 * Source: ASHRAE Handbook Fundamentals 2021, ch. 23; Incropera, conduction with variable λ.
 */
export function layerDifferenceK(conductivity: Conductivity, outerC: number, flow: number): number {
  if (flow === 0) return 0
  if (conductivity.kind === 'constant') return flow / conductivity.conductivityWPerMK
  return conductivity.basis === 'point'
    ? pointDifferenceK(conductivity, outerC, flow)
    : meanDifferenceK(conductivity, outerC, flow)
}

type Curve = Extract<Conductivity, { kind: 'curve' }>

interface Segment {
  readonly startC: number
  readonly startWPerMK: number
  readonly slope: number
  /** Next end in the direction of travel; infinite beyond the curve. */
  readonly endC: number
}

/** The straight piece of a curve that a traveller at `tempC` enters, going up (+1) or down (−1). */
function segmentAt(curve: Curve, tempC: number, direction: 1 | -1): Segment {
  const { pointsC, valuesWPerMK } = curve
  const last = pointsC.length - 1
  // Index of the piece: −1 below the first point, `last` above the last one.
  let piece = last
  while (piece >= 0) {
    const startC = pointsC[piece] as number
    if (direction > 0 ? startC <= tempC : startC < tempC) break
    piece -= 1
  }
  if (piece < 0) {
    const startC = pointsC[0] as number
    const endC = direction > 0 ? startC : Number.NEGATIVE_INFINITY
    return { startC, startWPerMK: valuesWPerMK[0] as number, slope: 0, endC }
  }
  const startC = pointsC[piece] as number
  const startWPerMK = valuesWPerMK[piece] as number
  if (piece === last) {
    const lastSlope = last > 0 ? slopeOf(curve, last - 1) : 0
    const endC = direction > 0 ? Number.POSITIVE_INFINITY : startC
    return { startC, startWPerMK, slope: Math.max(0, lastSlope), endC }
  }
  const endC = direction > 0 ? (pointsC[piece + 1] as number) : startC
  return { startC, startWPerMK, slope: slopeOf(curve, piece), endC }
}

function slopeOf({ pointsC, valuesWPerMK }: Curve, piece: number): number {
  return (
    ((valuesWPerMK[piece + 1] as number) - (valuesWPerMK[piece] as number)) /
    ((pointsC[piece + 1] as number) - (pointsC[piece] as number))
  )
}

function pointDifferenceK(curve: Curve, outerC: number, flow: number): number {
  const direction = flow > 0 ? 1 : -1
  let left = flow
  let tempC = outerC
  let differenceK = 0
  for (;;) {
    const { startC, startWPerMK, slope, endC } = segmentAt(curve, tempC, direction)
    const here = startWPerMK + slope * (tempC - startC)
    const toEnd =
      Math.abs(endC) === Number.POSITIVE_INFINITY
        ? Number.POSITIVE_INFINITY
        : (here + 0.5 * slope * (endC - tempC)) * (endC - tempC)
    // So written that it ends whatever comes, a flow that is no number too.
    if (!(Math.abs(toEnd) < Math.abs(left))) {
      // here·δ + slope·δ²/2 = left, in the form that keeps its digits.
      return differenceK + (2 * left) / (here + Math.sqrt(here * here + 2 * slope * left))
    }
    left -= toEnd
    differenceK += endC - tempC
    tempC = endC
  }
}

function meanDifferenceK(curve: Curve, outerC: number, flow: number): number {
  const direction = flow > 0 ? 1 : -1
  let meanC = outerC
  for (;;) {
    const { startC, startWPerMK, slope, endC } = segmentAt(curve, meanC, direction)
    // λ(mean)·2(mean − outer) = flow, with λ straight in the mean temperature.
    const atOuter = startWPerMK + slope * (outerC - startC)
    const finite = Math.abs(endC) !== Number.POSITIVE_INFINITY
    const toEnd = finite
      ? 2 * (startWPerMK + slope * (endC - startC)) * (endC - outerC)
      : Number.POSITIVE_INFINITY
    if (!(Math.abs(toEnd) < Math.abs(flow))) {
      return (2 * flow) / (atOuter + Math.sqrt(atOuter * atOuter + 2 * slope * flow))
    }
    meanC = endC
  }
}
