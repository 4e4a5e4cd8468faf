/**
 * Valves and flange pairs as area of bare surface or as metres of insulated pipe. The two conventions are never mixed:
 * bare fittings go by area, lagged ones by length.
 */
import {
  between,
  clamped,
  type Figure,
  figureText,
  known,
  type Point,
  rising,
  unknown,
} from './figure.ts'
import type { Catalogue, FittingItem, FittingLength } from './types.ts'

const names: Readonly<Record<FittingItem, string>> = {
  'flange-pair': 'flange pair',
  valve: 'valve',
}

/**
 * Bare surface of one fitting [m²], linear in the outside diameter between the pipes of the table. Beyond its ends the
 * area grows with the square of the diameter, as between bodies of the same form, and the assumption says so.
 */
export function fittingAreaM2(
  { fittingAreas }: Catalogue,
  item: FittingItem,
  outerDiameterM: number,
  pressureClass = 150,
): Figure {
  const rows = fittingAreas.filter((row) => row.item === item)
  const ofClass = rows.filter((row) => row.pressureClass === pressureClass)
  const points = rising(ofClass.map((row): Point => [row.pipeOuterDiameterM, row.areaM2]))
  const [first, last] = [points[0], points.at(-1)]
  if (!first || !last) {
    const classes = [...new Set(rows.map((row) => row.pressureClass))].join(' and ')
    return unknown(
      `The catalogue holds no area of a ${names[item]} in class ${pressureClass}, only in class ${classes}.`,
    )
  }
  const inside = between(points, outerDiameterM)
  if (inside !== null) return known(inside)
  const [endM, areaM2] = outerDiameterM < first[0] ? first : last
  return known(
    areaM2 * (outerDiameterM / endM) ** 2,
    `The area of a ${names[item]} is tabled for pipes of ${mm(first[0])} to ${mm(last[0])} mm; for ${mm(outerDiameterM)} mm it is scaled with the square of the diameter.`,
  )
}

/**
 * Metres of the lagged pipe that lose as much as one lagged fitting, linear in outside diameter and in the temperature
 * of the medium; beyond the table its nearest value, and the assumption says so.
 */
export function laggedLengthM(
  { fittingLengths }: Catalogue,
  item: FittingItem,
  outerDiameterM: number,
  mediumC: number,
): Figure {
  const rows = fittingLengths.filter((row) => row.item === item && row.lagged)
  if (rows.length === 0)
    return unknown(`The catalogue holds no length for a lagged ${names[item]}.`)
  const bySize = Map.groupBy(rows, (row) => row.pipeOuterDiameterM)
  const lengths = rising(
    [...bySize].map(([sizeM, ofSize]): Point => [sizeM, lengthAt(ofSize, mediumC)]),
  )
  const atM = clamped(lengths, outerDiameterM)
  const temperatures = rows.map((row): Point => [row.mediumC, row.lengthM])
  const atC = clamped(temperatures, mediumC)
  const taken = [
    ...(atM === outerDiameterM ? [] : [`at ${mm(atM)} mm instead of ${mm(outerDiameterM)} mm`]),
    ...(atC === mediumC ? [] : [`at ${figureText(atC)} °C instead of ${figureText(mediumC)} °C`]),
  ]
  return known(
    between(lengths, atM) ?? 0,
    taken.length === 0
      ? null
      : `The length for a lagged ${names[item]} is taken ${taken.join(' and ')}, where its table ends.`,
  )
}

function lengthAt(ofSize: readonly FittingLength[], mediumC: number): number {
  const points = rising(ofSize.map((row): Point => [row.mediumC, row.lengthM]))
  return between(points, clamped(points, mediumC)) ?? 0
}

const mm = (valueM: number): string => figureText(valueM * 1000)

/** What supports within the lagging add, as a share of the loss of the straight pipe; 0 where no row says so. */
export const supportFraction = (
  { supportAllowances }: Catalogue,
  place: 'indoors' | 'outdoors',
): number => supportAllowances.find((row) => row.place === place)?.lossFraction ?? 0

/** What the tables do not hold, as the trade counts it. */
export interface UsualFitting {
  readonly item: 'bend' | 'tee' | 'reducer' | 'strainer' | 'end'
  readonly countsAs: 'pipe' | 'valve' | 'end disc'
  readonly why: string
  readonly source: string
}

const practice = 'common practice, no source'
const inLength = 'Lies within the length of the run, which is measured through it.'
export const usualFittings: readonly UsualFitting[] = [
  { item: 'bend', countsAs: 'pipe', why: inLength, source: practice },
  { item: 'tee', countsAs: 'pipe', why: inLength, source: practice },
  { item: 'reducer', countsAs: 'pipe', why: inLength, source: practice },
  {
    item: 'strainer',
    countsAs: 'valve',
    why: 'Has a body and flanges like a valve of its size.',
    source: practice,
  },
  {
    item: 'end',
    countsAs: 'end disc',
    why: 'A bare end loses heat over the disc that closes the pipe.',
    source: practice,
  },
]

/** Disc that closes a pipe or duct of this outside diameter [m²]. */
export const endDiscAreaM2 = (outerDiameterM: number): number =>
  (Math.PI / 4) * outerDiameterM * outerDiameterM
