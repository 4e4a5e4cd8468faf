import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { listLossSchema } from '#report/loss-schema.ts'
import { sizedSchema } from '#report/run-result-schema.ts'
import { demoFile, goodList, place, slow } from './command.ts'

const fuelled = `tag,shape,size,length_m,medium_c,air_c,material,finish,thickness_mm,fuel,hours_per_year
F-1,pipe,DN 50,10,80,20,stone_wool_pipe_section,al_plain,40,natural_gas,4000
F-2,pipe,DN 80,,80,20,stone_wool_pipe_section,al_plain,40,natural_gas,4000
F-3,pipe,DN 80,5,6,20,elastomeric_foam_nbr,elastomeric_bare,19,electricity,4000
`

/** The cells of a row of the table, told by its first word; two spaces or more part them. */
function cells(table: string, start: string): readonly string[] {
  const row = table.split('\n').find((line) => line.startsWith(`${start} `)) ?? ''
  return row.split(/ {2,}/)
}

const plain = (cell: string | undefined): number =>
  Number((cell ?? '').replaceAll(/[\u202f ]/g, '').replace('\u2212', '-'))

describe('lagwright loss', slow, () => {
  it('prints a table whose total adds up, and ends with 0', async () => {
    const { put, lagwright } = place()
    const { code, out, err } = await lagwright('loss', put('runs.csv', goodList))
    expect(err).toEqual([])
    expect(out).toMatch(/^Tag +Size +Length +Lagging mm/)
    expect(out).toContain('2 runs in the total, each whole with its fittings.')
    expect(out).toContain('8760 h are taken, the whole year. (all runs)')
    expect(out).toContain('asbestos')
    const [a, b, total] = ['A-1', 'A-2', 'Total'].map((start) => cells(out, start))
    // A total has nothing to say of size, length, lagging, make and loss per metre.
    const sums = total?.slice(1).map(plain)
    const rows = [a, b].map((row) => [6, 8, 9, 10, 11].map((at) => plain(row?.[at === 6 ? 6 : at])))
    expect(sums).toHaveLength(5)
    expect(sums).toEqual(rows[0]?.map((value, at) => value + (rows[1]?.[at] ?? 0)))
    expect(code).toBe(0)
  })

  it('ends with 0 where a run cannot meet its limits: that is not its question', async () => {
    const { code, out, err } = await place().lagwright('loss', demoFile)
    expect(err).toEqual([])
    expect(out).toContain('Total lost')
    expect(out).toContain('Total gained')
    expect(out).toMatch(/GL-322 .* thickest /)
    expect(code).toBe(0)
  })

  it('writes one JSON object after its schema, with the figures of size', async () => {
    const { put, lagwright } = place()
    put('runs.csv', fuelled)
    const { out } = await lagwright('loss', 'runs.csv', '--json')
    const { runs, total, cautions } = listLossSchema.parse(JSON.parse(out))
    const sized = sizedSchema.parse(JSON.parse((await lagwright('size', 'runs.csv', '--json')).out))
    expect(cautions.length).toBeGreaterThan(5)
    expect(runs.map(({ built }) => built)).toEqual(['fixed', 'fixed', 'fixed'])
    runs.forEach((run, at) => {
      const result = sized.runs[at]
      expect(run.asBuilt.heatLossW).toBe(result?.chosen?.heatLossW)
      expect(run.bare.heatLossW).toBe(result?.bare.heatLossW)
      expect(run.asBuilt.yearlyMeanLossW).toBe(result?.chosen?.yearlyMeanLossW)
      expect(run.asBuilt.heatKWh).toBe(result?.chosen?.yearlyKWh)
      expect(run.asBuilt.co2Kg).toBe(result?.money?.co2KgPerYear)
      expect(run.saved.cost).toBe(result?.money?.savingPerYearTotal)
    })
    expect(total.withoutLength).toEqual(['F-2'])
    expect(total.withoutFuel).toEqual([])
    expect(total.lost.runs).toBe(1)
    expect(total.lost.bareHeatLossW).toBe(runs[0]?.bare.heatLossW)
    expect(total.lost.bareYearlyMeanLossW).toBe(runs[0]?.bare.yearlyMeanLossW)
    expect(total.gained.asBuiltHeatLossW).toBe(runs[2]?.asBuilt.heatLossW)
    expect(total.gained.asBuiltHeatLossW).toBeLessThan(0)
    expect(total.lost.costs).toHaveLength(1)
  })

  it('says which runs are not in the total', async () => {
    const { out } = await place().lagwrightReading(fuelled, 'loss', '-')
    expect(out).toContain('Not in it, without a length: F-2.')
    expect(out).toContain('The length is not given: the run is listed, and not in the total. (F-2)')
  })

  it('weighs the fuel though the hours are not given, and does not choose by it', async () => {
    const list = goodList
      .replace('max_loss_w_m\n', 'max_loss_w_m,fuel\n')
      .replaceAll(/(\d)\n/g, '$1,natural_gas\n')
    const plainRuns = await place().lagwrightReading(goodList, 'loss', '-', '--json')
    const { out } = await place().lagwrightReading(list, 'loss', '-', '--json')
    const [run] = listLossSchema.parse(JSON.parse(out)).runs
    const [before] = listLossSchema.parse(JSON.parse(plainRuns.out)).runs
    expect(run?.thicknessM).toBe(before?.thicknessM)
    expect(before?.bare.cost).toBeNull()
    // 8760 h of the loss, over the efficiency and at the price of the catalogue's gas.
    const heat = ((run?.bare.heatLossW ?? 0) * 8760) / 1000
    expect(run?.bare.heatKWh).toBeCloseTo(heat, 6)
    expect(run?.bare.cost).toBeGreaterThan(0)
    expect(run?.hoursPerYear).toBe(8760)
  })

  it.each(['json', 'csv', 'txt'])('writes .%s and says what it wrote', async (ending) => {
    const { folder, put, lagwright } = place()
    const { code, out, err } = await lagwright(
      'loss',
      put('runs.csv', goodList),
      '--out',
      `loss.${ending}`,
    )
    expect(err).toEqual([])
    expect(out).toMatch(new RegExp(`^loss.${ending}: 2 runs in the total`))
    expect(code).toBe(0)
    const written = readFileSync(join(folder, `loss.${ending}`), 'utf8')
    const starts: Readonly<Record<string, string>> = {
      json: '{"runs":',
      csv: 'tag,description',
      txt: 'Tag ',
    }
    expect(written.startsWith(starts[ending] ?? 'nothing')).toBe(true)
  })

  it('prints US units, and leaves JSON and CSV in SI', async () => {
    const { put, lagwright } = place()
    put('runs.csv', goodList)
    const us = await lagwright('loss', 'runs.csv', '--units', 'us')
    expect(us.out).toMatch(/^Tag +Size +Length +Lagging in +Built +Bare Btu\/h·ft +Bare Btu\/h/)
    const json = await lagwright('loss', 'runs.csv', '--units', 'us', '--json')
    expect(json.out).toBe((await lagwright('loss', 'runs.csv', '--json')).out)
  })

  it('refuses a bad list as size does, and writes nothing', async () => {
    const { folder, put, lagwright } = place()
    put('runs.csv', goodList.replace('DN 80', 'DN 81'))
    const size = await lagwright('size', 'runs.csv', '--out', 'a.csv')
    const loss = await lagwright('loss', 'runs.csv', '--out', 'b.csv')
    expect(loss).toEqual(size)
    expect(loss.code).toBe(2)
    expect(() => readFileSync(join(folder, 'b.csv'))).toThrow()
  })
})
