/** The conductivity of a layer over the temperatures across it, as lines. */
import { conductivityAtWPerMK, sources } from '#solver/index.ts'
import type { Conductivity } from '#solver/types.ts'
import { MINUS } from './formula.ts'
import type { Ledger } from './ledger.ts'

const UNIT = 'W/(m·K)'

export interface LayerTemps {
  /** Number of the layer, from 1. */
  readonly layer: number
  readonly name: string
  readonly conductivity: Conductivity
  readonly innerC: number
  readonly outerC: number
  /** Symbols of both sides, which stand above. */
  readonly inner: string
  readonly outer: string
}

/** Puts down λ_j. */
export function conductivitySteps(ledger: Ledger, temps: LayerTemps): void {
  const { layer, name, conductivity } = temps
  const symbol = `λ_${layer}`
  if (conductivity.kind === 'constant') {
    ledger.given(
      `Conductivity of layer ${layer}, ${name}`,
      symbol,
      conductivity.conductivityWPerMK,
      UNIT,
    )
    return
  }
  const source = 'curve of the catalogue, straight between its points'
  if (conductivity.basis === 'mean') {
    const mean = `θ_m${layer}`
    const meanC = ledger.step(
      `Mean temperature of layer ${layer}`,
      mean,
      `(${temps.inner} + ${temps.outer}) / 2`,
      '°C',
    )
    ledger.step(
      `Conductivity of layer ${layer}, ${name}, at that mean`,
      symbol,
      interpolation(conductivity, meanC, mean),
      UNIT,
      { value: conductivityAtWPerMK(conductivity, meanC), source },
    )
    return
  }
  pointSteps(ledger, temps, conductivity, source)
}

type Curve = Extract<Conductivity, { kind: 'curve' }>

/** Sides as near as this are one temperature: no mean is needed [K]. */
const SAME_K = 1e-6

/** The mean over the layer of a curve of λ itself: trapezoids between the sides and the points of the curve. */
function pointSteps(ledger: Ledger, temps: LayerTemps, curve: Curve, source: string): void {
  const { layer, name, innerC, outerC } = temps
  const symbol = `λ_${layer}`
  if (Math.abs(innerC - outerC) < SAME_K) {
    ledger.step(
      `Conductivity of layer ${layer}, ${name}, at the one temperature it has`,
      symbol,
      interpolation(curve, outerC, temps.outer),
      UNIT,
      { value: conductivityAtWPerMK(curve, outerC), source },
    )
    return
  }
  const [lowC, highC] = innerC < outerC ? [innerC, outerC] : [outerC, innerC]
  const [low, high] = innerC < outerC ? [temps.inner, temps.outer] : [temps.outer, temps.inner]
  const lowλ = `λ_${layer}c`
  const highλ = `λ_${layer}h`
  const at = (words: string, own: string, tempC: number, temp: string): void => {
    ledger.step(
      `Conductivity of layer ${layer}, ${name}, ${words}`,
      own,
      interpolation(curve, tempC, temp),
      UNIT,
      {
        value: conductivityAtWPerMK(curve, tempC),
        source,
      },
    )
  }
  at('at its cold side', lowλ, lowC, low)
  at('at its hot side', highλ, highC, high)
  const between = curve.pointsC.flatMap((tempC, index) =>
    tempC > lowC && tempC < highC ? [{ tempC, value: curve.valuesWPerMK[index] ?? 0 }] : [],
  )
  const stops = [
    { temp: low, value: lowλ },
    ...between.map(({ tempC, value }) => ({ temp: literal(tempC), value: literal(value) })),
    { temp: high, value: highλ },
  ]
  const trapezoids = stops.slice(1).map((stop, index) => {
    const before = stops[index] ?? stop
    return `(${before.value} + ${stop.value}) / 2 × (${stop.temp} ${MINUS} ${before.temp})`
  })
  const sum = trapezoids.length === 1 ? trapezoids[0] : `(${trapezoids.join(' + ')})`
  ledger.step(
    `Mean conductivity over layer ${layer}: the curve integrated from side to side`,
    symbol,
    `${sum} / (${high} ${MINUS} ${low})`,
    UNIT,
    { source: `Kirchhoff’s transform: ${sources.ashrae2021ch23}` },
  )
}

/** λ at a temperature: flat below the curve, the last slope above it (flat if that falls). */
export function interpolation(
  { pointsC, valuesWPerMK }: Curve,
  tempC: number,
  temp: string,
): string {
  const last = pointsC.length - 1
  const pieces = pointsC.findLastIndex((pointC) => pointC <= tempC)
  if (pieces < 0) return literal(valuesWPerMK[0] ?? 0)
  const isBeyond = pieces === last
  const from = isBeyond ? Math.max(0, last - 1) : pieces
  const [startC = 0, endC = 0] = [pointsC[from], pointsC[from + 1]]
  const [start = 0, end = 0] = [valuesWPerMK[from], valuesWPerMK[from + 1]]
  if (last === 0 || (isBeyond && end <= start)) return literal(valuesWPerMK[last] ?? 0)
  const rise = `(${literal(end)} ${MINUS} ${literal(start)})`
  return `${literal(start)} + ${rise} × (${temp} ${MINUS} ${literal(startC)}) / (${literal(endC)} ${MINUS} ${literal(startC)})`
}

/** A number of the catalogue within a formula. */
export function literal(value: number): string {
  const text = String(Number(Math.abs(value).toPrecision(12)))
  return value < 0 ? `(${MINUS}${text})` : text
}
