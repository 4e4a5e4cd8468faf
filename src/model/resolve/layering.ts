/** Rules of site practice that a build-up brings with it, each said once. Source: layering rules of the catalogue. */
import type { Finish, Material } from '#catalogue/types.ts'
import type { RunValues } from '../fields.ts'
import type { ResolvedBuildUp } from './build-up.ts'
import type { Conditions } from './conditions.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Thing } from './standing.ts'

/** Length between vapour stops [m]. Source: rule `vapour_stops`, ASHRAE Handbook Fundamentals 2021, ch. 23. */
const VAPOUR_STOPS_M = 6
/** What a pipe grows for each metre and kelvin. Source: rule `pipe_expansion`, TIASA s3.5: 1 mm per metre per 100 K. */
const EXPANSION_PER_K = 1e-5
/** Width of a joint that takes up movement [m]. Source: rule `expansion_joint`, TIASA s2.6. */
const JOINT_M = 0.04
/** Half of that has to be left when it has closed. Source: common practice, no source. */
const JOINT_CLOSES = 0.5

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
  if (thing.shape.kind === 'pipe') {
    noteMovement(thing, conditions, findings)
    noteNesting(materials, findings)
  }
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

function noteMovement({ extent }: Thing, { touch, damp }: Conditions, findings: Findings): void {
  if (extent === null) return
  const { airC } = touch.around
  const farthestK = Math.max(Math.abs(touch.mediumC - airC), Math.abs(damp.mediumC - airC))
  const movementM = extent * farthestK * EXPANSION_PER_K
  if (movementM <= JOINT_M * JOINT_CLOSES) return
  findings.note(
    'movement',
    `The pipe moves by about ${plain(movementM * 1000, 0)} mm over its ${plain(extent)} m (1 mm per metre per 100 K): rigid lagging needs joints, about ${JOINT_M * 1000} mm wide and packed (TIASA s2.6, s3.5).`,
  )
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
