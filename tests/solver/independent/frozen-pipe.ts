/**
 * A standing pipe on its way to ice, followed in time: a second implementation of the cooling and freezing times.
 *
 * Neither logarithm nor quasi-steady integral occurs. Cooling steps the heat of the content and of every ring of the
 * insulation forward in time; freezing follows the enthalpy of every ring of water. Fourier's law between rings, heat
 * kept in them, nothing else.
 */
import { at, eliminate, emptyTridiagonal } from './tridiagonal.ts'

export interface LaggedPipe {
  /** Of water and wall together, at one temperature [J/(m·K)]. */
  readonly contentJPerMK: number
  readonly innerRadiusM: number
  readonly outerRadiusM: number
  readonly conductivityWPerMK: number
  /** Heat capacity of the insulation by volume [J/(m³·K)]; 0: it follows at once, as the formula has it. */
  readonly insulationJPerM3K: number
  /** Convection and radiation in one [W/(m²·K)]. */
  readonly filmWPerM2K: number
  readonly airC: number
}

/** Seconds until the content has cooled from start to end; at first the insulation is as warm as in a steady state. */
export function cooledAfterS(
  pipe: LaggedPipe,
  startC: number,
  endC: number,
  { rings = 40, stepS }: { readonly rings?: number; readonly stepS: number },
): number {
  const { conductances, capacities } = ringsOf(pipe, rings)
  const count = capacities.length
  const temps = steadyProfile(conductances, startC, pipe.airC)
  for (let timeS = 0; ; timeS += stepS) {
    const beforeC = at(temps, 0)
    const system = emptyTridiagonal(count)
    // Crank and Nicolson: half of each flow by the temperatures before, half by those after the step.
    for (let i = 0; i < count; i += 1) {
      const held = (capacities[i] as number) / stepS
      const outward = (conductances[i] as number) / 2
      const inward = i > 0 ? (conductances[i - 1] as number) / 2 : 0
      const outerC = i + 1 < count ? at(temps, i + 1) : pipe.airC
      const innerC = i > 0 ? at(temps, i - 1) : 0
      system.main[i] = held + outward + inward
      if (i > 0) system.below[i] = -inward
      if (i + 1 < count) system.above[i] = -outward
      system.right[i] =
        held * at(temps, i) +
        outward * (outerC - at(temps, i)) +
        inward * (innerC - at(temps, i)) +
        (i + 1 < count ? 0 : outward * pipe.airC)
    }
    temps.set(eliminate(system))
    const afterC = at(temps, 0)
    if (afterC <= endC) return timeS + (stepS * (beforeC - endC)) / (beforeC - afterC)
  }
}

/** Content first, then rings; conductance i leads from i to i + 1, the last one to the air [W/(m·K)], [J/(m·K)]. */
function ringsOf(pipe: LaggedPipe, rings: number) {
  const { innerRadiusM, outerRadiusM, conductivityWPerMK: lambda } = pipe
  const edge = (i: number): number => innerRadiusM * (outerRadiusM / innerRadiusM) ** (i / rings)
  /** From the edge of a ring to its middle, area read half way. */
  const half = (fromM: number, toM: number): number =>
    Math.abs(toM - fromM) / (Math.PI * (fromM + toM) * lambda)
  const conductances: number[] = []
  const capacities = [pipe.contentJPerMK]
  let waiting = 0
  for (let i = 0; i < rings; i += 1) {
    const middle = (edge(i) + edge(i + 1)) / 2
    conductances.push(1 / (waiting + half(edge(i), middle)))
    waiting = half(middle, edge(i + 1))
    capacities.push(Math.PI * (edge(i + 1) ** 2 - edge(i) ** 2) * pipe.insulationJPerM3K)
  }
  conductances.push(1 / (waiting + 1 / (2 * Math.PI * outerRadiusM * pipe.filmWPerM2K)))
  return { conductances, capacities }
}

function steadyProfile(
  conductances: readonly number[],
  startC: number,
  airC: number,
): Float64Array {
  const total = conductances.reduce((sum, one) => sum + 1 / one, 0)
  let passed = 0
  return Float64Array.from(conductances, (conductance) => {
    const tempC = startC - ((startC - airC) * passed) / total
    passed += 1 / conductance
    return tempC
  })
}

export interface FreezingPipe {
  readonly boreM: number
  /** From the inner wall of the pipe to the air [m·K/W]. */
  readonly resistanceMKPerW: number
  readonly airC: number
  readonly iceKgPerM3: number
  readonly latentJPerKg: number
  readonly iceWPerMK: number
  /** Heat capacity of ice [J/(kg·K)], > 0; the formula has it that ice cools for nothing. */
  readonly iceJPerKgK: number
}

/**
 * Seconds until a share of the bore is ice, all water being at 0 °C at first.
 *
 * Enthalpy method on rings counted from the wall: the heat that a ring has given up tells whether it is water, in part
 * ice, or ice below 0 °C. Water at 0 °C moves no heat, so the front at 0 °C stands in the outermost ring that is not all
 * ice, as deep in it as its share of ice says. Explicit steps, short enough for the ring that answers fastest.
 */
export function frozenAfterS(pipe: FreezingPipe, iceFraction: number, rings = 15): number {
  const radiusM = pipe.boreM / 2
  const edgeM = (ring: number): number => radiusM * (1 - ring / rings)
  const middleM = (ring: number): number => (edgeM(ring) + edgeM(ring + 1)) / 2
  const kgPerM = Array.from(
    { length: rings },
    (_, ring) => Math.PI * (edgeM(ring) ** 2 - edgeM(ring + 1) ** 2) * pipe.iceKgPerM3,
  )
  const along = (fromM: number, toM: number): number =>
    Math.abs(fromM - toM) / (Math.PI * (fromM + toM) * pipe.iceWPerMK)
  const totalKg = kgPerM.reduce((sum, kg) => sum + kg, 0)
  const shortestS =
    (0.2 * pipe.iceJPerKgK * pipe.iceKgPerM3 * (radiusM / rings) ** 2) / pipe.iceWPerMK

  const tempsC = new Float64Array(rings)
  const flows = new Float64Array(rings)
  let front = 0
  let shareOfFront = 0
  let iceKg = 0
  let timeS = 0
  while (front < rings) {
    const frontKg = kgPerM[front] as number
    const outer2 = edgeM(front) ** 2
    const frontM = Math.sqrt(outer2 - shareOfFront * (outer2 - edgeM(front + 1) ** 2))
    // flows[ring]: outwards, out of each ring.
    for (let ring = 0; ring <= front; ring += 1) {
      const [fromM, fromC] = ring === front ? [frontM, 0] : [middleM(ring), at(tempsC, ring)]
      flows[ring] =
        ring === 0
          ? (fromC - pipe.airC) / (pipe.resistanceMKPerW + along(fromM, radiusM))
          : (fromC - at(tempsC, ring - 1)) / along(fromM, middleM(ring - 1))
    }
    const meltW = at(flows, front)
    const toFreezeKg = Math.min((1 - shareOfFront) * frontKg, iceFraction * totalKg - iceKg)
    // The ice at the front may not thicken by more than a hundredth of a ring unseen.
    const stepS = Math.min(
      front === 0 ? Number.POSITIVE_INFINITY : shortestS,
      (0.01 * frontKg * pipe.latentJPerKg) / meltW,
      (toFreezeKg * pipe.latentJPerKg) / meltW,
    )
    for (let ring = 0; ring < front; ring += 1) {
      const lostJ = (at(flows, ring) - at(flows, ring + 1)) * stepS
      tempsC[ring] = at(tempsC, ring) - lostJ / ((kgPerM[ring] as number) * pipe.iceJPerKgK)
    }
    const frozenKg = (meltW * stepS) / pipe.latentJPerKg
    timeS += stepS
    iceKg += frozenKg
    shareOfFront += frozenKg / frontKg
    if (iceKg >= iceFraction * totalKg * (1 - 1e-12)) return timeS
    if (shareOfFront >= 1 - 1e-12) {
      front += 1
      shareOfFront = 0
    }
  }
  return timeS
}
