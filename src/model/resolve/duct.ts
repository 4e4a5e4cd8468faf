import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import { cylinder, differs, lying, riseOf, type Thing, wallOf } from './standing.ts'

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
  return shape && { shape, extent: values.lengthM ?? null, ...ductInside(values, index, findings) }
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
  const riseM = lying(values, findings) === 'vertical' ? riseOf(values, findings) : null
  return {
    shape: { kind: 'rect-duct', widthM, heightM, riseM },
    extent: values.lengthM ?? null,
    ...ductInside(values, index, findings),
  }
}

function ductInside(
  values: RunValues,
  index: CatalogueIndex,
  findings: Findings,
): Pick<Thing, 'insideFilmWPerM2K' | 'wall'> {
  findings.note(
    'inside-film-assumed',
    `The film inside the duct is taken as ${DUCT_FILM_W_PER_M2_K} W/m²K, air at about 3 m/s.`,
  )
  return {
    insideFilmWPerM2K: DUCT_FILM_W_PER_M2_K,
    wall: wallOf(values, 'galvanised_steel', index, findings),
  }
}
