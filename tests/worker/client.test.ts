import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import type { RunBrief } from '#model/run-brief.ts'
import { briefOf } from '#model/run-brief.ts'
import { sizeRun } from '#model/size-run.ts'
import { answerer } from '#worker/answer.ts'
import { SizingClient, type WorkerLike } from '#worker/client.ts'
import type { Answer, Request, Sheet } from '#worker/protocol.ts'
import { catalogue, coldRun, index, steamRun } from '../sizing/catalogue.ts'

/** A worker in the same thread that answers when told to, and may be made to die on a run. */
class TestWorker implements WorkerLike {
  readonly requests: Request[] = []
  readonly #answer = answerer()
  readonly #deadly: string | null
  #message: (event: { data: Answer }) => void = () => {}
  #error: () => void = () => {}

  constructor(deadly: string | null = null) {
    this.#deadly = deadly
  }

  postMessage(message: Request): void {
    // What crosses must be clonable.
    this.requests.push(structuredClone(message))
  }
  addEventListener(type: 'message' | 'error', listener: (event: { data: Answer }) => void): void {
    if (type === 'message') this.#message = listener
    else this.#error = listener as () => void
  }
  terminate(): void {
    this.requests.length = 0
  }

  /** Answers all there is, and what comes of it. */
  work(): void {
    for (let next = this.requests.shift(); next; next = this.requests.shift()) {
      const isDeadly = next.kind === 'size' && next.runs.some(({ id }) => id === this.#deadly)
      if (isDeadly) {
        this.#error()
        return
      }
      const answer = this.#answer(next)
      if (answer) this.#message({ data: structuredClone(answer) })
    }
  }
}

function started(deadly: string | null = null) {
  const workers: TestWorker[] = []
  const briefs = new Map<string, RunBrief>()
  const sheets: { values: RunValues; sheet: Sheet }[] = []
  let restarts = 0
  const client = new SizingClient(
    () => {
      const worker = new TestWorker(deadly)
      workers.push(worker)
      return worker
    },
    catalogue,
    {
      briefs: (list) => {
        for (const [id, brief] of list) briefs.set(id, brief)
      },
      sheet: (values, sheet) => sheets.push({ values, sheet }),
      restarted: () => restarts++,
    },
  )
  const work = () => {
    for (let before = -1; before !== workers.length; ) {
      before = workers.length
      workers.at(-1)?.work()
    }
  }
  return { client, briefs, sheets, work, restarts: () => restarts, stop: () => client.stop() }
}

describe('SizingClient', () => {
  test('answers every run as the engine does', () => {
    const { client, briefs, work, stop } = started()
    client.size(
      [
        { id: 'a', values: steamRun },
        { id: 'b', values: coldRun },
      ],
      {},
    )
    work()
    expect(briefs.get('a')).toEqual(briefOf(sizeRun(steamRun, {}, index)))
    expect(briefs.get('b')).toEqual(briefOf(sizeRun(coldRun, {}, index)))
    expect(client.waiting).toBe(0)
    stop()
  })

  test('only the last sheet that was asked for is answered, after the one under way', () => {
    const { client, sheets, work, stop } = started()
    client.askSheet(steamRun, {})
    client.askSheet({ ...steamRun, mediumC: 160 }, {})
    client.askSheet(coldRun, {})
    work()
    expect(sheets.map(({ values }) => values)).toEqual([steamRun, coldRun])
    expect(sheets.at(-1)?.sheet.detail).not.toBeNull()
    stop()
  })

  test('a run that kills the worker is told of, and all others are sized', () => {
    const { client, briefs, work, restarts, stop } = started('run 3')
    const runs = Array.from({ length: 60 }, (_, at) => ({
      id: `run ${at}`,
      values: { ...steamRun, lengthM: at + 1 },
    }))
    client.size(runs, {})
    work()
    expect(restarts()).toBeGreaterThan(0)
    expect(briefs.get('run 3')).toMatchObject({ ok: false, state: 'fails' })
    const sized = [...briefs.values()].filter(({ ok }) => ok)
    expect(sized).toHaveLength(59)
    expect(client.waiting).toBe(0)
    stop()
  })
})
