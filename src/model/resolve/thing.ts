import { type FieldKey, fieldOf, type RunValues } from '../fields.ts'
import { rectangularDuct, roundDuct } from './duct.ts'
import type { Findings } from './findings.ts'
import { flat } from './flat.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import { pipe } from './pipe.ts'
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
    findings.fault('shape', 'nothing', 'pipe, round-duct, rect-duct or flat')
    return null
  }
  for (const key of unused[shape]) {
    if (values[key] !== undefined)
      findings.note('unused', `${fieldOf(key).column} is not used for a ${shape}.`)
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

/** Dimensions that say nothing about a shape: given all the same, a reader is told that they were not used. */
const unused: Readonly<Record<NonNullable<RunValues['shape']>, readonly FieldKey[]>> = {
  pipe: ['widthM', 'heightM', 'areaM2'],
  'round-duct': ['widthM', 'heightM', 'areaM2'],
  'rect-duct': ['outerDiameterM', 'areaM2'],
  flat: ['outerDiameterM', 'lengthM', 'riseM'],
}
