import { type FieldKey, fieldOf, type RunValues } from '../fields.ts'
import { rectangularDuct, roundDuct } from './duct.ts'
import type { Findings } from './findings.ts'
import { flat } from './flat.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import { pipe } from './pipe.ts'
import { sphere, vessel } from './round-vessel.ts'
import { type Thing, wallOf } from './standing.ts'

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
    findings.fault('shape', 'nothing', 'pipe, round-duct, rect-duct, flat, sphere or vessel')
    return null
  }
  for (const key of unused[shape]) {
    if (values[key] !== undefined)
      findings.note('unused', `${fieldOf(key).column} is not used for a ${shape}.`)
  }
  if (values.soilWPerMK !== undefined && (values.buryDepthM === undefined || !canBeBuried(shape)))
    findings.note('unused', 'soil_w_mk is not used: the run is not buried.')
  switch (shape) {
    case 'pipe':
      return pipe(values, index, findings)
    case 'round-duct':
      return roundDuct(values, index, findings)
    case 'rect-duct':
      return rectangularDuct(values, index, findings)
    case 'flat':
      return flat(values, index, findings)
    case 'sphere':
      return sphere(values, index, findings)
    case 'vessel':
      return vessel(values, index, findings)
  }
}

const canBeBuried = (shape: NonNullable<RunValues['shape']>): boolean =>
  !unused[shape].includes('buryDepthM')

/** What says nothing about a shape: given all the same, a reader is told that it was not used. */
const unused: Readonly<Record<NonNullable<RunValues['shape']>, readonly FieldKey[]>> = {
  pipe: ['widthM', 'heightM', 'areaM2', 'heads', 'velocityMPerS'],
  'round-duct': ['widthM', 'heightM', 'areaM2', 'heads'],
  'rect-duct': ['outerDiameterM', 'areaM2', 'heads', 'buryDepthM'],
  flat: ['outerDiameterM', 'lengthM', 'riseM', 'heads', 'buryDepthM', 'velocityMPerS'],
  sphere: [
    'widthM',
    'heightM',
    'areaM2',
    'lengthM',
    'riseM',
    'heads',
    'buryDepthM',
    'velocityMPerS',
  ],
  vessel: ['widthM', 'heightM', 'areaM2', 'riseM', 'buryDepthM', 'velocityMPerS'],
}
