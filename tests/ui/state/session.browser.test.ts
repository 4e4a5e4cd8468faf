import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { columnReader } from '#model/cell-edit.ts'
import { addRun, removeRuns, setCell, setJobName } from '#model/edits.ts'
import type { Job } from '#model/job.ts'
import { Session } from '#ui/state/session.svelte.ts'
import { jobOf } from '../workspace.ts'

const first = jobOf([{ tag: 'A' }, { tag: 'B' }])
const opened = (job: Job) =>
  new Session({ job, path: null, fileName: null, revision: 0, opening: 'first' }, () => {})

let lastId = 0
const step = fc.oneof(
  fc.string({ maxLength: 5 }).map((name) => (session: Session) => session.edit(setJobName, name)),
  fc.constant((session: Session) => session.edit(addRun, `id ${++lastId}`, null)),
  fc.nat({ max: 5 }).map((at) => (session: Session) => {
    session.edit(removeRuns, new Set([session.job.runs[at]?.id ?? '']))
  }),
  fc.tuple(fc.nat({ max: 5 }), fc.string()).map(([at, text]) => (session: Session) => {
    session.edit(setCell, session.job.runs[at]?.id ?? '', 'lengthM', text, columnReader)
  }),
)

describe('Session', () => {
  test('undo of any edits leads back to the very same job, and redo to the last one', () => {
    fc.assert(
      fc.property(fc.array(step, { maxLength: 20 }), (steps) => {
        const session = opened(first)
        for (const edit of steps) edit(session)
        const last = session.job
        while (session.canUndo) session.undo()
        expect(session.job).toBe(first)
        while (session.canRedo) session.redo()
        expect(session.job).toBe(last)
      }),
    )
  })

  test('what is typed into one field is one step, until it is left', () => {
    const session = opened(first)
    for (const text of ['1', '12', '12.5']) {
      session.amend('length', setCell, 'run-0', 'lengthM', text, columnReader)
    }
    session.closeStep()
    session.amend('length', setCell, 'run-0', 'lengthM', '7', columnReader)
    session.undo()
    expect(session.job.runs[0]?.values.lengthM).toBe(12.5)
    session.undo()
    expect(session.job).toBe(first)
  })

  test('an edit that changes nothing is no step', () => {
    const session = opened(first)
    session.edit(setJobName, first.name)
    expect(session.canUndo).toBe(false)
  })
})
