import { describe, expect, test } from 'vitest'
import { columnReader } from '#model/cell-edit.ts'
import type { Run } from '#model/job.ts'
import { pasteTakeOff, takeOffOf } from '#model/take-off.ts'
import { cureOf } from '#ui/state/save-cure.ts'
import { runsAsText } from '#ui/views/frame/runs-as-text.ts'
import { readTsv } from '#ui/views/schedule/tsv.ts'

describe('what is offered where changes could not be written', () => {
  test.each(['host/gone', 'host/no-key', 'job/stale', 'job/left'] as const)(
    '%s: nothing that cannot work',
    (code) => {
      const { acts, sentence } = cureOf(code, true)
      expect(acts).toContain('copy')
      expect(acts).not.toContain('try')
      expect(acts).not.toContain('save as')
      expect(sentence).toContain('only in this window')
    },
  )

  test('a full drive: to try again, or another file, and no second word on where the work is', () => {
    expect(cureOf('job/not-writable', true)).toEqual({ sentence: '', acts: ['try', 'save as'] })
  })
})

test('copied runs are the same when they are pasted elsewhere, what is not valid yet included', () => {
  const runs: Run[] = [
    {
      id: 'A',
      values: { tag: 'A', shape: 'rect-duct', widthM: 0.6, heightM: 0.4, mediumC: 12.5 },
      drafts: {},
    },
    { id: 'B', values: { tag: 'B', shape: 'pipe', humidity: 0.6 }, drafts: { size: '1/2" odd' } },
  ]
  const takeOff = takeOffOf(readTsv(runsAsText(runs)))
  expect(takeOff?.isKnown).toBe(true)
  const empty = { name: '', site: '', defaults: {}, runs: [] }
  const ids = ['A', 'B']
  const pasted =
    takeOff &&
    pasteTakeOff(
      empty,
      takeOff,
      () => ids.shift() ?? '',
      () => columnReader,
    )
  expect(pasted?.runs.map(({ values }) => values.tag)).toEqual(['A', 'B'])
  expect(pasted?.runs[0]).toEqual(runs[0])
  expect(pasted?.runs[1]?.values).toMatchObject({ humidity: 0.6 })
})
