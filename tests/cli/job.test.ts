import { writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { JobFile } from '#backend/job-file.ts'
import type { Job } from '#model/job.ts'
import { sizedSchema } from '#report/run-result-schema.ts'
import { goodList, place, program, slow } from './command.ts'

const defaults = {
  shape: 'pipe',
  material: 'stone_wool_pipe_section',
  airC: 20,
  maxLossWPerM: 20,
} as const

function keep(folder: string, runs: Job['runs']): string {
  const job = { name: 'Test', site: '', defaults, runs }
  JobFile.create(join(folder, 'test.lagjob'), job, join(program, 'db')).close()
  return 'test.lagjob'
}

describe('lagwright size with a job', slow, () => {
  it('sizes the runs of a job with its defaults', async () => {
    const { folder, lagwright } = place()
    const runs = [{ id: '1', values: { tag: 'J-1', size: 'DN 50', mediumC: 80 }, drafts: {} }]
    const { code, out, err } = await lagwright('size', keep(folder, runs), '--json')
    expect(err).toEqual([])
    expect(code).toBe(0)
    expect(sizedSchema.parse(JSON.parse(out)).runs[0]).toMatchObject({
      tag: 'J-1',
      governing: 'loss',
    })
  })

  it('names what is wrong by run and tag, cells kept as typed included', async () => {
    const { folder, lagwright } = place()
    const runs = [
      { id: '1', values: { tag: 'J-1', size: 'DN 50', mediumC: 80 }, drafts: { lengthM: 'long' } },
      { id: '2', values: { tag: 'J-2', size: 'DN 50' }, drafts: { mediumC: 'hot' } },
      { id: '3', values: { tag: 'J-3', size: 'DN 81', mediumC: 80 }, drafts: {} },
    ]
    const { code, out, err } = await lagwright('size', keep(folder, runs))
    expect(err).toEqual([
      'run 1 (J-1), column length_m: found "long"; allowed: a number from 0 to 1000000 m',
      'run 2 (J-2), column medium_c: found "hot"; allowed: a number from −200 to 1000 °C',
      expect.stringMatching(
        /^run 3 \(J-3\), column size: found DN 81; allowed: a DN of the table; /,
      ),
    ])
    expect(out).toBe('')
    expect(code).toBe(2)
  })

  it('refuses tags that two runs of a job have', async () => {
    const { folder, lagwright } = place()
    const values = { tag: 'J', size: 'DN 50', mediumC: 80 }
    const runs = [
      { id: '1', values, drafts: {} },
      { id: '2', values, drafts: {} },
    ]
    const { code, err } = await lagwright('size', keep(folder, runs))
    expect(err).toEqual([
      'run 1 (J), column tag: found "J"; allowed: a tag that no other run has',
      'run 2 (J), column tag: found "J"; allowed: a tag that no other run has',
    ])
    expect(code).toBe(2)
  })

  it('refuses a job without runs', async () => {
    const { folder, lagwright } = place()
    const { code, err } = await lagwright('size', keep(folder, []))
    expect(err).toEqual(['test.lagjob: found no runs; allowed: a job with runs'])
    expect(code).toBe(2)
  })

  it('takes the defaults of --job for a list', async () => {
    const { folder, put, lagwright } = place()
    const job = keep(folder, [])
    const list = put('runs.csv', 'tag,size,medium_c\nL-1,DN 50,80\n')
    const { code, err } = await lagwright('size', list, '--job', job)
    expect(err).toEqual([])
    expect(code).toBe(0)
    expect((await lagwright('size', list)).code).toBe(2)
  })

  it('says what stands against a file that is no job, and leaves it alone', async () => {
    const { folder, put, lagwright } = place()
    writeFileSync(join(folder, 'fake.lagjob'), goodList)
    const { code, err } = await lagwright('size', 'fake.lagjob')
    expect(err).toHaveLength(1)
    expect(err[0]).toContain('fake.lagjob is not a Lagwright job')
    expect(code).toBe(2)
    const missing = await lagwright('size', put('runs.csv', goodList), '--job', 'nowhere.lagjob')
    expect(missing.err[0]).toMatch(/^There is no file at .*nowhere\.lagjob/)
    expect(missing.code).toBe(2)
  })
})
