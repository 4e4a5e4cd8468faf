/** What may be chosen for a cell, as names; for a figure also what it would mean. */
import { type FieldKey, fieldOf } from '#model/fields.ts'
import type { Run } from '#model/job.ts'
import type { CatalogueWords, Suggestion } from '#ui/state/catalogue-words.ts'

export function suggestionsFor(
  key: FieldKey | null,
  run: Run,
  words: CatalogueWords,
): readonly Suggestion[] {
  if (!key) return []
  if (key === 'codeFactor') return words.codeFactorsFor(run.values)
  return textsFor(key, run, words).map((value) => ({ value, hint: '' }))
}

function textsFor(key: FieldKey, run: Run, words: CatalogueWords): readonly string[] {
  if (key === 'size') return words.sizesFor(run.values)
  if (words.isListed(key)) return [...new Set(words.list(key).map(({ name }) => name))]
  const field = fieldOf(key)
  if (field.kind === 'choice') return field.choices
  return field.kind === 'flag' ? ['yes', 'no'] : []
}
