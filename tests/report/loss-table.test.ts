import { describe, expect, test } from 'vitest'
import { lossOfRun } from '#model/run-loss.ts'
import { sizeRun } from '#model/size-run.ts'
import { lossColumns } from '#report/loss-columns.ts'
import { type LossLine, writeLossCsv } from '#report/loss-csv.ts'
import { writeLossTable } from '#report/loss-table.ts'
import { index } from '../sizing/catalogue.ts'
import { sizedDemo } from './demo-runs.ts'

const lines: readonly LossLine[] = sizedDemo().map(({ values, result }) => ({
  values,
  loss: lossOfRun(values, result, index),
}))

const numberIn = (cell: string): number =>
  Number(cell.replaceAll('\u202f', '').replace('\u2212', '-'))

describe.each(['si', 'us'] as const)('the table of losses in %s', (units) => {
  test('has totals that are the sums of what stands above them', () => {
    const columns = lossColumns(lines, units)
    const summed = columns.filter(({ cells }) => cells.at(-1) !== '' && cells.length > 0).slice(1)
    expect(summed.length).toBeGreaterThanOrEqual(5)
    for (const { header, cells } of summed) {
      const rows = cells.slice(0, lines.length)
      const [lost, gained] = cells.slice(lines.length).map(numberIn)
      const sum = (isGain: boolean): number =>
        rows
          .filter((_, at) => (lines[at]?.loss.bare.yearlyMeanLossW ?? 0) < 0 === isGain)
          .map(numberIn)
          .filter((value) => Number.isFinite(value))
          .reduce((total, value) => total + value, 0)
      expect(lost, header).toBeCloseTo(sum(false), 6)
      expect(gained, header).toBeCloseTo(sum(true), 6)
    }
  })

  test('says what each run is built with', () => {
    const text = writeLossTable(lines, units)
    expect(text).toMatch(/ST-106 .* fixed /)
    expect(text).toMatch(/ST-110 .* bare /)
    expect(text).toMatch(/GL-322 .* thickest /)
    expect(text).toMatch(/^Total lost /m)
    expect(text).not.toMatch(/NaN|undefined|Infinity/)
  })
})

test('the mean of the year has columns of its own where months part it from the loss condition', () => {
  const [first] = lines
  if (!first) throw new Error('The demo list is empty')
  const headers = (shown: readonly LossLine[]): string[] =>
    lossColumns(shown, 'si').map(({ header }) => header)
  expect(headers([first]).filter((header) => header.endsWith(', mean of year'))).toEqual([])
  const values = { ...first.values, monthlyAirC: '2 3 6 10 15 21 24 23 18 12 7 3' }
  const sized = sizeRun(values, {}, index)
  if (!sized.ok) throw new Error(JSON.stringify(sized.issues))
  const line = { values, loss: lossOfRun(values, sized.result, index) }
  const columns = lossColumns([line], 'si')
  const cell = (header: string): number =>
    numberIn(columns.find((column) => column.header === header)?.cells[0] ?? '')
  expect(cell('Bare W, mean of year')).toBe(Math.round(line.loss.bare.yearlyMeanLossW ?? 0))
  expect(cell('Bare W')).toBe(Math.round(line.loss.bare.heatLossW ?? 0))
  expect(cell('Bare W')).not.toBe(cell('Bare W, mean of year'))
})

test('as CSV every run is a row as wide as the header, in SI', () => {
  const [header, ...rows] = [...writeLossCsv(lines)]
  expect(header).toMatch(/^tag,description,.*,bare_kwh,built_kwh,saved_kwh,/)
  expect(rows).toHaveLength(lines.length)
})
