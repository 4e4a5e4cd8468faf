/**
 * The window's side of the worker. Latest wins, run by run: only runs whose values changed are sent, what was edited
 * last goes first, and an answer to values that have changed since is dropped.
 */
import type { Catalogue } from '#catalogue/types.ts'
import type { RunValues } from '#model/fields.ts'
import type { RunBrief } from '#model/run-brief.ts'
import { stoppedIssue } from './answer.ts'
import type { Answer, Request, RunToSize, Sheet } from './protocol.ts'
import { SizingQueue } from './queue.ts'

/** As much of a Worker as is used here. */
export interface WorkerLike {
  postMessage(message: Request): void
  addEventListener(type: 'message', listener: (event: { readonly data: Answer }) => void): void
  addEventListener(type: 'error', listener: () => void): void
  terminate(): void
}

export interface Listener {
  briefs(briefs: readonly (readonly [id: string, brief: RunBrief])[]): void
  sheet(values: RunValues, sheet: Sheet): void
  /** The worker had to be started again. */
  restarted(): void
}

interface Chunk {
  readonly ticket: number
  readonly runs: readonly RunToSize[]
  readonly watchdog: ReturnType<typeof setTimeout>
}

/** Chunks on the way at once: one being computed, one waiting, so that the worker is never idle. */
const chunksOut = 2
/** A chunk takes some milliseconds; after this the worker is taken for hung. */
const patienceMs = 15_000

export class SizingClient {
  readonly #start: () => WorkerLike
  readonly #catalogue: Catalogue
  readonly #listener: Listener
  readonly #queue = new SizingQueue()
  readonly #out = new Map<number, Chunk>()
  #worker: WorkerLike
  #ticket = 0
  #wantedSheet: { readonly values: RunValues; readonly defaults: RunValues } | null = null
  #sheetOut: { readonly ticket: number; readonly values: RunValues } | null = null

  constructor(start: () => WorkerLike, catalogue: Catalogue, listener: Listener) {
    this.#start = start
    this.#catalogue = catalogue
    this.#listener = listener
    this.#worker = this.#launch()
  }

  /** Runs that still wait for an answer. */
  get waiting(): number {
    return this.#queue.waiting
  }

  /** Tells what all runs are now; those that are new or changed are computed. */
  size(runs: Iterable<RunToSize>, defaults: RunValues): void {
    this.#queue.want(runs, defaults)
    this.#pump()
  }

  /** Asks for all about one run; only the last one asked for is answered. */
  askSheet(values: RunValues, defaults: RunValues): void {
    this.#wantedSheet = { values, defaults }
    this.#pump()
  }

  stop(): void {
    for (const { watchdog } of this.#out.values()) clearTimeout(watchdog)
    this.#worker.terminate()
  }

  #launch(): WorkerLike {
    const worker = this.#start()
    worker.addEventListener('message', ({ data }) => this.#receive(data))
    worker.addEventListener('error', () => worker === this.#worker && this.#restart())
    worker.postMessage({ kind: 'catalogue', catalogue: this.#catalogue })
    return worker
  }

  #pump(): void {
    if (this.#wantedSheet && !this.#sheetOut) {
      const ticket = ++this.#ticket
      const { values, defaults } = this.#wantedSheet
      this.#wantedSheet = null
      this.#sheetOut = { ticket, values }
      this.#worker.postMessage({ kind: 'sheet', ticket, values, defaults })
    }
    while (this.#out.size < this.#queue.allowedOut(chunksOut)) {
      const runs = this.#queue.take()
      if (runs.length === 0) return
      const ticket = ++this.#ticket
      const watchdog = setTimeout(() => this.#restart(), patienceMs)
      this.#out.set(ticket, { ticket, runs, watchdog })
      this.#worker.postMessage({ kind: 'size', ticket, runs, defaults: this.#queue.defaults })
    }
  }

  #receive(answer: Answer): void {
    if (answer.kind === 'sheet') {
      const asked = this.#sheetOut
      if (asked?.ticket !== answer.ticket) return
      this.#sheetOut = null
      this.#listener.sheet(asked.values, answer.sheet)
    } else {
      const chunk = this.#out.get(answer.ticket)
      if (!chunk) return
      clearTimeout(chunk.watchdog)
      this.#out.delete(answer.ticket)
      const fresh = this.#queue.settle(chunk.runs)
      this.#listener.briefs(answer.briefs.filter(([id]) => fresh.has(id)))
    }
    this.#pump()
  }

  /** A worker that died or hangs is replaced; the runs it had are tried one by one to find the one to blame. */
  #restart(): void {
    this.#worker.terminate()
    const lost = [...this.#out.values()]
    for (const { watchdog } of lost) clearTimeout(watchdog)
    this.#out.clear()
    this.#sheetOut = null
    const stopped = lost.flatMap(({ runs }) => this.#queue.suspect(runs))
    this.#worker = this.#launch()
    this.#listener.restarted()
    this.#listener.briefs(stopped.map((id) => [id, stoppedBrief]))
    this.#pump()
  }
}

const stoppedBrief: RunBrief = {
  ok: false,
  state: 'fails',
  issues: [stoppedIssue('it took too long or ran out of memory')],
}
