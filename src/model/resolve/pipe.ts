import type { PipeSize } from '#catalogue/types.ts'
import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import { cylinder, differs, givenInsideFilm, type Thing, wallOf } from './standing.ts'

export function pipe(values: RunValues, index: CatalogueIndex, findings: Findings): Thing | null {
  let outerDiameterM = values.outerDiameterM
  let wallName = 'carbon_steel'
  let { wallM } = values
  let nominalM: number | null = null
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
    wallM ??= size.item.wallM
    nominalM = nominalSizeM(size.item)
  }
  if (outerDiameterM === undefined) {
    findings.fault('size', 'nothing', 'a size such as DN 50, NPS 2 or CU 28, or an od_mm')
    return null
  }
  if (wallM !== undefined && wallM >= outerDiameterM / 2) {
    findings.fault(
      'wallM',
      `${plain(wallM * 1000, 2)} mm`,
      `the thickness of the wall, less than half of ${plain(outerDiameterM * 1000)} mm`,
    )
    return null
  }
  const shape = cylinder(values, outerDiameterM, findings)
  const insideFilmWPerM2K = givenInsideFilm(values)
  findings.note(
    'inside-neglected',
    insideFilmWPerM2K === null
      ? 'The film inside the pipe and the pipe wall are neglected: the pipe is taken at the temperature of the medium.'
      : 'The pipe wall is neglected; the film inside is as given, on the outside of the pipe.',
  )
  return (
    shape && {
      shape,
      extent: values.lengthM ?? null,
      insideFilmWPerM2K,
      wall: wallOf(values, wallName, index, findings),
      wallM: wallM ?? null,
      nominalM,
    }
  )
}

/** DN and the inch size name one and the same pipe by its bore; in metres, since code tables band it so. */
function nominalSizeM({ dn, npsIn }: PipeSize): number | null {
  if (dn !== null) return dn / 1000
  return npsIn === null ? null : npsIn * 0.0254
}
