/** One table of the catalogue as words, whatever it holds. */
import type { Confidence, Provenance } from '#catalogue/types.ts'

export interface CatalogueRow {
  readonly id: string
  readonly cells: readonly string[]
  readonly note: string
  readonly source: string
  readonly confidence: Confidence
  /** All of it in lower case, to search in. */
  readonly text: string
}
export interface CatalogueTable {
  readonly title: string
  readonly about: string
  readonly heads: readonly { readonly label: string; readonly isNumber: boolean }[]
  readonly rows: readonly CatalogueRow[]
}

type Head = readonly [label: string, isNumber?: boolean]

/** Makes a table of a list: `describe` gives the cells of a row. */
export function table<T extends Provenance>(
  title: string,
  about: string,
  heads: readonly Head[],
  list: readonly T[],
  describe: (row: T) => {
    readonly id: string
    readonly cells: readonly string[]
    readonly note?: string
  },
): CatalogueTable {
  const rows = list.map((row) => {
    const { id, cells, note = '' } = describe(row)
    const { source, confidence } = row
    return {
      id,
      cells,
      note,
      source,
      confidence,
      text: [...cells, note, source].join(' ').toLowerCase(),
    }
  })
  return {
    title,
    about,
    heads: heads.map(([label, isNumber = false]) => ({ label, isNumber })),
    rows,
  }
}

/** How far a row can be trusted, in words. */
export const confidenceWords: Readonly<Record<Confidence, string>> = {
  found: 'read in the source',
  memory: 'verify against your own copy',
  estimate: 'illustrative',
}
