/** What is lagged: shape, size and extent of a run, and the wall as a bare surface. */
import type { WallMaterial } from '#catalogue/types.ts'
import type { Shape } from '#solver/types.ts'
import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'

export interface Thing {
  readonly shape: Shape
  /** Length [m], or area of a flat surface [m²]; null where not given. */
  readonly extent: number | null
  /** Film between the medium and the wall [W/(m²·K)]; null where it is neglected. */
  readonly insideFilmWPerM2K: number | null
  readonly wall: WallMaterial | null
}

/** Inside film of an air duct at about 3 m/s [W/(m²·K)]. Source: CIBSE Guide C table 3.25, as quoted publicly. */
const DUCT_FILM_W_PER_M2_K = 15.5
/** Diameters this near are the same [m]: a size and an od_mm may both be given if they agree. */
const SAME_DIAMETER_M = 0.0002
/** Heights of a vertical run for which a film is worked out, as of the field `rise_m` [m]. */
const LEAST_RISE_M = 0.05
const MOST_RISE_M = 500

export function resolveThing(
  values: RunValues,
  index: CatalogueIndex,
  findings: Findings,
): Thing | null {
  const thing = shaped(values, index, findings)
  // The wall of a thing is looked up last: where it came to nothing before that, its name is checked all the same.
  if (!thing && values.pipeMaterial !== undefined)
    wallOf(values, values.pipeMaterial, index, findings)
  return thing
}

function shaped(values: RunValues, index: CatalogueIndex, findings: Findings): Thing | null {
  const { shape } = values
  if (shape === undefined) {
    findings.fault('shape', 'nothing', 'pipe, round-duct, rect-duct or flat')
    return null
  }
  switch (shape) {
    case 'pipe':
      return pipe(values, index, findings)
    case 'round-duct':
      return roundDuct(values, index, findings)
    case 'rect-duct':
      return rectangularDuct(values, index, findings)
    case 'flat':
      return flat(values, index, findings)
  }
}

function pipe(values: RunValues, index: CatalogueIndex, findings: Findings): Thing | null {
  let outerDiameterM = values.outerDiameterM
  let wallName = 'carbon_steel'
  if (values.size !== undefined) {
    const size = index.pipeSize(values.size)
    if (!size.ok) {
      findings.fault('size', values.size, size.message)
      return null
    }
    for (const note of size.notes) findings.note('size', note)
    if (outerDiameterM !== undefined && differs(outerDiameterM, size.item.outerDiameterM)) {
      findings.fault(
        'outerDiameterM',
        `${plain(outerDiameterM * 1000)} mm beside ${values.size}`,
        `nothing, or ${plain(size.item.outerDiameterM * 1000)} mm, which is what ${values.size} measures`,
      )
    }
    outerDiameterM = size.item.outerDiameterM
    wallName = size.item.wallMaterial
  }
  if (outerDiameterM === undefined) {
    findings.fault('size', 'nothing', 'a size such as DN 50, NPS 2 or CU 28, or an od_mm')
    return null
  }
  const shape = cylinder(values, outerDiameterM, findings)
  findings.note(
    'inside-neglected',
    'The film inside the pipe and the pipe wall are neglected: the pipe is taken at the temperature of the medium.',
  )
  return (
    shape && {
      shape,
      extent: values.lengthM ?? null,
      insideFilmWPerM2K: null,
      wall: wallOf(values, wallName, index, findings),
    }
  )
}

const differs = (a: number, b: number): boolean => Math.abs(a - b) > SAME_DIAMETER_M

function roundDuct(values: RunValues, index: CatalogueIndex, findings: Findings): Thing | null {
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

function cylinder(values: RunValues, outerDiameterM: number, findings: Findings): Shape | null {
  const orientation = lying(values, findings)
  if (orientation === 'horizontal') return { kind: 'pipe', outerDiameterM, orientation }
  const riseM = riseOf(values, findings)
  return riseM === null ? null : { kind: 'pipe', outerDiameterM, orientation: 'vertical', riseM }
}

function rectangularDuct(
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
        size.ok ? 'width x height such as 600 x 400: the run is a rectangular duct' : size.message,
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

function flat(values: RunValues, index: CatalogueIndex, findings: Findings): Thing | null {
  const { widthM, heightM } = values
  if (values.size !== undefined) {
    findings.fault(
      'size',
      values.size,
      'nothing for a flat surface: give width_mm and height_mm, or area_m2',
    )
  }
  let facing: 'vertical' | 'up' | 'down' = 'vertical'
  if (values.orientation === undefined) {
    findings.note('facing-assumed', 'The surface is taken as vertical: no orientation is given.')
  } else if (values.orientation === 'horizontal') {
    findings.fault(
      'orientation',
      'horizontal',
      'vertical, up or down: a flat surface that lies faces up or down',
    )
  } else {
    facing = values.orientation
  }
  const areaM2 = widthM !== undefined && heightM !== undefined ? widthM * heightM : null
  const lengthM =
    facing === 'vertical'
      ? (heightM ?? null)
      : areaM2 !== null && widthM !== undefined && heightM !== undefined
        ? areaM2 / (2 * (widthM + heightM))
        : null
  if (lengthM === null) {
    findings.note(
      'length-assumed',
      'The film is taken for a surface of 1 m: its height (or width and height where it lies) is not given.',
    )
  }
  return {
    shape: { kind: 'flat', facing, characteristicLengthM: lengthM ?? 1 },
    extent: values.areaM2 ?? areaM2,
    insideFilmWPerM2K: null,
    wall: wallOf(values, 'carbon_steel', index, findings),
  }
}

/** Pipes and ducts lie or stand; only a flat surface faces up or down. */
function lying(values: RunValues, findings: Findings): 'horizontal' | 'vertical' {
  const { orientation } = values
  if (orientation === 'up' || orientation === 'down') {
    findings.fault(
      'orientation',
      orientation,
      'horizontal or vertical; up and down are for flat surfaces',
    )
    return 'horizontal'
  }
  return orientation ?? 'horizontal'
}

function riseOf(values: RunValues, findings: Findings): number | null {
  const riseM = values.riseM ?? values.lengthM
  if (riseM === undefined) {
    findings.fault('riseM', 'nothing', 'the height of the vertical run in m, or its length_m')
    return null
  }
  if (riseM < LEAST_RISE_M || riseM > MOST_RISE_M) {
    findings.fault(
      'riseM',
      `nothing, and a length of ${plain(riseM, 3)} m`,
      `the height of the vertical run, from ${LEAST_RISE_M} to ${MOST_RISE_M} m`,
    )
    return null
  }
  if (values.riseM === undefined) {
    findings.note(
      'rise-assumed',
      `The run is taken to rise over its whole length, ${plain(riseM)} m.`,
    )
  }
  return riseM
}

function wallOf(
  values: RunValues,
  usual: string,
  index: CatalogueIndex,
  findings: Findings,
): WallMaterial | null {
  const wall = index.wallMaterial(values.pipeMaterial ?? usual)
  if (wall.ok) return wall.item
  if (values.pipeMaterial !== undefined)
    findings.fault('pipeMaterial', values.pipeMaterial, wall.message)
  return null
}
