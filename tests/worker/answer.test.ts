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
