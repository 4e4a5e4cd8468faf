/** What stands in a pipe and how long it may not freeze. */
import type { WallMaterial } from '#catalogue/types.ts'
import type { FrostLimit } from '#sizing/problem.ts'
import { wallCapacityJPerMK, waterCapacityJPerMK } from '#solver/index.ts'
import type { RunValues } from '../fields.ts'
import type { Conditions } from './conditions.ts'
import { type Findings, plain } from './findings.ts'
import type { Thing } from './standing.ts'

export function resolveFrost(
  values: RunValues,
  thing: Thing | null,
  conditions: Conditions | null,
  findings: Findings,
): FrostLimit | null {
  const { frostHours: hours } = values
  if (hours === undefined || !holdsWater(values, hours, findings)) return null
  const bore = thing && boreOf(thing, findings)
  const start = conditions?.frost
    ? isAboveFreezing(values, conditions.frost.mediumC, findings)
    : true
  if (!thing || !bore || !conditions?.frost || !start) return null
  if (coldestC(thing, conditions.frost) >= 0) {
    findings.note(
      'frost-never',
      `Frost is not judged: at ${plain(conditions.frost.around.airC)} °C the water never freezes.`,
    )
    return null
  }
  noteFrost(values, conditions.frost.mediumC, findings)
  return { hours, iceFraction: values.frostFraction ?? 0, ...bore }
}

/** Frost is judged for water that stands in a pipe, and for nothing else. */
function holdsWater(values: RunValues, hours: number, findings: Findings): boolean {
  const { shape, medium } = values
  if (shape !== undefined && shape !== 'pipe') {
    findings.fault(
      'frostHours',
      `${plain(hours, 2)} h for a ${shape}`,
      'nothing: frost is judged for water standing in a pipe',
    )
    return false
  }
  if (medium !== undefined && medium !== 'water') {
    findings.fault(
      'medium',
      `${medium} beside frost_hours`,
      'water, or nothing: frost is judged for water only; without frost_hours any medium',
    )
    return false
  }
  if (medium === undefined && values.pressureGaugePa !== undefined) {
    findings.fault(
      'frostHours',
      `${plain(hours, 2)} h beside pressure_bar_g`,
      'nothing for steam: frost is judged for water only',
    )
    return false
  }
  return true
}

/** The bore, and what it takes to cool wall and water; the wall has to be known for both. */
function boreOf(
  { shape, wall, wallM }: Thing,
  findings: Findings,
): Omit<FrostLimit, 'hours' | 'iceFraction'> | null {
  if (shape.kind !== 'pipe' && shape.kind !== 'buried-pipe') return null
  if (wallM === null) {
    findings.fault(
      'wallM',
      'nothing',
      'the thickness of the pipe wall in mm, or a size such as DN 50: frost needs the bore',
    )
    return null
  }
  return wall && capacities(shape.outerDiameterM, wallM, wall)
}

function capacities(
  outerDiameterM: number,
  wallM: number,
  { densityKgPerM3, specificHeatJPerKgK: heatCapacityJPerKgK }: WallMaterial,
): Omit<FrostLimit, 'hours' | 'iceFraction'> {
  const boreM = outerDiameterM - 2 * wallM
  return {
    boreM,
    wallJPerMK: wallCapacityJPerMK({ outerDiameterM, boreM, densityKgPerM3, heatCapacityJPerKgK }),
    waterJPerMK: waterCapacityJPerMK(boreM),
    wall: { densityKgPerM3, heatCapacityJPerKgK },
  }
}

function isAboveFreezing(
  { frostStartC, frostFraction }: RunValues,
  startC: number,
  findings: Findings,
): boolean {
  if (startC > 0 || (startC === 0 && (frostFraction ?? 0) > 0)) return true
  const isGiven = frostStartC !== undefined
  findings.fault(
    'frostStartC',
    isGiven ? `${plain(startC)} °C` : `nothing, and a medium of ${plain(startC)} °C at its coldest`,
    startC === 0
      ? 'more than 0 °C, or a frost_fraction above 0: water at 0 °C is where the time would end'
      : 'the temperature of the water when it stops flowing, above 0 °C',
  )
  return false
}

/** The coldest that the pipe can get: a surface under a fixed film, or in the ground, does not see its surroundings. */
function coldestC({ shape }: Thing, { around, film }: NonNullable<Conditions['frost']>): number {
  const seesSurroundings = shape.kind !== 'buried-pipe' && typeof film !== 'object'
  return seesSurroundings ? Math.min(around.airC, around.surroundingsC) : around.airC
}

function noteFrost(values: RunValues, startC: number, findings: Findings): void {
  if (values.medium === undefined) {
    findings.note('frost-water-assumed', 'Frost is judged for water: no medium is given.')
  }
  if (values.frostStartC === undefined) {
    findings.note(
      'frost-start-assumed',
      `The water is taken to stand at ${plain(startC)} °C at first, the coldest of the medium: no frost_start_c is given.`,
    )
  }
  if (values.frostFraction === undefined) {
    findings.note(
      'frost-fraction-assumed',
      'The water may only just reach 0 °C: no frost_fraction of ice is given.',
    )
  }
}
