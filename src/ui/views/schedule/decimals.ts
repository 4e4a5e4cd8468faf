/** Decimals of every number column, the same all the way down it. */
import type { Run } from '#model/job.ts'
import { decimalsOf } from '#ui/state/cell-text.ts'
import type { UnitSystem } from '#units/quantities.ts'
import type { Column } from './columns.ts'

export function numberColumns(
  runs: readonly Run[],
  columns: readonly Column[],
  system: UnitSystem,
): ReadonlyMap<string, number> {
  return new Map(
    columns.flatMap(({ id, key, isNumber, result }) => {
      if (!key || !isNumber || result) return []
      const values = runs.flatMap(({ values }) => {
        const value = values[key]
        return typeof value === 'number' ? [value] : []
      })
      return [[id, decimalsOf(values, key, system, key === 'lengthM' ? 1 : 0)]]
    }),
  )
}

/** The same function, but its last map again as long as the next one equals it. */
export function stable(make: () => ReadonlyMap<string, number>): () => ReadonlyMap<string, number> {
  let last: ReadonlyMap<string, number> = new Map()
  return () => {
    const next = make()
    const isSame =
      next.size === last.size && [...next].every(([id, value]) => last.get(id) === value)
    if (!isSame) last = next
    return last
  }
}
