import Papa from 'papaparse'
import { describe, expect, it } from 'vitest'
import { cautions } from '#report/cautions.ts'
import { writeResultsCsv } from '#report/results-csv.ts'
import { countWords, writeRunTable } from '#report/run-table.ts'
import { sizeWords } from '#report/run-words.ts'
import { textWidth } from '#report/text-table.ts'
import { sizedDemo } from './demo-runs.ts'

const runs = sizedDemo()
const table = (units: 'si' | 'us', width: number | null = null) =>
  writeRunTable(runs, { units, width }).split('\n')
const line = (lines: readonly string[], tag: string) =>
  lines.find((text) => text.startsWith(tag)) ?? ''

describe('the table of results', () => {
  it('has a line per run, the units in the header, the count and the cautions', () => {
    const lines = table('si')
    expect(lines[0]).toMatch(
      /^Tag +Size +Lagging mm +Sold as +Loss W\/m +Bare W\/m +Surface, mean °C +Governed by +Reason$/,
    )
    for (const { result } of runs) expect(line(lines, result.tag)).toContain(result.reason)
    expect(lines).toContain(countWords(runs.length, ['ST-110', 'GL-322'], 0))
    for (const { text } of cautions) expect(lines.join('\n')).toContain(text)
  })

  it('lines numbers up at their right end', () => {
    const [header = '', ...rows] = table('si')
    const end = header.indexOf('Loss W/m') + 'Loss W/m'.length
    for (const { result } of runs) expect(line(rows, result.tag).slice(end, end + 2)).toBe('  ')
  })

  it('prints US units throughout, bounds included', () => {
    const lines = table('us')
    expect(lines[0]).toMatch(
      /Lagging in +Sold as +Loss Btu\/h·ft +Bare Btu\/h·ft +Surface, mean °F/,
    )
    for (const { result } of runs) expect(line(lines, result.tag)).not.toMatch(/°C|W\/m|\d mm/)
    // A conductivity keeps its unit: it is the one of the sheets that the catalogue cites.
    const notes = lines.slice(lines.indexOf('Notes'), lines.indexOf('Cautions'))
    expect(notes.join('\n')).not.toMatch(/\d[ \u00a0](?:°C|mm|K|W\/m)(?![\w²])|diff\./)
  })

  it('gives the actual thickness, and beside it what an inch series calls it', () => {
    // ASHRAE Handbook Fundamentals 2021 (SI), ch. 23, table 13: NPS 3, nominal 3 in, is 77.5 mm thick.
    for (const [units, cells] of [
      ['si', /^ST-111 .* 77\.5 +3 in /],
      ['us', /^ST-111 .* 3\.05 +3 in /],
    ] as const) {
      expect(line(table(units), 'ST-111')).toMatch(cells)
    }
    expect(line(table('us'), 'ST-111')).toContain('3 in (3.05\u00a0in) is the cheapest')
    const metric = runs.filter(({ result }) => result.chosen?.nominalThicknessM === null)
    expect(writeRunTable(metric, { units: 'si', width: null })).not.toContain('Sold as')
  })

  it('keeps to the width of the terminal', () => {
    const { length } = runs
    for (const text of table('si', 120).slice(0, length + 1))
      expect(textWidth(text)).toBeLessThanOrEqual(120)
  })

  it('gives each note once, with its runs', () => {
    const lines = table('si')
    const notes = lines.slice(lines.indexOf('Notes') + 1, lines.indexOf('Cautions') - 1)
    expect(new Set(notes).size).toBe(notes.length)
    expect(notes.length).toBe(
      new Set(runs.flatMap(({ result }) => result.notes.map(({ text }) => text))).size,
    )
  })

  it('counts what is met, and names the first that are not', () => {
    expect(countWords(1, [], 0)).toBe('1 run, all limits met.')
    expect(countWords(3, ['A', 'B'], 0)).toBe('3 runs, 1 within their limits. Not within: A, B.')
    expect(countWords(2, [], 1)).toBe('2 runs, 1 within their limits, 1 with no limit judged.')
    expect(countWords(3, ['A'], 1)).toBe(
      '3 runs, 1 within their limits, 1 with no limit judged. Not within: A.',
    )
    const many = Array.from({ length: 10 }, (_, index) => `T-${index}`)
    expect(countWords(10, many, 0)).toMatch(/Not within: T-0, .*, T-7 and 2 more\.$/)
  })
})

describe('the size in words', () => {
  it.each([
    [{ size: 'DN 80', outerDiameterM: 0.0889 }, 'DN 80', 'DN 80'],
    [{ widthM: 0.6, heightM: 0.4 }, '600 × 400', '23.6 × 15.7'],
    [{ outerDiameterM: 0.0603 }, 'Ø 60.3', 'Ø 2.4'],
    [{ areaM2: 26 }, '26.0\u00a0m²', '279.9\u00a0ft²'],
    [{}, '–', '–'],
  ])('of %j is %s or %s', (values, si, us) => {
    expect(sizeWords(values, 'si')).toBe(si)
    expect(sizeWords(values, 'us')).toBe(us)
  })
})

describe('results as CSV', () => {
  const { data, errors } = Papa.parse<Record<string, string>>(
    [...writeResultsCsv(runs)].join('').trimEnd(),
    {
      header: true,
    },
  )

  it('has a row per run with every cell in its column', () => {
    expect(errors).toEqual([])
    expect(data.map(({ tag }) => tag)).toEqual(runs.map(({ result }) => result.tag))
  })

  it('holds the numbers of the results in mm and SI, empty where there is none', () => {
    for (const [index, row] of data.entries()) {
      const chosen = runs[index]?.result.chosen
      expect(row.thickness_mm).toBe(
        chosen ? String(Number((chosen.thicknessM * 1000).toPrecision(6))) : '',
      )
      expect(Number(row.surface_c)).toBeCloseTo(chosen?.surfaceTempC ?? 0, 3)
      expect(row.reason).toBe(runs[index]?.result.reason)
    }
  })

  it('keeps a tag that looks like a formula from being run', () => {
    const [first] = runs
    if (!first) throw new Error('no runs')
    const [, row] = writeResultsCsv([{ ...first, result: { ...first.result, tag: '=cmd' } }])
    expect(row).toMatch(/^'=cmd,/)
  })
})

describe('cautions', () => {
  it('have a code of their own, a text and somebody to defer to', () => {
    expect(new Set(cautions.map(({ code }) => code)).size).toBe(cautions.length)
    for (const { text, deferTo } of cautions) {
      expect(text).toMatch(/^[A-Z].*\.$/)
      expect(text.length).toBeLessThan(180)
      expect(deferTo).not.toBe('')
    }
  })
})
