import type { RunValues } from '../fields.ts'
import type { Findings } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import { givenInsideFilm, type Thing, wallOf } from './standing.ts'

export function flat(values: RunValues, index: CatalogueIndex, findings: Findings): Thing | null {
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
  } else if (values.orientation === 'horizontal' || values.orientation === 'inclined') {
    findings.fault(
      'orientation',
      values.orientation,
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
    insideFilmWPerM2K: givenInsideFilm(values),
    wall: wallOf(values, 'carbon_steel', index, findings),
    wallM: values.wallM ?? null,
    nominalM: null,
  }
}
