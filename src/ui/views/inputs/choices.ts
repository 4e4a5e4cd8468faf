/** What a field may be chosen from, in parts where there are many. */
import { type FieldKey, fieldOf } from '#model/fields.ts'
import type { CatalogueWords } from '#ui/state/catalogue-words.ts'
import { wordsFor } from '#ui/state/cell-text.ts'

export interface Choice {
  readonly value: string
  readonly label: string
}
export interface ChoicePart {
  /** Empty where the choices need no heading. */
  readonly title: string
  readonly choices: readonly Choice[]
}

export function choicesFor(key: FieldKey, words: CatalogueWords): readonly ChoicePart[] {
  if (words.isListed(key)) {
    const families = Map.groupBy(words.list(key), ({ family }) => family)
    return [...families].map(([title, rows]) => ({
      title,
      choices: rows.map(({ id, name, short = name }) => ({ value: id, label: short })),
    }))
  }
  const field = fieldOf(key)
  if (field.kind === 'flag') return [{ title: '', choices: ['yes', 'no'].map(plain) }]
  return field.kind === 'choice' ? [{ title: '', choices: field.choices.map(plain) }] : []
}

const plain = (value: string): Choice => ({ value, label: wordsFor(value) })
