import { airDensityKgPerM3, insideFilmWPerM2K, standardPressurePa } from '#solver/index.ts'
import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import {
  cylinder,
  differs,
  givenInsideFilm,
  lying,
  noteUnusedRise,
  riseOf,
  type Thing,
  wallOf,
} from './standing.ts'

/** Inside film of an air duct at about 3 m/s [W/(m²·K)]. Source: CIBSE Guide C table 3.25, as quoted publicly. */
const DUCT_FILM_W_PER_M2_K = 15.5

export function roundDuct(
  values: RunValues,
  index: CatalogueIndex,
  findings: Findings,
): Thing | null {
  let outerDiameterM = values.outerDiameterM
  if (values.size !== undefined) {
    const size = index.ductSize(values.size)
    const diameterM = size.ok ? size.item.diameterM : null
    if (!size.ok || diameterM === null) {
      findings.fault(
        'size',
        values.size,
        size.ok ? 'a diameter such as D 250: the run is a round duct' : size.message,
      )
      return null
    }
    if (outerDiameterM !== undefined && differs(outerDiameterM, diameterM)) {
      findings.fault(
        'outerDiameterM',
        `${plain(outerDiameterM * 1000)} mm beside ${values.size}`,
        'one of the two, or both the same',
      )
    }
    outerDiameterM = diameterM
  }
  if (outerDiameterM === undefined) {
    findings.fault('size', 'nothing', 'a diameter such as D 250, or an od_mm')
    return null
  }
  const shape = cylinder(values, outerDiameterM, findings)
  const bore = {
    areaM2: (Math.PI / 4) * outerDiameterM * outerDiameterM,
    perimeterM: Math.PI * outerDiameterM,
  }
  return (
    shape && { shape, extent: values.lengthM ?? null, ...ductInside(values, bore, index, findings) }
  )
}

export function rectangularDuct(
  values: RunValues,
  index: CatalogueIndex,
  findings: Findings,
): Thing | null {
  let { widthM, heightM } = values
  if (values.size !== undefined) {
    const size = index.ductSize(values.size)
    if (!size.ok || size.item.widthM === null || size.item.heightM === null) {
      findings.fault(
        'size',
        values.size,
        size.ok || !/[x×*]/i.test(values.size)
          ? 'width x height such as 600 x 400: the run is a rectangular duct'
          : size.message,
      )
      return null
    }
    for (const note of size.notes) findings.note('size', note)
    if (
      (widthM !== undefined && differs(widthM, size.item.widthM)) ||
      (heightM !== undefined && differs(heightM, size.item.heightM))
    ) {
      findings.fault('size', values.size, 'the same as width_mm and height_mm, or those left empty')
    }
    widthM = size.item.widthM
    heightM = size.item.heightM
  }
  if (widthM === undefined)
    findings.fault(
      'widthM',
      'nothing',
      'the outer width of the duct in mm, or a size such as 600 x 400',
    )
  if (heightM === undefined)
    findings.fault(
      'heightM',
      'nothing',
      'the outer height of the duct in mm, or a size such as 600 x 400',
    )
  if (widthM === undefined || heightM === undefined) return null
  const lies = lying(values, findings)
  if (lies === 'inclined') {
    findings.fault(
      'orientation',
      lies,
      'horizontal or vertical: a rectangular duct is reckoned lying or standing',
    )
  }
  const riseM = lies === 'vertical' ? riseOf(values, findings) : null
  if (lies === 'horizontal') noteUnusedRise(values, findings)
  return {
    shape: { kind: 'rect-duct', widthM, heightM, riseM },
    extent: values.lengthM ?? null,
    ...ductInside(
      values,
      { areaM2: widthM * heightM, perimeterM: 2 * (widthM + heightM) },
      index,
      findings,
    ),
  }
}

/** Cross-section of the air: the duct's own, its sheet being thin. */
interface Bore {
  readonly areaM2: number
  readonly perimeterM: number
}

function ductInside(
  values: RunValues,
  bore: Bore,
  index: CatalogueIndex,
  findings: Findings,
): Pick<Thing, 'insideFilmWPerM2K' | 'insideAir' | 'wall' | 'wallM' | 'nominalM'> {
  return {
    ...ductFilm(values, bore, findings),
    wall: wallOf(values, 'galvanised_steel', index, findings),
    wallM: values.wallM ?? null,
    nominalM: null,
  }
}

/** Film inside: as given, else by the velocity of the air, else of the usual velocity. */
function ductFilm(
  values: RunValues,
  bore: Bore,
  findings: Findings,
): Pick<Thing, 'insideFilmWPerM2K' | 'insideAir'> {
  const given = givenInsideFilm(values)
  if (given !== null) {
    if (values.velocityMPerS !== undefined)
      findings.note(
        'unused',
        'velocity_m_s is not used for the film inside: inside_film_w_m2k is given.',
      )
    return { insideFilmWPerM2K: given }
  }
  const airC = values.mediumC ?? USUAL_DUCT_AIR_C
  const pressurePa = standardPressurePa(values.altitudeM ?? 0)
  const velocityMPerS = ductVelocityMPerS(values, bore, airC, pressurePa)
  noteContradiction(values, bore, airC, pressurePa, findings)
  if (velocityMPerS === null) {
    findings.note(
      'inside-film-assumed',
      `The film inside the duct is taken as ${DUCT_FILM_W_PER_M2_K} W/m²K, air at about 3 m/s.`,
    )
    return { insideFilmWPerM2K: DUCT_FILM_W_PER_M2_K }
  }
  const hydraulicDiameterM = (4 * bore.areaM2) / bore.perimeterM
  const film = insideFilmWPerM2K({ velocityMPerS, hydraulicDiameterM, airC, pressurePa })
  findings.note(
    'inside-film',
    `The film inside the duct is ${plain(film)} W/m²K, of air at ${plain(velocityMPerS, 2)} m/s in a smooth duct.`,
  )
  const flowKgPerS = values.velocityMPerS === undefined ? (values.flowKgPerS ?? null) : null
  return { insideFilmWPerM2K: film, insideAir: { velocityMPerS, flowKgPerS, airC } }
}

/** Only for the film of a duct whose air has no temperature yet: that is a fault of its own. */
const USUAL_DUCT_AIR_C = 20

function ductVelocityMPerS(
  { velocityMPerS, flowKgPerS, medium }: RunValues,
  { areaM2 }: Bore,
  airC: number,
  pressurePa: number,
): number | null {
  if (velocityMPerS !== undefined) return velocityMPerS
  if (flowKgPerS === undefined || (medium !== undefined && medium !== 'air')) return null
  return flowKgPerS / (airDensityKgPerM3(airC, pressurePa) * areaM2)
}

/** Flow and velocity are rounded, and the bore is that of the outside: within this share they agree. */
const SAME_FLOW_SHARE = 0.1

function noteContradiction(
  values: RunValues,
  bore: Bore,
  airC: number,
  pressurePa: number,
  findings: Findings,
): void {
  const { velocityMPerS, ...others } = values
  const byFlowMPerS = ductVelocityMPerS(others, bore, airC, pressurePa)
  if (velocityMPerS === undefined || byFlowMPerS === null) return
  if (Math.abs(byFlowMPerS / velocityMPerS - 1) <= SAME_FLOW_SHARE) return
  findings.note(
    'flow-velocity',
    `flow_kg_s and velocity_m_s do not agree: ${plain(values.flowKgPerS ?? 0, 3)} kg/s of air would flow at ${plain(byFlowMPerS, 2)} m/s, not ${plain(velocityMPerS, 2)} m/s. The film inside goes by the velocity, the arrival by the flow. Check both.`,
  )
}
