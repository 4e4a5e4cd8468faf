import { describe, expect, test } from 'vitest'
import type { RunToSize } from '#worker/protocol.ts'
import { SizingQueue } from '#worker/queue.ts'

const runs = (count: number): RunToSize[] =>
  Array.from({ length: count }, (_, index) => ({ id: `run ${index}`, values: { tag: `${index}` } }))
const defaults = {}
const ids = (taken: readonly RunToSize[]) => taken.map(({ id }) => id)

function takeAll(queue: SizingQueue): string[] {
  const all: string[] = []
  for (let chunk = queue.take(); chunk.length > 0; chunk = queue.take()) {
    all.push(...ids(chunk))
    queue.settle(chunk)
  }
  return all
}

describe('SizingQueue', () => {
  test('gives every run once, and again only what changed', () => {
    const queue = new SizingQueue()
    const list = runs(200)
    queue.want(list, defaults)
    expect(takeAll(queue)).toHaveLength(200)
    const edited = list.with(7, { id: 'run 7', values: { tag: 'changed' } })
    queue.want(edited, defaults)
    expect(takeAll(queue)).toEqual(['run 7'])
  })

  test('puts an edit before the rest of a long list', () => {
    const queue = new SizingQueue()
    const list = runs(5000)
    queue.want(list, defaults)
    queue.settle(queue.take())
    queue.want(list.with(4999, { id: 'run 4999', values: { tag: 'now' } }), defaults)
    expect(ids(queue.take())).toEqual(['run 4999'])
  })

  test('drops the answer to values that have changed since', () => {
    const queue = new SizingQueue()
    const list = runs(2)
    queue.want(list, defaults)
    const chunk = queue.take()
    queue.want(list.with(0, { id: 'run 0', values: { tag: 'later' } }), defaults)
    expect([...queue.settle(chunk)]).toEqual(['run 1'])
    expect(takeAll(queue)).toEqual(['run 0'])
  })

  test('other defaults size everything again', () => {
    const queue = new SizingQueue()
    const list = runs(3)
    queue.want(list, defaults)
    takeAll(queue)
    queue.want(list, { airC: 5 })
    expect(takeAll(queue)).toHaveLength(3)
  })

  test('removed runs are neither computed nor waited for', () => {
    const queue = new SizingQueue()
    queue.want(runs(10), defaults)
    queue.want(runs(4), defaults)
    expect(takeAll(queue)).toHaveLength(4)
    expect(queue.waiting).toBe(0)
  })

  test('a lost chunk comes back run by run, and the one that is lost alone is to blame', () => {
    const queue = new SizingQueue()
    queue.want(runs(3), defaults)
    expect(queue.suspect(queue.take())).toEqual([])
    expect(queue.allowedOut(2)).toBe(1)
    const first = queue.take()
    expect(first).toHaveLength(1)
    queue.settle(first)
    const second = queue.take()
    expect(queue.suspect(second)).toEqual(ids(second))
    expect(takeAll(queue)).toHaveLength(1)
    expect(queue.waiting).toBe(0)
  })
})
