/** What flows, how much of it, and how much colder it may arrive. */
import type { Point } from '#catalogue/figure.ts'
import {
  heatCapacityCells,
  heatCapacityOf,
  latentHeatCells,
  latentHeatJPerKg,
  type MediumWord,
} from '#catalogue/media.ts'
import type { ArrivalLimit, TableCell } from '#sizing/problem.ts'
import { airDensityKgPerM3, standardPressurePa } from '#solver/index.ts'
import type { RunValues } from '../fields.ts'
import type { Conditions } from './conditions.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Thing } from './standing.ts'

/** Null where the arrival cannot be told; that is a fault where `max_drop_k` asks for it, else a note where a flow is given. */
export function resolveArrival(
  values: RunValues,
  thing: Thing | null,
  conditions: Conditions | null,
  index: CatalogueIndex,
  findings: Findings,
): ArrivalLimit | null {
  const { maxDropK = null } = values
  if (maxDropK === null && values.flowKgPerS === undefined) return null
  if (!hasLength(values, findings)) return null
  const flowKgPerS = flowOf(values, thing, conditions, findings)
  const carrier = conditions && carrierOf(values, conditions.loss.mediumC, index, findings)
  return flowKgPerS === null || !carrier ? null : { ...carrier, maxDropK, flowKgPerS }
}

/** A run without a length has no end to arrive at. */
function hasLength(values: RunValues, findings: Findings): boolean {
  const { shape, maxDropK, lengthM } = values
  if (shape === 'flat' || shape === 'sphere' || shape === 'vessel') {
    const thing = shape === 'flat' ? 'flat surface' : shape
    if (maxDropK === undefined) {
      findings.note('unused', `flow_kg_s is not used for a ${thing}.`)
    } else {
      findings.fault(
        'maxDropK',
        `${plain(maxDropK, 3)} K`,
        `nothing for a ${thing}: it is no line along which a medium flows`,
      )
    }
    return false
  }
  if (lengthM !== undefined) return true
  if (maxDropK === undefined) {
    findings.note('arrival-unknown', 'Where the medium arrives is not told: no length_m is given.')
  } else {
    findings.fault('lengthM', 'nothing', 'the length of the run in m: max_drop_k is judged over it')
  }
  return false
}

/** As given; of a duct also by the velocity of its air. */
function flowOf(
  values: RunValues,
  thing: Thing | null,
  conditions: Conditions | null,
  findings: Findings,
): number | null {
  const { flowKgPerS, velocityMPerS } = values
  if (flowKgPerS !== undefined) return flowKgPerS
  const areaM2 = thing && ductAreaM2(values, thing)
  if (velocityMPerS === undefined || (thing && areaM2 === null)) {
    const isDuct = values.shape === 'round-duct' || values.shape === 'rect-duct'
    findings.fault(
      'flowKgPerS',
      'nothing',
      `what flows in kg/s${isDuct ? ', or velocity_m_s of the air' : ''}: max_drop_k is judged by it`,
    )
    return null
  }
  if (!conditions || areaM2 === null) return null
  const pressurePa = standardPressurePa(values.altitudeM ?? 0)
  const flow = velocityMPerS * areaM2 * airDensityKgPerM3(conditions.loss.mediumC, pressurePa)
  findings.note(
    'flow-by-velocity',
    `At ${plain(velocityMPerS, 2)} m/s ${plain(flow, 3)} kg/s of air flow through the duct.`,
  )
  return flow
}

/** Cross-section of a duct, its sheet being thin [m²]; null for what is none, or carries no air. */
function ductAreaM2({ shape: word, medium }: RunValues, { shape }: Thing): number | null {
  if (medium !== undefined && medium !== 'air') return null
  if (shape.kind === 'rect-duct') return shape.widthM * shape.heightM
  if (word !== 'round-duct' || !('outerDiameterM' in shape)) return null
  return (Math.PI / 4) * shape.outerDiameterM ** 2
}

type Carrier = { readonly cells: readonly TableCell[] } & (
  | { readonly kind: 'drop'; readonly heatCapacityJPerKgK: number }
  | { readonly kind: 'condensate'; readonly latentHeatJPerKg: number }
)

const asCells = (points: readonly Point[]): readonly TableCell[] =>
  points.map(([tempC, value]) => ({ tempC, value }))

/** What the medium gives off its heat by: its heat capacity, or that of condensing. */
function carrierOf(
  values: RunValues,
  mediumC: number,
  index: CatalogueIndex,
  findings: Findings,
): Carrier | null {
  const { heatCapacityJPerKgK } = values
  const medium = mediumWord(values)
  const isSaturated = values.pressureGaugePa !== undefined
  if (heatCapacityJPerKgK !== undefined && !isSaturated) {
    if (medium === 'steam') {
      findings.note(
        'steam-superheated',
        'With a heat capacity given the steam is taken as superheated: it cools along the run and does not condense.',
      )
    }
    return { kind: 'drop', heatCapacityJPerKgK, cells: [] }
  }
  if (medium === 'steam') return condensing(values, mediumC, index, findings)
  if (medium === null) {
    unknown(
      values,
      'medium',
      'nothing',
      { allowed: 'what flows, or its heat_capacity_j_kgk', why: null },
      findings,
    )
    return null
  }
  const found = heatCapacityOf(index.catalogue, { medium, temperatureC: mediumC })
  if (!found.ok) {
    unknown(
      values,
      'heatCapacityJPerKgK',
      'nothing',
      { allowed: 'the heat capacity of the medium in J/kgK', why: found.reason },
      findings,
    )
    return null
  }
  findings.note(
    'heat-capacity',
    `The heat capacity of ${medium} at ${plain(mediumC)} °C is taken as ${plain(found.value, 0)} J/kgK.${found.assumption === null ? '' : ` ${found.assumption}`}`,
  )
  const cells = heatCapacityCells(index.catalogue, { medium, temperatureC: mediumC })
  return { kind: 'drop', heatCapacityJPerKgK: found.value, cells: asCells(cells) }
}

function condensing(
  values: RunValues,
  mediumC: number,
  { catalogue }: CatalogueIndex,
  findings: Findings,
): Carrier | null {
  const found = latentHeatJPerKg(catalogue.steam, mediumC)
  if (!found.ok) {
    unknown(
      values,
      'mediumC',
      `${plain(mediumC)} °C`,
      {
        allowed:
          'a temperature at which steam can be saturated, or heat_capacity_j_kgk if it is superheated',
        why: found.reason,
      },
      findings,
    )
    return null
  }
  if (values.pressureGaugePa === undefined) {
    findings.note(
      'steam-taken-saturated',
      `The steam is taken as dry and saturated at ${plain(mediumC)} °C: it condenses along the run and keeps its temperature. If it is superheated, give its heat_capacity_j_kgk.`,
    )
  } else if (values.heatCapacityJPerKgK !== undefined) {
    findings.note('unused', 'heat_capacity_j_kgk is not used: saturated steam condenses.')
  }
  const cells = asCells(latentHeatCells(catalogue.steam, mediumC))
  return { kind: 'condensate', latentHeatJPerKg: found.value, cells }
}

/** Ducts carry air, and what is given by a pressure is steam; of a pipe nothing is taken for granted. */
function mediumWord({ medium, shape, pressureGaugePa }: RunValues): MediumWord | null {
  if (medium !== undefined) return medium
  if (pressureGaugePa !== undefined) return 'steam'
  return shape === 'round-duct' || shape === 'rect-duct' ? 'air' : null
}

/** What is missing to tell the arrival: a fault where it is limited, else a note. `why`: a whole sentence. */
function unknown(
  { maxDropK }: RunValues,
  key: 'medium' | 'mediumC' | 'heatCapacityJPerKgK',
  found: string,
  missing: { readonly allowed: string; readonly why: string | null },
  findings: Findings,
): void {
  const { allowed, why } = missing
  if (maxDropK !== undefined) {
    findings.fault(key, found, why === null ? allowed : `${allowed}. ${why}`)
  } else {
    const because = why === null ? '' : ` ${why}`
    findings.note(
      'arrival-unknown',
      `Where the medium arrives is not told. To know it, give ${allowed}.${because}`,
    )
  }
}
