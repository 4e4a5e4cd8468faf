import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { JobFile } from '#backend/job-file.ts'
import { workingSchema } from '#report/working-schema.ts'
import { demoFile, goodList, place, program, slow } from './command.ts'

describe('lagwright working', slow, () => {
  it('prints the working of one run and ends with 0', async () => {
    const { put, lagwright } = place()
    const { code, out, err } = await lagwright('working', put('runs.csv', goodList), '--tag', 'A-2')
    expect(err).toEqual([])
    expect(out).toMatch(/^Working of A-2: \d+ mm\n=+\n/)
    expect(out).toContain('Contents')
    expect(out).toContain('Churchill')
    expect(out).toContain('asbestos')
    expect(code).toBe(0)
  })

  it('ends with 1 where the run cannot meet its limits, as size does', async () => {
    const { code, out } = await place().lagwright('working', demoFile, '--tag', 'GL-322')
    expect(out).toMatch(/^Working of GL-322: no thickness meets the limits; the thickest, 120 mm/)
    expect(code).toBe(1)
  })

  it('writes the same as one JSON object, and as a file', async () => {
    const { folder, put, lagwright } = place()
    put('runs.csv', goodList)
    const words = ['working', 'runs.csv', '--tag', 'A-1']
    const json = await lagwright(...words, '--json', '--out', 'a.txt')
    expect(workingSchema.parse(JSON.parse(json.out))).toMatchObject({ tag: 'A-1' })
    const text = await lagwright(...words)
    expect(readFileSync(join(folder, 'a.txt'), 'utf8')).toBe(text.out)
    const said = await lagwright(...words, '--out', 'a.json')
    expect(said.out).toMatch(/^a\.json: the working of A-1: \d+ mm\.\n$/)
    expect(readFileSync(join(folder, 'a.json'), 'utf8')).toBe(json.out)
  })

  it('names the tags where none is the one asked for', async () => {
    const { code, out, err } = await place().lagwrightReading(
      goodList,
      'working',
      '-',
      '--tag',
      'B-9',
    )
    expect(err).toEqual(['--tag: found "B-9", which no run has; allowed: A-1, A-2'])
    expect(out).toBe('')
    expect(code).toBe(2)
  })

  it('works out a run of a job with its defaults', async () => {
    const { folder, lagwright } = place()
    const defaults = {
      shape: 'pipe',
      material: 'stone_wool_pipe_section',
      airC: 20,
      maxLossWPerM: 20,
    } as const
    const runs = [{ id: '1', values: { tag: 'J-1', size: 'DN 50', mediumC: 80 }, drafts: {} }]
    const job = { name: 'Test', site: '', defaults, runs }
    JobFile.create(join(folder, 'test.lagjob'), job, join(program, 'db')).close()
    const { code, out, err } = await lagwright('working', 'test.lagjob', '--tag', 'J-1')
    expect(err).toEqual([])
    expect(out).toContain('Limit: loss')
    expect(code).toBe(0)
  })
})
