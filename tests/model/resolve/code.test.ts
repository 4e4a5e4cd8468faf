/** Which rows of a code table hold for a run, and what is said of them. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { resolve } from '#model/resolve/resolve.ts'
import type { Problem } from '#sizing/problem.ts'
import type { Issue } from '#sizing/result.ts'
import { catalogue, noteCodes, steamRun } from '../../sizing/catalogue.ts'
import { ownIndex } from '../../sizing/code-tables.ts'

const heating: RunValues = { ...steamRun, mediumC: 70, codeTable: 'geg-2024-heating' }
const { size: _size, ...unsized } = heating
const duct: RunValues = {
  ...unsized,
  shape: 'rect-duct',
  size: '600 x 400',
  material: 'glass_wool_slab',
}

function problemOf(values: RunValues): Problem {
  const resolved = resolve(values, ownIndex)
  if (!resolved.ok) throw new Error(JSON.stringify(resolved.issues, null, 1))
  return resolved.problem
}
function issuesOf(values: RunValues): readonly Issue[] {
  const resolved = resolve(values, ownIndex)
  return resolved.ok ? [] : resolved.issues
}
const columnsOf = (values: RunValues): string[] => issuesOf(values).map(({ column }) => column)
const thicknessesMm = (values: RunValues): number[] =>
  (problemOf(values).limits.code?.asks ?? []).flatMap((ask) =>
    ask.kind === 'thickness'
      ? ask.rows.map(({ thicknessM }) => Math.round(thicknessM * 1e4) / 10)
      : [],
  )

describe('a code table', () => {
  test('none given: code is not judged', () => {
    expect(problemOf(steamRun).limits.code).toBeNull()
    const alone = problemOf({ ...steamRun, codeFactor: 2 })
    expect(alone.notes.some(({ text }) => text.startsWith('code_factor is not used'))).toBe(true)
  })

  test('by its id; another name is answered with what there is', () => {
    expect(problemOf(heating).limits.code?.table).toContain('German Building Energy Act')
    const [issue] = issuesOf({ ...heating, codeTable: 'geg-2024-heatin' })
    expect(issue).toMatchObject({ column: 'code_table', found: 'geg-2024-heatin' })
    expect(issue?.allowed).toContain('geg-2024-heating')
  })

  test('that is misspelt is the one fault of a run sized by nothing else', () => {
    const unreached = { ...heating, reach: false, reachReason: 'in a shaft' }
    expect(columnsOf({ ...unreached, codeTable: 'geg' })).toEqual(['code_table'])
    expect(columnsOf({ ...unreached, mediumC: 30, codeTable: 'ashrae-90.1-2010-heating' })).toEqual(
      ['reach'],
    )
  })

  test('every table says its edition and that it is to be verified', () => {
    for (const { id, edition, service } of catalogue.codeTables) {
      const isDuct = id.includes('duct')
      const isCold = service.includes('chilled') || service.includes('cold')
      const problem = problemOf({
        ...(isDuct ? duct : heating),
        codeTable: id,
        ...(isCold && { mediumC: 6, airC: 27 }),
      })
      const note = problem.notes.find(({ code }) => code === 'code-table')
      expect(problem.limits.code?.asks.length, id).toBeGreaterThan(0)
      expect(note?.text).toContain(edition)
      expect(note?.text).toContain('verify against your own edition')
    }
  })

  test('figures from memory are said to be', () => {
    expect(noteCodes(problemOf({ ...heating, codeTable: 'dpr-412-a' }))).toContain('code-recalled')
    expect(noteCodes(problemOf(heating))).not.toContain('code-recalled')
  })

  test('is something to size by', () => {
    expect(problemOf({ ...heating, reach: false, reachReason: 'in a shaft' })).toBeTruthy()
  })
})

describe('the size it goes by', () => {
  test('inner diameter: from the size, or from diameter and wall', () => {
    expect(thicknessesMm(heating)).toEqual([54.5])
    const given = { ...unsized, outerDiameterM: 0.0603 }
    expect(thicknessesMm({ ...given, wallM: 0.0029 })).toEqual([54.5])
    const [issue] = issuesOf(given)
    expect(issue).toMatchObject({ column: 'wall_mm', found: 'nothing' })
    expect(issue?.allowed).toContain('inner diameter')
  })

  // 90.1-2010, medium 61 to 93 °C: 38 mm below NPS 1-1/2, 51 mm from there.
  test('nominal size: of the pipe, or of the steel pipe that is not thinner, said', () => {
    const codeTable = 'ashrae-90.1-2010-heating'
    expect(thicknessesMm({ ...heating, codeTable })).toEqual([51])
    expect(noteCodes(problemOf({ ...heating, codeTable }))).not.toContain('code-nominal-assumed')
    const copper = problemOf({ ...unsized, outerDiameterM: 0.028, codeTable })
    expect(thicknessesMm({ ...unsized, outerDiameterM: 0.028, codeTable })).toEqual([38])
    expect(copper.notes.find(({ code }) => code === 'code-nominal-assumed')?.text).toContain(
      'DN 25',
    )
  })

  test('a table by pipe sizes is for pipes', () => {
    for (const codeTable of [
      'geg-2024-heating',
      'ashrae-90.1-2010-heating',
      'bs-5422-2023-domestic',
    ])
      expect(columnsOf({ ...duct, codeTable })).toEqual(['code_table'])
    // Any size, but a thickness on a pipe.
    expect(columnsOf({ ...duct, codeTable: 'geg-2024-floor' })).toEqual(['code_table'])
  })

  test('one of resistances is for ducts and flat surfaces', () => {
    const codeTable = 'ashrae-90.1-2010-duct-exterior-zones-1-5'
    expect(issuesOf({ ...heating, codeTable })[0]?.allowed).toContain('ducts')
    const wall: RunValues = {
      ...unsized,
      shape: 'flat',
      heightM: 2,
      widthM: 2,
      material: 'stone_wool_slab',
      codeTable,
    }
    expect(problemOf(wall).limits.code?.asks[0]).toMatchObject({
      kind: 'resistance',
      resistanceM2KPerW: 1.06,
      ratingMeanC: 23.9,
    })
  })

  test('one of losses is for runs in air', () => {
    const tube = { ...unsized, outerDiameterM: 0.022, codeTable: 'bs-5422-2023-domestic' }
    expect(problemOf(tube).limits.code?.asks[0]).toMatchObject({ kind: 'loss', maxLossWPerM: 9.12 })
    expect(columnsOf({ ...tube, buryDepthM: 1 })).toEqual(['code_table'])
    expect(columnsOf({ ...tube, codeFactor: 2 })).toEqual(['code_factor'])
    expect(columnsOf({ ...tube, codeFactor: 1 })).toEqual([])
  })
})

describe('the temperature it goes by', () => {
  const codeTable = 'ashrae-90.1-2010-heating'

  // 90.1-2010, NPS 2: 51 mm from 61 to 93 °C, 64 mm to 121 °C.
  test('is that of the medium at its hottest, or of a cold one at its coldest', () => {
    expect(thicknessesMm({ ...heating, codeTable, mediumMaxC: 100 })).toEqual([64])
    // Cooling, NPS 1: 13 mm from 4 to 16 °C, 25 mm below.
    const cold = {
      ...heating,
      size: 'NPS 1',
      mediumC: 6,
      airC: 27,
      codeTable: 'ashrae-90.1-2010-cooling',
    }
    expect(thicknessesMm(cold)).toEqual([13])
    expect(thicknessesMm({ ...cold, mediumMinC: 2 })).toEqual([25])
  })

  test('outside all bands nothing is asked: not judged, said', () => {
    const problem = problemOf({ ...heating, mediumC: 30, codeTable })
    expect(problem.limits.code).toBeNull()
    expect(problem.notes.find(({ code }) => code === 'code-asks-nothing')?.text).toContain('30 °C')
  })

  test('no mean temperature stated: midway between medium and air, said', () => {
    const problem = problemOf({ ...heating, mediumC: 6, airC: 26, codeTable: 'geg-2020-chilled' })
    expect(problem.limits.code?.asks[0]).toMatchObject({ ratingMeanC: 16 })
    expect(noteCodes(problem)).toContain('code-mean-assumed')
  })
})

describe('a factor', () => {
  test('that the table lists is said with what it is for', () => {
    const text = (codeFactor: number): string | undefined =>
      problemOf({ ...heating, codeFactor }).notes.find(({ code }) => code === 'code-factor')?.text
    expect(text(2)).toContain('outside air')
    expect(text(0.7)).toContain('lists no such factor')
    expect(text(1)).toBeUndefined()
  })

  test('multiplies the thickness of every row, and a resistance', () => {
    const dpr = { ...heating, codeTable: 'dpr-412-a' }
    const full = thicknessesMm(dpr)
    expect(full).toHaveLength(11)
    expect(thicknessesMm({ ...dpr, codeFactor: 0.5 })).toEqual(full.map((mm) => mm / 2))
    const sheet = { ...duct, codeTable: 'ashrae-90.1-2010-duct-exterior-zones-1-5', codeFactor: 2 }
    expect(problemOf(sheet).limits.code?.asks[0]).toMatchObject({ resistanceM2KPerW: 2.12 })
  })
})
