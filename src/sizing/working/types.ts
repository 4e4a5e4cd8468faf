/** The working of one run: the whole calculation as a document that a person can repeat line by line. */

/** A number as it stands on the page. */
export interface Figure {
  readonly symbol: string
  /** As calculated, unrounded. */
  readonly value: number
  /** As printed, with as many digits as the lines that use it need. */
  readonly printed: string
  /** Empty for a bare number. */
  readonly unit: string
}

/** One line: what it is in words, the formula in symbols, the numbers put in, and what comes out. */
export interface Step extends Figure {
  readonly words: string
  /** In the grammar of `formula.ts`; null for a value that is given or found by search. */
  readonly formula: string | null
  /** What the symbols of the formula stand for, in the order in which they appear; each was printed before. */
  readonly inputs: readonly Figure[]
  readonly source: string | null
  /** Where the formula holds, and whether it does here; null where there is no limit. */
  readonly validity: string | null
}

export interface Table {
  readonly headers: readonly string[]
  readonly rows: readonly (readonly string[])[]
}

export interface Section {
  readonly title: string
  /** The design condition in words; null where none applies. */
  readonly condition: string | null
  /** What is to be said first. */
  readonly texts: readonly string[]
  readonly steps: readonly Step[]
  readonly table: Table | null
}

export interface Working {
  readonly tag: string
  readonly title: string
  readonly sections: readonly Section[]
}
