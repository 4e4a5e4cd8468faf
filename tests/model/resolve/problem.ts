import type { RunValues } from '#model/fields.ts'
import { resolve } from '#model/resolve/resolve.ts'
import type { Problem } from '#sizing/problem.ts'
import { index } from '../../sizing/catalogue.ts'

/** The problem that values make; a test that expects one fails with what is wrong with them. */
export function problemOf(values: RunValues): Problem {
  const resolved = resolve(values, index)
  if (!resolved.ok) throw new Error(JSON.stringify(resolved.issues, null, 1))
  return resolved.problem
}
