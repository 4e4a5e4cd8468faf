/** Names for ids of the catalogue, both ways: cells show names and keep ids. */
import { bareName } from '#catalogue/nearest.ts'
import type { Catalogue, CodeTable } from '#catalogue/types.ts'
import type { CellReader } from '#model/cell-edit.ts'
import { writeDecimal } from '#model/decimal.ts'
import type { FieldKey, RunValues } from '#model/fields.ts'

interface Named {
  readonly id: string
  readonly name: string
  /** What the row is one of; empty where a list needs no parts. */
  readonly family: string
  /** What tells it from the others of its family, where the name says the family too. */
  readonly short?: string
}

/** What may be typed, and what it would mean. */
export interface Suggestion {
  readonly value: string
  readonly hint: string
}

/** Code tables of one law stand together; the edition and what they are for tell them apart. */
const codeTable = ({ id, name, edition, service }: CodeTable): Named => ({
  id,
  name: `${name}, ${edition}: ${service}`,
  family: name,
  short: `${edition}: ${service}`,
})

export class CatalogueWords {
  readonly #catalogue: Catalogue
  readonly #lists: ReadonlyMap<FieldKey, readonly Named[]>
  readonly #meant = new Map<FieldKey, ReadonlyMap<string, Named>>()

  constructor(catalogue: Catalogue) {
    this.#catalogue = catalogue
    this.#lists = new Map<FieldKey, readonly Named[]>([
      ['material', catalogue.materials],
      ['finish', catalogue.finishes.map((row) => ({ ...row, family: row.category }))],
      ['fuel', catalogue.fuels.map((row) => ({ ...row, family: '' }))],
      ['pipeMaterial', catalogue.wallMaterials.map((row) => ({ ...row, family: '' }))],
      ['codeTable', catalogue.codeTables.map(codeTable)],
    ])
    for (const [key, list] of this.#lists) {
      // As the catalogue is searched: without regard to case, spaces and joining marks.
      this.#meant.set(
        key,
        new Map([
          ...list.map((row) => [bareName(row.name), row] as const),
          ...list.map((row) => [bareName(row.id), row] as const),
        ]),
      )
    }
  }

  /** Fields whose values are rows of the catalogue. */
  isListed(key: FieldKey): boolean {
    return this.#lists.has(key)
  }

  list(key: FieldKey): readonly Named[] {
    return this.#lists.get(key) ?? []
  }

  nameOf(key: FieldKey, value: string): string {
    return this.#meant.get(key)?.get(bareName(value))?.name ?? value
  }

  /** The id of what is named, or the text itself where no row is called so. */
  idOf(key: FieldKey, text: string): string {
    return this.#meant.get(key)?.get(bareName(text))?.id ?? text
  }

  /** Sizes that can be bought for the shape of a run. */
  sizesFor({ shape }: RunValues): readonly string[] {
    if (shape === 'rect-duct' || shape === 'round-duct') {
      const isRound = shape === 'round-duct'
      const sizes = this.#catalogue.ductSizes.filter(
        ({ diameterM }) => (diameterM !== null) === isRound,
      )
      return [...new Set(sizes.map(({ label }) => label))]
    }
    if (shape !== undefined && shape !== 'pipe') return []
    return [...new Set(this.#catalogue.pipeSizes.map(({ label }) => label))]
  }

  /** Factors that the code table of a run puts on its thicknesses, with what for. */
  codeFactorsFor({ codeTable: table }: RunValues): readonly Suggestion[] {
    const id = table === undefined ? '' : this.idOf('codeTable', table)
    const factors = this.#catalogue.codeTables.find((row) => row.id === id)?.factors ?? []
    return [...Map.groupBy(factors, ({ factor }) => factor)].map(([factor, rows]) => ({
      value: writeDecimal(factor),
      hint: rows.map(({ appliesTo }) => appliesTo).join('; or '),
    }))
  }

  /** A reader that knows names besides. */
  reading(reader: CellReader): CellReader {
    return { ...reader, read: (key, text) => reader.read(key, this.idOf(key, text)) }
  }
}
