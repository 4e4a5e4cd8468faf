/** Codes, laws and fittings in db/seed: bands without gaps, and figures that fall and rise as they must. */
import { afterAll, describe, expect, test } from 'vitest'
import { openCatalogue, readCatalogue } from '#backend/catalogue-db.ts'
import type { CodeRow, CodeTable } from '#catalogue/types.ts'
import { dbFolder } from './program-folder.ts'

const db = openCatalogue(':memory:', dbFolder)
afterAll(() => void db.close())
const { codeTables, fittingAreas, fittingLengths, supportAllowances, pipeSizes } = readCatalogue(db)

const tableOf = (id: string): CodeTable => {
  const table = codeTables.find((candidate) => candidate.id === id)
  if (!table) throw new Error(id)
  return table
}
const open = Number.POSITIVE_INFINITY

/** Bands that touch: each starts where one ends. */
function touches(ends: readonly (readonly [number, number])[]): boolean {
  const bands = [...new Map(ends.map((end) => [end.join(), end])).values()].sort(
    ([a], [b]) => a - b,
  )
  return bands.every(([low, high], i) => high > low && (i === 0 || bands[i - 1]?.[1] === low))
}

describe('code tables', () => {
  test.each(codeTables)('$id has neither gap nor overlap', ({ id, rows, sizeBasis }) => {
    const fluid = (row: CodeRow) => [row.fluidMinC ?? -open, row.fluidMaxC ?? open] as const
    const size = (row: CodeRow) => [row.sizeMinM ?? 0, row.sizeMaxM ?? open] as const
    expect(touches(rows.map(fluid))).toBe(true)
    expect(touches(rows.map(size))).toBe(true)
    expect(rows.every((row) => row.sizeMinM === null || sizeBasis !== 'any')).toBe(true)
    // One cell for each size band and temperature band; in the Italian table, for each of its conductivities.
    const count = (part: (row: CodeRow) => unknown) =>
      new Set(rows.map((row) => String(part(row)))).size
    const columns = id === 'dpr-412-a' ? count((row) => row.conductivityMinWPerMK) : 1
    expect(rows).toHaveLength(count(fluid) * count(size) * columns)
    const keys = (row: CodeRow) => `${fluid(row)} ${size(row)} ${row.conductivityMinWPerMK}`
    expect(count(keys)).toBe(rows.length)
  })

  test('every table warns', () => {
    expect(codeTables.every(({ warning }) => warning === 'verify against your own edition')).toBe(
      true,
    )
  })

  test('only what is free to ship ships', () => {
    const kinds = codeTables.map(({ id }) => /^(geg|dpr-412|ashrae-90\.1)/.exec(id)?.[0])
    expect([...new Set(kinds)]).toEqual(['geg', 'dpr-412', 'ashrae-90.1'])
  })

  test('more is asked of larger pipes, worse materials and media further from the air', () => {
    for (const { id, rows } of codeTables) {
      const thicknesses = rows.filter((row) => row.value !== null && row.rule === null)
      for (const row of thicknesses)
        for (const other of thicknesses) {
          const isSame =
            row.fluidMinC === other.fluidMinC &&
            row.conductivityMinWPerMK === other.conductivityMinWPerMK
          const isLarger = isSame && (row.sizeMinM ?? 0) > (other.sizeMinM ?? 0)
          const isWorse =
            id === 'dpr-412-a' &&
            row.sizeMinM === other.sizeMinM &&
            (row.conductivityMinWPerMK ?? 0) > (other.conductivityMinWPerMK ?? 0)
          const isHotter =
            id.endsWith('-heating') &&
            row.sizeMinM === other.sizeMinM &&
            (row.fluidMinC ?? -open) > (other.fluidMinC ?? -open)
          const isColder =
            id.endsWith('-cooling') &&
            row.sizeMinM === other.sizeMinM &&
            (row.fluidMaxC ?? open) < (other.fluidMaxC ?? open)
          if (isLarger || isHotter || isColder)
            expect.soft(row.value, id).toBeGreaterThanOrEqual(other.value ?? open)
          if (isWorse) expect.soft(row.value, id).toBeGreaterThan(other.value ?? open)
        }
    }
  })

  test('the converted inch table is the metric one but for the cell in which they are known to differ', () => {
    const pairs = ['heating', 'cooling'].flatMap((kind) => {
      const inch = tableOf(`ashrae-90.1-2016-${kind}`).rows
      return tableOf(`ashrae-90.1-2010-${kind}`).rows.map((row, i) => ({
        metric: Math.round((row.value ?? 0) * 1000),
        inch: (inch[i]?.value ?? 0) * 1000,
        fluidMinC: row.fluidMinC,
        sizeMaxM: row.sizeMaxM,
      }))
    })
    const differ = pairs.filter(({ metric, inch }) => Math.abs(metric - inch) > 0.51)
    expect(differ).toMatchObject([{ metric: 89, inch: 76.2, fluidMinC: 121, sizeMaxM: 0.025 }])
  })

  test('the older edition never asks for more', () => {
    for (const kind of ['heating', 'cooling']) {
      const newer = tableOf(`ashrae-90.1-2010-${kind}`).rows
      const older = tableOf(`ashrae-90.1-2004-${kind}`).rows
      expect(older).toHaveLength(newer.length)
      for (const [i, row] of older.entries())
        expect(row.value).toBeLessThanOrEqual(newer[i]?.value ?? 0)
    }
  })

  test('the columns of the Italian table keep about the loss of its 0.040 column', () => {
    // By T = r[(1 + t/r)^(K/k) − 1] on a diameter within each band; the table is rounded to whole millimetres.
    const { rows } = tableOf('dpr-412-a')
    const radii = new Map([
      [0, 0.0086],
      [0.02, 0.015],
      [0.04, 0.025],
      [0.06, 0.035],
      [0.08, 0.045],
      [0.1, 0.057],
    ])
    for (const row of rows) {
      const radiusM = radii.get(row.sizeMinM ?? 0) ?? 0
      const base = rows.find(
        ({ sizeMinM, conductivityMinWPerMK: k }) => sizeMinM === row.sizeMinM && k === 0.04,
      )
      const ratio = (row.conductivityMinWPerMK ?? 0) / 0.04
      const expected = radiusM * ((1 + (base?.value ?? 0) / radiusM) ** ratio - 1)
      const name = `${row.conductivityMinWPerMK} ${row.sizeMinM}`
      expect.soft(Math.abs((row.value ?? 0) - expected), name).toBeLessThan(0.001)
    }
  })
})

describe('fittings', () => {
  test('grow with the pipe, the pressure class and the heat; a valve has more surface than a flange pair', () => {
    for (const row of fittingAreas)
      for (const other of fittingAreas) {
        const isSameKind = row.item === other.item && row.pressureClass === other.pressureClass
        if (isSameKind && row.dn > other.dn) expect(row.areaM2).toBeGreaterThan(other.areaM2)
        if (row.dn !== other.dn) continue
        if (row.item === other.item && row.pressureClass > other.pressureClass)
          expect(row.areaM2).toBeGreaterThan(other.areaM2)
        if (row.item === 'valve' && other.item === 'flange-pair')
          expect(row.areaM2).toBeGreaterThan(other.areaM2)
      }
  })

  // From the text of a US government steam tip sheet: a 6 in gate valve may have over 6 ft² of surface.
  test('a 6 in gate valve has over 6 ft²', () => {
    const valves = fittingAreas.filter(({ item, dn }) => item === 'valve' && dn === 150)
    expect(valves).toHaveLength(2)
    for (const { areaM2 } of valves) expect(areaM2).toBeGreaterThan(6 * 0.3048 ** 2)
  })

  test('every outside diameter is that of a steel pipe of the DN', () => {
    const isKnown = (dn: number, outerDiameterM: number) =>
      pipeSizes.some(
        (pipe) =>
          pipe.dn === dn &&
          pipe.outerDiameterM === outerDiameterM &&
          /^(EN 10220|ASME B36\.10M)/.test(pipe.standard),
      )
    const odd = [...fittingAreas, ...fittingLengths].filter(
      ({ dn, pipeOuterDiameterM }) => !isKnown(dn, pipeOuterDiameterM),
    )
    expect(odd).toEqual([])
  })

  test('lengths are within their range, shorter lagged than bare, longer outdoors and on hotter and larger pipes', () => {
    const at = (wanted: Partial<(typeof fittingLengths)[number]>) =>
      fittingLengths.find((row) =>
        Object.entries(wanted).every(([key, value]) => row[key as keyof typeof row] === value),
      )?.lengthM ?? Number.NaN
    for (const { item, dn, mediumC, lengthM, lowM, highM, place, lagged } of fittingLengths) {
      // The middle of the range, to the half metre it is printed in.
      expect(Math.abs(lengthM - (lowM + highM) / 2)).toBeLessThanOrEqual(1e-9)
      const bare = at({ item, dn, mediumC, place: 'indoors' })
      if (lagged) expect(lengthM).toBeLessThan(bare)
      if (place === 'outdoors') expect(lengthM).toBeGreaterThan(bare)
      if (mediumC === 400)
        expect(lengthM).toBeGreaterThanOrEqual(at({ item, dn, place, mediumC: 100 }))
      if (item === 'valve')
        expect(lengthM).toBeGreaterThan(at({ item: 'flange-pair', dn, place, mediumC }))
    }
    // ISO 12241 annex A / VDI 2055, from memory.
    expect(at({ item: 'valve', dn: 100, lagged: true, mediumC: 400 })).toBe(6.5)
    expect(at({ item: 'flange-pair', dn: 200, place: 'outdoors', mediumC: 100 })).toBe(18.5)
  })

  // ISO 12241 annex A, from memory.
  test('supports add 15 % indoors and 25 % outdoors', () => {
    expect(supportAllowances.map(({ place, lossFraction }) => [place, lossFraction])).toEqual([
      ['indoors', 0.15],
      ['outdoors', 0.25],
    ])
  })
})
