/** How this person likes the window; kept by the host, applied to the page. */
import type { Host, Preferences as Kept } from '#contract/host.ts'

export class Preferences {
  #kept: Kept = $state.raw() as Kept
  readonly #write: Host['preferences.write']

  constructor(kept: Kept, write: Host['preferences.write']) {
    this.#kept = kept
    this.#write = write
    this.#apply()
  }

  get theme(): Kept['theme'] {
    return this.#kept.theme
  }
  get units(): Kept['units'] {
    return this.#kept.units
  }
  get density(): Kept['density'] {
    return this.#kept.density
  }

  set(change: Partial<Kept>): void {
    this.#kept = { ...this.#kept, ...change }
    this.#apply()
    // A preference that could not be kept is asked for again next time; not worth a message over one's work.
    this.#write(this.#kept).catch(() => {})
  }

  #apply(): void {
    const { dataset } = document.documentElement
    if (this.#kept.theme === 'system') delete dataset.theme
    else dataset.theme = this.#kept.theme
    dataset.density = this.#kept.density
  }
}
