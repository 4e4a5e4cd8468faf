/** Spheres and vessels: things that are counted by the piece. */
import type { RunValues } from '../fields.ts'
import type { Findings } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import { givenInsideFilm, type Thing, wallOf } from './standing.ts'

export function sphere(values: RunValues, index: CatalogueIndex, findings: Findings): Thing | null {
  const outerDiameterM = diameterOf(values, findings)
  if (values.orientation !== undefined) {
    findings.note('unused', 'orientation is not used for a sphere.')
  }
  if (outerDiameterM === null) return null
  return { shape: { kind: 'sphere', outerDiameterM }, ...piece(values, index, findings) }
}

export function vessel(values: RunValues, index: CatalogueIndex, findings: Findings): Thing | null {
  const outerDiameterM = diameterOf(values, findings)
  const { orientation, lengthM: shellLengthM } = values
  if (orientation !== undefined && orientation !== 'horizontal' && orientation !== 'vertical') {
    findings.fault('orientation', orientation, 'horizontal or vertical: how the vessel stands')
    return null
  }
  if (orientation === undefined) {
    findings.note('stands-assumed', 'The vessel is taken as standing: no orientation is given.')
  }
  if (values.heads === undefined) {
    findings.note('heads-assumed', 'The heads of the vessel are taken as domed: none are given.')
  }
  if (shellLengthM === undefined || shellLengthM === 0) {
    findings.fault(
      'lengthM',
      shellLengthM === undefined ? 'nothing' : '0',
      'the length or height of the shell between the heads in m, more than 0',
    )
    return null
  }
  if (outerDiameterM === null) return null
  return {
    shape: {
      kind: 'vessel',
      outerDiameterM,
      shellLengthM,
      orientation: orientation ?? 'vertical',
      heads: values.heads ?? 'domed',
    },
    ...piece(values, index, findings),
  }
}

function diameterOf({ outerDiameterM, size, shape }: RunValues, findings: Findings): number | null {
  if (size !== undefined) {
    findings.fault('size', size, `nothing for a ${shape}: give its diameter as od_mm`)
  }
  if (outerDiameterM !== undefined) return outerDiameterM
  findings.fault('outerDiameterM', 'nothing', `the outside diameter of the ${shape} in mm`)
  return null
}

function piece(values: RunValues, index: CatalogueIndex, findings: Findings): Omit<Thing, 'shape'> {
  return {
    extent: 1,
    insideFilmWPerM2K: givenInsideFilm(values),
    wall: wallOf(values, 'carbon_steel', index, findings),
    wallM: values.wallM ?? null,
    nominalM: null,
  }
}
