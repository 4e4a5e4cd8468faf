/** What the outer surface radiates and what it takes up of the sun: new, aged and bare. */
import type { Finish } from '#catalogue/types.ts'
import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { Thing } from './standing.ts'

/** Emissivity of a surface without a finish of the catalogue. Source: non-metallic surfaces, ASHRAE 2021 ch. 23 table 12. */
const PLAIN_EMISSIVITY = 0.9
/** Emissivity of bare steel pipe in service. Source: ASHRAE Handbook Fundamentals 2021, ch. 23, table 12. */
const BARE_STEEL_EMISSIVITY = 0.8
/** What a surface of which nothing is known takes up of the sun. Source: common practice, no source; a dark surface. */
const DARK_ABSORPTANCE = 0.9

export interface Surface {
  readonly emissivity: number
  readonly absorptance: number
}

export interface Surfaces {
  readonly new: Surface
  readonly aged: Surface
  readonly bare: Surface
}

export function resolveSurfaces(
  values: RunValues,
  thing: Thing,
  finish: Finish | null,
  findings: Findings,
): Surfaces {
  const { emissivity } = values
  const isLagged = values.thicknessM !== 0
  // In the ground no surface radiates.
  const isBuried = thing.shape.kind === 'buried-pipe'
  if (!isBuried && isLagged && values.finish === undefined && emissivity === undefined) {
    findings.note(
      'finish-assumed',
      `No finish is given: the surface is taken with an emissivity of ${PLAIN_EMISSIVITY}.`,
    )
  }
  if ((values.solarWPerM2 ?? 0) > 0) noteSun(isLagged ? finish : null, thing, findings)
  return {
    new: {
      emissivity: emissivity ?? finish?.emissivityNew ?? PLAIN_EMISSIVITY,
      absorptance: finish?.solarAbsorptanceNew ?? DARK_ABSORPTANCE,
    },
    aged: {
      emissivity: emissivity ?? finish?.emissivityAged ?? PLAIN_EMISSIVITY,
      absorptance: finish?.solarAbsorptanceAged ?? DARK_ABSORPTANCE,
    },
    bare: { emissivity: bareEmissivityOf(values, thing, findings), absorptance: DARK_ABSORPTANCE },
  }
}

function noteSun(finish: Finish | null, { shape }: Thing, findings: Findings): void {
  findings.note(
    'sun',
    `${
      finish
        ? `${finish.name} takes up ${plain(finish.solarAbsorptanceNew, 2)} of the sun when new and ${plain(finish.solarAbsorptanceAged, 2)} when aged`
        : `The surface is taken to take up ${DARK_ABSORPTANCE} of the sun, as a dark one does`
    }. The sun is taken as given on each m² of the surface, for loss and touch: damp and frost are judged at night.${roundWords(shape)}`,
  )
}

/** Shadow over area across: 1/π of a cylinder, 1/4 of a sphere, in sun that falls square on it. */
function roundWords({ kind }: Thing['shape']): string {
  if (kind === 'flat' || kind === 'rect-duct') return ''
  const share = kind === 'sphere' ? 'a quarter' : 'a third'
  return ` That overstates the mean of a round run, whose far side is in its own shadow: for a loss give the mean all round, about ${share} of what falls square on it.`
}

function bareEmissivityOf(values: RunValues, { wall, shape }: Thing, findings: Findings): number {
  if (values.thicknessM === 0 && values.emissivity !== undefined) return values.emissivity
  if (values.bareEmissivity !== undefined) return values.bareEmissivity
  const emissivity = wall?.emissivityBare ?? BARE_STEEL_EMISSIVITY
  if (shape.kind !== 'buried-pipe')
    findings.note(
      'bare-emissivity-assumed',
      `The bare surface is taken with an emissivity of ${plain(emissivity, 2)}${wall ? `, ${wall.name.toLowerCase()} as found in service` : ''}.`,
    )
  return emissivity
}
