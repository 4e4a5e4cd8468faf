/** Whether vapour is kept out of cold work. */
import type { Finish } from '#catalogue/types.ts'
import type { BuildUpLayer } from '#sizing/problem.ts'
import type { Conditions } from './conditions.ts'
import type { Findings } from './findings.ts'

export function noteVapour(
  _layers: readonly BuildUpLayer[],
  _finish: Finish | null,
  _conditions: Conditions,
  _findings: Findings,
): void {}
