/** Rules of site practice that a build-up brings with it, each said once. Source: layering rules of the catalogue. */
import type { Finish, Material } from '#catalogue/types.ts'
import type { RunValues } from '../fields.ts'
import type { ResolvedBuildUp } from './build-up.ts'
import type { Conditions } from './conditions.ts'
import type { Findings } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Thing } from './standing.ts'

/** Length between vapour stops [m]. Source: rule `vapour_stops`, ASHRAE Handbook Fundamentals 2021, ch. 23. */
const VAPOUR_STOPS_M = 6

export function noteLayering(
  values: RunValues,
  thing: Thing,
  { layers }: ResolvedBuildUp,
  finish: Finish | null,
  conditions: Conditions,
  index: CatalogueIndex,
  findings: Findings,
): void {
  if (layers.length === 0) return
  const materials = layers.flatMap(({ material: { name } }): Material[] => {
    const found = index.material(name)
    return found.ok ? [found.item] : []
  })
  noteCold(values, conditions, findings)
  if (thing.shape.kind === 'pipe') noteNesting(materials, findings)
  noteSpacers(thing, materials.at(-1), finish, findings)
}

function noteCold(values: RunValues, { damp }: Conditions, findings: Findings): void {
  if (damp.mediumC >= damp.around.airC) return
  if ((values.supports ?? 0) > 0) {
    findings.note(
      'cold-projections',
      'Cold work: lag what sticks out of it, such as supports, for four times the thickness of the lagging (TIASA s4.6; ASHRAE ch. 23).',
    )
  }
  if (damp.mediumC < 0 && (values.lengthM ?? 0) > VAPOUR_STOPS_M) {
    findings.note(
      'vapour-stops',
      `Cold work: vapour stops every 4.5 to ${VAPOUR_STOPS_M} m or at every fitting keep a leak from running along the pipe (ASHRAE ch. 23).`,
    )
  }
}

/** Two rigid layers on a pipe: the outer one has to fit over the inner. */
function noteNesting(materials: readonly Material[], findings: Findings): void {
  const sections = materials.filter(({ form }) => form.includes('pipe section'))
  if (sections.length < 2) return
  findings.note(
    'nesting',
    'Sections over sections: the outer one is that of the pipe size whose outside diameter the inner layer has (ASTM C585).',
  )
}

function noteSpacers(
  { shape }: Thing,
  outermost: Material | undefined,
  finish: Finish | null,
  findings: Findings,
): void {
  const isLying = shape.kind === 'pipe' && shape.orientation === 'horizontal'
  const isSoft = outermost !== undefined && /mat|blanket/.test(outermost.form)
  const isSheet = finish !== null && /metal/.test(finish.category)
  if (isLying && isSoft && isSheet) {
    findings.note(
      'cladding-spacers',
      `Sheet over ${outermost.name.toLowerCase()} needs supports at least every metre on a lying pipe (TIASA s3.5).`,
    )
  }
}
