import { describe, expect, test } from 'vitest'
import { setJobName, setSite } from '#model/edits.ts'
import { jobOf, startWorkspace, TestFile } from '../workspace.ts'

describe('Saving', () => {
  test('writes each edit at once, and what comes while it writes in one more commit', async () => {
    const file = new TestFile(jobOf([{ tag: 'A' }]))
    const { session, saving } = await startWorkspace(file)
    for (const name of ['a', 'b', 'c', 'd']) {
      session.edit(setJobName, name)
      // Long enough for the first commit to be on its way.
      await Promise.resolve()
    }
    expect(await saving.settle()).toBe(true)
    expect(file.job).toEqual(session.job)
    expect(file.commits.length).toBeLessThanOrEqual(2)
    expect(saving.state).toEqual({ kind: 'saved', at: new Date('2026-03-01T12:04:00.000Z') })
  })

  test('says why it cannot write, loses nothing, and writes all of it later', async () => {
    const file = new TestFile(jobOf([{ tag: 'A' }]))
    const { session, saving } = await startWorkspace(file)
    file.isFull = true
    session.edit(setJobName, 'kept')
    expect(await saving.settle()).toBe(false)
    expect(saving.state).toMatchObject({
      kind: 'failed',
      sentence: expect.stringContaining('disk is full'),
    })
    session.edit(setSite, 'also kept')
    await saving.settle()
    file.isFull = false
    saving.kick()
    expect(await saving.settle()).toBe(true)
    expect(file.job).toMatchObject({ name: 'kept', site: 'also kept' })
  })

  test('asks before it leaves a job whose last changes are not written', async () => {
    const file = new TestFile(jobOf([{ tag: 'A' }]))
    const workspace = await startWorkspace(file)
    file.isFull = true
    workspace.session.edit(setJobName, 'not written')
    workspace.newJob()
    await expect.poll(() => workspace.question?.kind).toBe('unsaved')
    workspace.answer(false)
    expect(workspace.session.job.name).toBe('not written')
    workspace.newJob()
    await expect.poll(() => workspace.question?.kind).toBe('unsaved')
    workspace.answer(true)
    await expect.poll(() => workspace.session.job.runs.length).toBe(0)
  })

  test('is saved again once undo has taken back what could not be written', async () => {
    const file = new TestFile(jobOf([{ tag: 'A' }]))
    const { session, saving } = await startWorkspace(file)
    file.isFull = true
    session.edit(setJobName, 'too much')
    await saving.settle()
    session.undo()
    expect(await saving.settle()).toBe(true)
    expect(saving.state.kind).toBe('saved')
  })

  test('undo is written like any edit', async () => {
    const first = jobOf([{ tag: 'A' }])
    const file = new TestFile(first)
    const { session, saving } = await startWorkspace(file)
    session.edit(setJobName, 'changed')
    await saving.settle()
    session.undo()
    await saving.settle()
    expect(file.job).toEqual(first)
  })
})

describe('the workspace', () => {
  test('says what the host has to say about how the job came to be open', async () => {
    const file = new TestFile(jobOf([]))
    file.notice = 'The last job is damaged. A new job was started instead.'
    expect((await startWorkspace(file)).failure).toBe(file.notice)
  })

  test('shows no answer of the job before, though its copy has the same runs', async () => {
    const file = new TestFile(jobOf([{ tag: 'A', shape: 'pipe' }]))
    const workspace = await startWorkspace(file)
    const { sizing } = workspace
    await expect.poll(() => sizing.briefs.size).toBe(1)
    workspace.session.replace({ ...file.open, job: jobOf([{ tag: 'B', shape: 'pipe' }]) })
    expect(sizing.briefs.size).toBe(0)
    await expect.poll(() => sizing.briefs.size).toBe(1)
  })
})
