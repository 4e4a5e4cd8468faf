import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import { cylinder, differs, type Thing, wallOf } from './standing.ts'

export function pipe(values: RunValues, index: CatalogueIndex, findings: Findings): Thing | null {
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
