/** What is wrong with a value, as a sentence for the window: fields by their names there, not by their CSV columns. */
import { fields } from '#model/fields.ts'
import type { Issue } from '#sizing/result.ts'

export function issueSentence({ found, allowed }: Issue): string {
  const cure = labelled(allowed)
  // Some cures are whole sentences that name what was found.
  if (/^(?:"|[A-Z][a-z]+ )/.test(cure)) return stopped(cure)
  if (found === '' || found === 'nothing') return stopped(`Give ${cure}`)
  return stopped(`${found} does not fit. Allowed: ${cure}`)
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
