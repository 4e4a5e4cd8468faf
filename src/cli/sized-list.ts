/** Runs that are sized as they are asked for: the results of a long list do not fit into memory at once. */
import type { RunValues } from '#model/fields.ts'
import { type CatalogueIndex, sizeRun, withDefaults } from '#model/size-run.ts'
import { isJudged, meetsLimits, type SizedRun } from '#report/run-words.ts'
import type { InputRun } from './input.ts'
import type { OpenList } from './list.ts'

export class SizedList implements Iterable<SizedRun> {
  /** Tags of the runs that do not meet their limits, as far as they were sized. */
  readonly failing = new Set<string>()
  /** Tags of the runs that no limit was judged for. */
  readonly unjudged = new Set<string>()
  readonly #runs: readonly InputRun[]
  readonly #defaults: RunValues
  readonly #index: CatalogueIndex

  constructor({ runs, defaults, index }: OpenList) {
    this.#runs = runs
    this.#defaults = defaults
    this.#index = index
  }

  get size(): number {
    return this.#runs.length
  }

  *[Symbol.iterator](): Iterator<SizedRun> {
    for (const { values } of this.#runs) {
      const outcome = sizeRun(values, this.#defaults, this.#index)
      if (!outcome.ok) throw new Error(`${values.tag} was found fit to be sized, and is not`)
      if (!meetsLimits(outcome.result)) this.failing.add(outcome.result.tag)
      if (!isJudged(outcome.result)) this.unjudged.add(outcome.result.tag)
      yield { values: withDefaults(values, this.#defaults), result: outcome.result }
    }
  }
}
