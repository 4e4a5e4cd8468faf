/** Picks one limit of one rated build-up, for the tests that judge by it. */
import type { LimitName, LimitResult, Rating, RunResult } from '#sizing/result.ts'
import { mm } from './catalogue.ts'

export function limitOf({ limits }: Pick<Rating, 'limits'>, name: LimitName): LimitResult {
  const found = limits.find(({ limit }) => limit === name)
  if (!found) throw new Error(`No ${name}`)
  return found
}

export function rungOf({ ladder }: RunResult, thicknessMm: number): Rating {
  const found = ladder.find(({ thicknessM }) => mm(thicknessM) === thicknessMm)
  if (!found) throw new Error(`No rung of ${thicknessMm} mm`)
  return found
}
