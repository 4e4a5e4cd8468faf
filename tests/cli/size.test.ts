import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { sizedSchema } from '#report/run-result-schema.ts'
import { demoFile, ended, goodList, place, program, slow } from './command.ts'

describe('lagwright size', slow, () => {
  it('prints a table and ends with 0 where all limits are met', async () => {
    const { put, lagwright } = place()
    const { code, out, err } = await lagwright('size', put('runs.csv', goodList))
    expect(err).toEqual([])
    expect(out).toMatch(/^Tag +Size +Lagging mm/)
    expect(out).toContain('2 runs, all limits met.')
    expect(out).toContain('asbestos')
    expect(code).toBe(0)
  })

  it('ends with 1 where a run cannot meet its limits, and still gives the results', async () => {
    const { code, out, err } = await place().lagwright('size', demoFile)
    expect(err).toEqual([])
    expect(out).toContain('Not within: ST-110, GL-322.')
    expect(code).toBe(1)
  })

  it('ends with 1 where a fixed thickness fails, and still writes the file', async () => {
    const { folder, put, lagwright } = place()
    const list =
      'tag,shape,size,medium_c,air_c,material,thickness_mm,max_loss_w_m\nF-1,pipe,DN 50,180,20,stone_wool_pipe_section,20,10\n'
    const { code, out } = await lagwright('size', put('runs.csv', list), '--out', 'result.json')
    expect(out).toBe('result.json: 1 run, 0 within their limits. Not within: F-1.\n')
    expect(code).toBe(1)
    const { runs } = sizedSchema.parse(
      JSON.parse(readFileSync(join(folder, 'result.json'), 'utf8')),
    )
    expect(runs[0]).toMatchObject({ governing: 'fixed', chosen: { thicknessM: 0.02, pass: false } })
  })

  it('rates a bare run: chosen equals bare', async () => {
    const list =
      'tag,shape,size,medium_c,air_c,thickness_mm,reach,reach_reason\nB-1,pipe,DN 50,180,20,0,no,fenced\n'
    const { code, out } = await place().lagwrightReading(list, 'size', '-', '--json')
    const { runs } = sizedSchema.parse(JSON.parse(out))
    expect(runs[0]?.governing).toBe('bare')
    const { out: table } = await place().lagwrightReading(list, 'size', '-')
    expect(table).toContain('1 run, 0 within their limits, 1 with no limit judged.')
    expect(runs[0]?.chosen).toEqual(runs[0]?.bare)
    expect(code).toBe(0)
  })

  it('writes one JSON object after its schema', async () => {
    const { code, out, err } = await place().lagwright('size', demoFile, '--json')
    expect(err).toEqual([])
    const { runs, cautions } = sizedSchema.parse(JSON.parse(out))
    expect(runs.length).toBeGreaterThanOrEqual(40)
    expect(cautions.length).toBeGreaterThan(5)
    expect(code).toBe(1)
  })

  it('reads standard input, whatever the separator', async () => {
    const list = goodList.replaceAll(',', ';')
    const { code, out } = await place().lagwrightReading(list, 'size', '-')
    expect(out).toContain('A-2')
    expect(code).toBe(0)
  })

  it('prints US units, and leaves JSON and CSV in SI', async () => {
    const { folder, put, lagwright } = place()
    put('runs.csv', goodList)
    const printed = await lagwright('size', 'runs.csv', '--units', 'us')
    expect(printed.out).toMatch(/^Tag +Size +Lagging in +Loss Btu\/h·ft/)
    const json = await lagwright('size', 'runs.csv', '--units=us', '--json', '--out', 'us.csv')
    const si = await lagwright('size', 'runs.csv', '--json', '--out', 'si.csv')
    expect(json.out).toBe(si.out)
    expect(readFileSync(join(folder, 'us.csv'), 'utf8')).toBe(
      readFileSync(join(folder, 'si.csv'), 'utf8'),
    )
  })

  it.each(['json', 'csv', 'txt', 'JSON'])(
    'writes .%s by its ending and leaves nothing else',
    async (ending) => {
      const { folder, put, lagwright } = place()
      const { code, err } = await lagwright(
        'size',
        put('runs.csv', goodList),
        '--out',
        `result.${ending}`,
      )
      expect(err).toEqual([])
      expect(code).toBe(0)
      expect(readdirSync(folder).sort()).toEqual([`result.${ending}`, 'runs.csv'])
      const written = readFileSync(join(folder, `result.${ending}`), 'utf8')
      const starts: Readonly<Record<string, string>> = {
        json: '{"runs":',
        csv: 'tag,description',
        txt: 'Tag ',
      }
      expect(written.startsWith(starts[ending.toLowerCase()] ?? 'nothing')).toBe(true)
    },
  )

  it('replaces a file only with --force', async () => {
    const { folder, put, lagwright } = place()
    put('runs.csv', goodList)
    put('result.csv', 'mine')
    const refused = await lagwright('size', 'runs.csv', '--out', 'result.csv')
    expect(refused.code).toBe(2)
    expect(refused.err).toEqual([
      `--out: ${join(folder, 'result.csv')} is already there; allowed: another name, or --force to replace it`,
    ])
    expect(readFileSync(join(folder, 'result.csv'), 'utf8')).toBe('mine')
    expect((await lagwright('size', 'runs.csv', '--out', 'result.csv', '--force')).code).toBe(0)
    expect(readFileSync(join(folder, 'result.csv'), 'utf8')).toMatch(/^tag,/)
    expect(readdirSync(folder).sort()).toEqual(['result.csv', 'runs.csv'])
  })

  it('never writes over the list itself', async () => {
    const { folder, put, lagwright } = place()
    const { code, err } = await lagwright(
      'size',
      put('runs.csv', goodList),
      '--out',
      './runs.csv',
      '--force',
    )
    expect(code).toBe(2)
    expect(err[0]).toContain('is the list of runs itself')
    expect(readFileSync(join(folder, 'runs.csv'), 'utf8')).toBe(goodList)
  })

  it('works through npm from the folder where the user stands', async () => {
    const { folder, put } = place()
    put('runs.csv', goodList)
    const words = [
      'run',
      '-s',
      '--prefix',
      program,
      'lagwright',
      '--',
      'size',
      'runs.csv',
      '--out',
      'result.txt',
    ]
    const { code, err } = await ended('npm', words, {
      cwd: folder,
      env: { ...process.env, LAGWRIGHT_DATA: folder },
    })
    expect(err).toEqual([])
    expect(code).toBe(0)
    expect(readdirSync(folder)).toContain('result.txt')
  })

  it('is quiet when its reader goes away', async () => {
    const { folder } = place()
    const line = `"${process.execPath}" "${join(program, 'src/cli/main.ts')}" size "${demoFile}" --json | head -c 20`
    const { out, err } = await ended('sh', ['-c', line], {
      cwd: folder,
      env: { ...process.env, LAGWRIGHT_DATA: folder },
    })
    expect(out).toHaveLength(20)
    expect(err).toEqual([])
  })

  it('works where no catalogue can be kept', async () => {
    const { folder, put } = place()
    put('runs.csv', goodList)
    put('file', '')
    const env = { ...process.env, LAGWRIGHT_DATA: join(folder, 'file') }
    const { code, err } = await ended(
      process.execPath,
      [join(program, 'src/cli/main.ts'), 'size', 'runs.csv'],
      { cwd: folder, env },
    )
    expect(err).toEqual([])
    expect(code).toBe(0)
  })
})
