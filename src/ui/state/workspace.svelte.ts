/** All that the window works with, made once and provided to every view. */
import { createContext } from 'svelte'
import type { Catalogue } from '#catalogue/types.ts'
import { AppError } from '#contract/failures.ts'
import type { Draft, Host, OpenJob, Output } from '#contract/host.ts'
import type { CellReader } from '#model/cell-edit.ts'
import type { UnitSystem } from '#units/quantities.ts'
import type { WorkerLike } from '#worker/client.ts'
import { CatalogueWords } from './catalogue-words.ts'
import { readerFor } from './cell-text.ts'
import { Preferences } from './preferences.svelte.ts'
import { Saving } from './saving.svelte.ts'
import { type Changed, Session } from './session.svelte.ts'
import { Sizing } from './sizing.svelte.ts'

type About = Output<'host.about'>

/** What a dialog asks before something goes on. */
export type Question =
  | { readonly kind: 'open'; readonly sentence: string | null }
  | {
      readonly kind: 'save-as'
      readonly path: string
      readonly sentence: string | null
      readonly canReplace: boolean
    }
  | { readonly kind: 'unsaved'; readonly sentence: string; readonly goOn: () => Promise<void> }

export class Workspace {
  readonly host: Host
  readonly catalogue: Catalogue
  readonly about: About
  readonly preferences: Preferences
  readonly saving: Saving
  readonly sizing: Sizing
  readonly session: Session
  readonly words: CatalogueWords
  /** Reads typed text in the units shown. */
  readonly reader: CellReader = $derived.by(() =>
    this.words.reading(readerFor(this.preferences.units)),
  )
  question: Question | null = $state.raw(null)
  /** Jobs that were left without a file of their own. */
  drafts: readonly Draft[] = $state.raw([])
  /** What went wrong last, in a sentence; null when read. */
  failure: string | null = $state(null)
  /** While the host opens another job: nothing typed then could be kept, so the window takes nothing. */
  isMoving: boolean = $state(false)

  private constructor(host: Host, start: () => WorkerLike, read: Read) {
    this.host = host
    this.catalogue = read.catalogue
    this.about = read.about
    this.words = new CatalogueWords(read.catalogue)
    this.preferences = new Preferences(read.preferences, host['preferences.write'])
    this.sizing = new Sizing(start, read.catalogue)
    this.session = new Session(read.open, (what) => this.#changed(what))
    this.saving = new Saving(host['job.commit'], read.open, () => this.session.job)
    this.failure = read.open.notice ?? null
    this.#changed('job')
  }

  static async start(host: Host, start: () => WorkerLike): Promise<Workspace> {
    const [catalogue, open, preferences, about] = await Promise.all([
      host['catalogue.read']({}),
      host['job.current']({}),
      host['preferences.read']({}),
      host['host.about']({}),
    ])
    return new Workspace(host, start, { catalogue, open, preferences, about })
  }

  /** Reads text in a unit that was named with it, or in the units shown where none was. */
  readerIn(units: UnitSystem | 'shown'): CellReader {
    return units === 'shown' ? this.reader : this.words.reading(readerFor(units))
  }

  newJob(): void {
    this.#leave(() => this.#take(() => this.host['job.new']({})))
  }
  openDemo(): void {
    this.#leave(() => this.#take(() => this.host['job.demo']({})))
  }
  openJob(): void {
    this.#leave(async () => {
      if (this.about.dialogs) await this.#take(() => this.host['job.open']({}))
      else this.question = { kind: 'open', sentence: null }
    })
  }
  openDraft({ path }: Draft): void {
    this.#leave(() => this.#take(() => this.host['job.open']({ path })))
  }
  /** Looks which drafts there are. */
  readDrafts(): void {
    this.host['job.drafts']({}).then(
      (drafts) => {
        this.drafts = drafts
      },
      // The list is a help to find something again, and what keeps it away is told where it matters.
      () => {},
    )
  }
  /** Takes the open job as its file holds it; what is not written is lost. */
  reopen(): void {
    const { path } = this.session
    this.#run(() =>
      this.#take(() =>
        path === null ? this.host['job.current']({}) : this.host['job.open']({ path }),
      ),
    )
  }
  openPath(path: string): void {
    this.#run(async () => {
      try {
        await this.#take(() => this.host['job.open']({ path: path.trim() }))
        this.question = null
      } catch (error) {
        if (!this.question) throw error
        this.question = { kind: 'open', sentence: sentenceOf(error) }
      }
    })
  }

  saveAs(): void {
    if (this.about.dialogs) {
      this.#run(() => this.#saveAs(undefined, false))
    } else {
      this.question = {
        kind: 'save-as',
        path: this.#suggestedPath(),
        sentence: null,
        canReplace: false,
      }
    }
  }
  saveTo(path: string, overwrite: boolean): void {
    this.#run(async () => {
      try {
        await this.#saveAs(path.trim(), overwrite)
        this.question = null
      } catch (error) {
        const canReplace = error instanceof AppError && error.failure.code === 'job/exists'
        if (this.question?.kind !== 'save-as') throw error
        this.question = { kind: 'save-as', path, sentence: sentenceOf(error), canReplace }
      }
    })
  }
  /** Ctrl+S: a job without a file gets one; any other is written already, unless writing failed. */
  save(): void {
    if (this.session.path === null) this.saveAs()
    else this.saving.kick()
  }

  answer(go: boolean): void {
    const { question } = this
    this.question = null
    if (go && question?.kind === 'unsaved') this.#run(question.goOn)
  }

  #changed(what: Changed): void {
    const { job, activeRun } = this.session
    if (what === 'active run') {
      this.sizing.look(job, activeRun)
      return
    }
    if (what === 'other job') this.sizing.forget()
    this.sizing.update(job, activeRun)
    this.saving.kick()
  }

  /** Leaves the open job, once all of it is in its file or the user says that it need not be. */
  #leave(goOn: () => Promise<void>): void {
    this.#run(async () => {
      if (await this.saving.settle()) return goOn()
      const { state } = this.saving
      const sentence =
        state.kind === 'failed' ? state.sentence : 'The last changes are not written yet.'
      this.question = { kind: 'unsaved', sentence, goOn }
    })
  }

  async #take(ask: () => Promise<OpenJob | null>): Promise<void> {
    this.isMoving = true
    try {
      await this.saving.exclusively(async () => {
        const open = await ask()
        if (!open) return
        this.saving.startFrom(open, open.job)
        this.session.replace(open)
      })
    } finally {
      this.isMoving = false
    }
  }

  async #saveAs(path: string | undefined, overwrite: boolean): Promise<void> {
    await this.saving.settle()
    await this.saving.exclusively(async () => {
      const { opening } = this.saving
      const place = path === undefined ? {} : { path }
      const open = await this.host['job.saveAs']({ ...place, overwrite, opening })
      if (!open) return
      // What the host wrote is what was committed last; what could not be committed follows with the next write.
      this.saving.startFrom(open, this.saving.isBehind ? open.job : this.session.job)
      this.session.movedTo(open)
    })
    this.saving.kick()
  }

  #suggestedPath(): string {
    const { folder } = this.about
    const separator = folder.includes('\\') ? '\\' : '/'
    const name = this.session.job.name.replaceAll(/[\\/:*?"<>|]/g, ' ').trim() || 'New job'
    return this.session.path ?? `${folder}${separator}${name}.lagjob`
  }

  #run(act: () => Promise<void>): void {
    this.failure = null
    act().catch((error: unknown) => {
      this.failure = sentenceOf(error)
    })
  }
}

interface Read {
  readonly catalogue: Catalogue
  readonly open: OpenJob
  readonly preferences: Output<'preferences.read'>
  readonly about: About
}

const sentenceOf = (error: unknown): string =>
  error instanceof Error ? error.message : String(error)

export const [useWorkspace, provideWorkspace] = createContext<Workspace>()
