import { describe, expect, test } from 'vitest'
import { columnReader } from '#model/cell-edit.ts'
import { guessColumn } from '#model/column-guess.ts'
import type { FieldKey } from '#model/fields.ts'
import type { Job } from '#model/job.ts'
import { pasteTakeOff, takeOffOf } from '#model/take-off.ts'

const empty: Job = { name: '', site: '', defaults: {}, runs: [] }
const cells = (text: string) => text.split('\n').map((line) => line.split('\t'))

function counter(): () => string {
  let last = 0
  return () => `new ${++last}`
}
const pasted = (text: string, job = empty) => {
  const takeOff = takeOffOf(cells(text))
  return takeOff && pasteTakeOff(job, takeOff, counter(), () => columnReader)
}

describe('what a column of another list is', () => {
  test.each<[string, FieldKey, string]>([
    ['Line No', 'tag', 'shown'],
    ['Line No.', 'tag', 'shown'],
    ['Service', 'service', 'shown'],
    ['Pipe size', 'size', 'shown'],
    ['Length (m)', 'lengthM', 'si'],
    ['Length [ft]', 'lengthM', 'us'],
    ['length_ft', 'lengthM', 'us'],
    ['medium_c', 'mediumC', 'si'],
    ['Fluid temp °C', 'mediumC', 'si'],
    ['Fluid temperature (°F)', 'mediumC', 'us'],
    ['Fluid', 'medium', 'shown'],
    ['Room temp', 'airC', 'shown'],
    ['Insulation', 'material', 'shown'],
    ['Insulation thk (mm)', 'thicknessM', 'si'],
    ['Cladding', 'finish', 'shown'],
    ['Location', 'place', 'shown'],
    ['Rel. humidity, average %', 'humidity', 'si'],
    ['No. of valves', 'valves', 'shown'],
    ['Flange pairs (no)', 'flanges', 'si'],
    ['Elbows [pcs]', 'bends', 'si'],
    ['Hangers', 'supports', 'shown'],
    ['Flow rate (kg/s)', 'flowKgPerS', 'si'],
    ['Flow (lb/h)', 'flowKgPerS', 'us'],
    ['Flow temp', 'mediumC', 'shown'],
    ['Skin temp °C', 'measuredSurfaceC', 'si'],
    ['Measured surface temperature (°F)', 'measuredSurfaceC', 'us'],
    ['Max. surface temp °C', 'maxSurfaceC', 'si'],
    ['Bury depth (m)', 'buryDepthM', 'si'],
    ['Allowable temp drop (K)', 'maxDropK', 'si'],
    ['Energy code', 'codeTable', 'shown'],
    ['Freezing time (h)', 'frostHours', 'si'],
    ['Winter design temperature °C', 'frostAirC', 'si'],
    ['Head type', 'heads', 'shown'],
    ['Length tan to tan (m)', 'lengthM', 'si'],
  ])('%s', (header, key, units) => {
    expect(guessColumn(header)).toEqual({ key, units })
  })

  test.each(['Remark', 'Length (mm)', 'Pressure (bar)', ''])(
    'nothing is guessed from "%s"',
    (h) => {
      expect(guessColumn(h)).toBeNull()
    },
  )
})

describe('takeOffOf', () => {
  test('knows a list with our names, whatever their order', () => {
    const job = pasted('medium_c\tTag\n150\tST-1')
    expect(job?.runs.map(({ values }) => values)).toEqual([
      { shape: 'pipe', tag: 'ST-1', mediumC: 150 },
    ])
    expect(takeOffOf(cells('medium_c\tTag\n150\tST-1'))?.isKnown).toBe(true)
  })

  test('a column that is not known is to be asked for, with the first values below it', () => {
    const takeOff = takeOffOf(cells('tag\tsize\tCladding\nA\tDN 50\talu\nB\tDN 65\t'))
    expect(takeOff).toMatchObject({ isKnown: false, rows: { length: 2 } })
    expect(takeOff?.columns[2]).toEqual({
      header: 'Cladding',
      samples: ['alu', ''],
      readAs: { key: 'finish', units: 'shown' },
    })
  })

  test('our own name of a column comes before what is guessed from another', () => {
    const takeOff = takeOffOf(cells('Line No\ttag\tsize\n7\tA\tDN 50'))
    expect(takeOff?.columns.map(({ readAs }) => readAs?.key)).toEqual([undefined, 'tag', 'size'])
  })

  test('a column of values without a name is asked for too', () => {
    expect(takeOffOf(cells('tag\tsize\nA\tDN 50\tby the door'))?.isKnown).toBe(false)
  })

  test('words above figures are a header in any language', () => {
    const takeOff = takeOffOf(cells('Leitung\tLänge\nHeizung\t12,5\nDampf\t8'))
    expect(takeOff?.columns.map(({ readAs }) => readAs)).toEqual([null, null])
  })

  test.each([
    ['figures in the first line', 'ST-1\tDN 50\nST-2\tDN 65'],
    ['words in every line', 'Steam main\tBoiler house\nBranch\tYard'],
    ['materials of two runs', 'Stone wool insulation\tPlain sheet\nFoam\tBright jacket'],
    ['one word above figures', 'Length\n12\n14'],
    ['the same word twice', 'Air\tair\nWater\twater'],
    ['one line of words', 'Steam main\tBoiler house'],
  ])('no header: %s', (_, text) => {
    expect(takeOffOf(cells(text))).toBeNull()
  })

  test('a header without lines below it has no runs', () => {
    expect(takeOffOf(cells('tag\tsize'))?.rows).toEqual([])
  })
})

test('a list is added below the runs that stand, and takes over nothing from them', () => {
  const standing = { ...empty, runs: [{ id: 'A', values: { tag: 'A', airC: 35 }, drafts: {} }] }
  const job = pasted('Line No\tPipe size\tRemark\nB\tDN 50\tx\nC\tDN 65\ty', standing)
  expect(job?.runs[0]).toBe(standing.runs[0])
  expect(job?.runs.slice(1).map(({ values }) => values)).toEqual([
    { shape: 'pipe', tag: 'B', size: 'DN 50' },
    { shape: 'pipe', tag: 'C', size: 'DN 65' },
  ])
})
