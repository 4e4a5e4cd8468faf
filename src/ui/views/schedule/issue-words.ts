/** What is wrong with a value, as a sentence for the window: fields by their names there, not by their CSV columns. */
import type { CellReader } from '#model/cell-edit.ts'
import { type FieldKey, fieldOf, fields } from '#model/fields.ts'
import type { Run } from '#model/job.ts'
import { isMissing } from '#model/run-brief.ts'
import type { Issue } from '#sizing/result.ts'

export function issueSentence(issue: Issue): string {
  const { found, allowed } = issue
  const cure = labelled(allowed)
  if (isMissing(issue)) return stopped(`Give ${cure}`)
  return stopped(`${found} does not fit. Allowed: ${cure}`)
}

/** How much is to be done: "1 value to mend, 3 to give". */
export function toDoWords(issues: readonly Issue[]): string {
  const give = issues.filter(isMissing).length
  const mend = issues.length - give
  const parts = [
    ...(mend > 0 ? [{ count: mend, act: 'to mend' }] : []),
    ...(give > 0 ? [{ count: give, act: 'to give' }] : []),
  ]
  return parts
    .map(({ count, act }, at) =>
      at > 0 ? `${count} ${act}` : `${count} ${count === 1 ? 'value' : 'values'} ${act}`,
    )
    .join(', ')
}

/** The issues of a run in the window's words; of what was typed and is no value, in the units it is typed in. */
export function shownIssues(
  run: Run,
  issues: readonly Issue[],
  reader: CellReader,
): readonly Issue[] {
  const drafts = Object.entries(run.drafts) as [FieldKey, string][]
  const typed = new Map(drafts.map(([key, text]) => [fieldOf(key).column, reader.read(key, text)]))
  return issues.map((issue) => {
    const read = typed.get(issue.column)
    const { found, allowed } = read && !read.ok ? read : issue
    return { ...issue, found, allowed: labelled(allowed) }
  })
}

/** The name of a column as the window shows it. */
export function labelOf(column: string): string {
  return labelByColumn.get(column) ?? column
}

const stopped = (sentence: string) => (/[.?]$/.test(sentence) ? sentence : `${sentence}.`)

const labelByColumn: ReadonlyMap<string, string> = new Map(
  fields.map(({ column, label }) => [column, label]),
)

function labelled(text: string): string {
  return text.replaceAll(/\b[a-z0-9]+(?:_[a-z0-9]+)+\b/g, (word) => {
    const label = labelByColumn.get(word)
    return label === undefined ? word : label.toLowerCase()
  })
}
