/** Names for ids of the catalogue, both ways: cells show names and keep ids. */
import type { Catalogue } from '#catalogue/types.ts'
import type { CellReader } from '#model/cell-edit.ts'
import type { FieldKey, RunValues } from '#model/fields.ts'

interface Named {
  readonly id: string
  readonly name: string
  /** What the row is one of; empty where a list needs no parts. */
  readonly family: string
}

export class CatalogueWords {
  readonly #catalogue: Catalogue
  readonly #lists: ReadonlyMap<FieldKey, readonly Named[]>
  readonly #nameById = new Map<FieldKey, ReadonlyMap<string, string>>()
  readonly #idByName = new Map<FieldKey, ReadonlyMap<string, string>>()

  constructor(catalogue: Catalogue) {
    this.#catalogue = catalogue
    this.#lists = new Map<FieldKey, readonly Named[]>([
      ['material', catalogue.materials],
      ['finish', catalogue.finishes.map((row) => ({ ...row, family: row.category }))],
      ['fuel', catalogue.fuels.map((row) => ({ ...row, family: '' }))],
      ['pipeMaterial', catalogue.wallMaterials.map((row) => ({ ...row, family: '' }))],
    ])
    for (const [key, list] of this.#lists) {
      this.#nameById.set(key, new Map(list.map(({ id, name }) => [id, name])))
      this.#idByName.set(key, new Map(list.map(({ id, name }) => [name.toLowerCase(), id])))
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
    return this.#nameById.get(key)?.get(value) ?? value
  }

  /** The id of a name, or the text itself where no name is like it. */
  idOf(key: FieldKey, text: string): string {
    return this.#idByName.get(key)?.get(text.trim().toLowerCase()) ?? text
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
    return shape === 'flat' ? [] : [...new Set(this.#catalogue.pipeSizes.map(({ label }) => label))]
  }

  /** A reader that knows names besides. */
  reading(reader: CellReader): CellReader {
    return { ...reader, read: (key, text) => reader.read(key, this.idOf(key, text)) }
  }
}
