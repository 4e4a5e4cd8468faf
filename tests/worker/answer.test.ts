import { expect, test } from 'vitest'
import { briefOf } from '#model/run-brief.ts'
import { sizeRun } from '#model/size-run.ts'
import { answer, answerer } from '#worker/answer.ts'
import { catalogue, index, steamRun } from '../sizing/catalogue.ts'

test('says nothing before it has a catalogue', () => {
  const ask = answerer()
  const request = { kind: 'sheet', ticket: 1, values: steamRun, defaults: {} } as const
  expect(ask(request)).toBeNull()
  expect(ask({ kind: 'catalogue', catalogue })).toBeNull()
  expect(ask(request)).toMatchObject({ kind: 'sheet', ticket: 1, sheet: { outcome: { ok: true } } })
})

test('gives a brief for every run, wrong ones with what is wrong', () => {
  const runs = [
    { id: 'good', values: steamRun },
    { id: 'bad', values: { ...steamRun, size: 'DN 51' } },
  ]
  const reply = answer({ kind: 'size', ticket: 2, runs, defaults: {} }, index)
  expect(reply).toMatchObject({ kind: 'sized', ticket: 2 })
  const briefs = new Map(reply.kind === 'sized' ? reply.briefs : [])
  expect(briefs.get('good')).toEqual(briefOf(sizeRun(steamRun, {}, index)))
  expect(briefs.get('bad')).toMatchObject({ ok: false, issues: [{ column: 'size' }] })
})

test('one run that trips a bug does not take the others with it', () => {
  const spoilt = new Proxy(steamRun, {
    get() {
      throw new Error('bug')
    },
  })
  const runs = [
    { id: 'spoilt', values: spoilt },
    { id: 'good', values: steamRun },
  ]
  const reply = answer({ kind: 'size', ticket: 3, runs, defaults: {} }, index)
  const briefs = new Map(reply.kind === 'sized' ? reply.briefs : [])
  expect(briefs.get('spoilt')).toMatchObject({ ok: false })
  expect(briefs.get('good')).toMatchObject({ ok: true })
})

test('a run sheet is given though its details trip a bug', () => {
  // The first reading is that of the answer itself, the second that of the details.
  let reads = 0
  const spoilt = new Proxy(steamRun, {
    ownKeys(values) {
      if (++reads > 1) throw new Error('bug')
      return Reflect.ownKeys(values)
    },
  })
  const reply = answer({ kind: 'sheet', ticket: 4, values: spoilt, defaults: {} }, index)
  expect(reply).toMatchObject({ kind: 'sheet', sheet: { outcome: { ok: true }, detail: null } })
})
