/** What is wrong with the cells of a run that were kept as typed. */
import type { Issue } from '#sizing/result.ts'
import { allowedIn, quote } from './cell.ts'
import { type FieldKey, fieldOf } from './fields.ts'
import type { Run } from './job.ts'

export function issuesOfDrafts(run: Run): readonly Issue[] {
  return Object.entries(run.drafts).map(([key, text]) => {
    const field = fieldOf(key as FieldKey)
    return { column: field.column, found: quote(text), allowed: allowedIn(field) }
  })
}
