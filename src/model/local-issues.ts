/** What is wrong with a run before it is computed: cells kept as typed, and a tag that another run has too. */
import type { Issue } from '#sizing/result.ts'
import { allowedIn, quote } from './cell.ts'
import { type FieldKey, fieldOf } from './fields.ts'
import type { Run } from './job.ts'

const none: readonly Issue[] = []

export function localIssues(run: Run, doubledTags: ReadonlySet<string>): readonly Issue[] {
  const { tag } = run.values
  const isDoubled = tag !== undefined && doubledTags.has(tag)
  const drafts = Object.entries(run.drafts)
  if (!isDoubled && drafts.length === 0) return none
  const issues = drafts.map(([key, text]) => {
    const field = fieldOf(key as FieldKey)
    return { column: field.column, found: quote(text), allowed: allowedIn(field) }
  })
  if (!isDoubled) return issues
  return [{ column: 'tag', found: quote(tag), allowed: 'a tag that no other run has' }, ...issues]
}

/** Tags that more than one run has. */
export function doubledTags(runs: readonly Run[]): ReadonlySet<string> {
  const seen = new Set<string>()
  const doubled = new Set<string>()
  for (const { values } of runs) {
    if (values.tag === undefined) continue
    if (seen.has(values.tag)) doubled.add(values.tag)
    seen.add(values.tag)
  }
  return doubled
}
