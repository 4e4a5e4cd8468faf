/** What a figure was read off: the cells around it, for whoever repeats it by hand. */
import { expect, test } from 'vitest'
import { between, type Point, readAt } from '#catalogue/figure.ts'
import { saturationCells } from '#catalogue/lookup.ts'
import { heatCapacityCells, latentHeatCells } from '#catalogue/media.ts'
import { burnThreshold } from '#touch/burn-threshold.ts'
import { shippedCatalogue } from './shipped-catalogue.ts'

const catalogue = shippedCatalogue()
const { steam } = catalogue

const points: readonly Point[] = [
  [0, 10],
  [20, 30],
  [50, 0],
]

test.each([
  [20, [[20, 30]]],
  [0, [[0, 10]]],
  [
    35,
    [
      [20, 30],
      [50, 0],
    ],
  ],
  [-1, []],
  [51, []],
])('at %d the cells %j are read', (at, cells) => {
  expect(readAt(points, at)).toEqual(cells)
  expect(between(points, at) === null).toBe(cells.length === 0)
})

test('steam between two states of its table, at one, and beyond it', () => {
  const pressures = (gaugePa: number): number[] =>
    saturationCells(steam, gaugePa).map(({ pressureAbsolutePa }) => pressureAbsolutePa)
  expect(pressures(7e5)).toEqual([8e5, 9e5])
  expect(pressures(8e5 - 101_325)).toEqual([8e5])
  expect(pressures(1e9)).toEqual([])
  expect(latentHeatCells(steam, 170).map(([at]) => at < 170)).toEqual([true, false])
  expect(latentHeatCells(steam, 1000)).toEqual([])
})

test('a heat capacity lies between its cells, and a medium without a table has none', () => {
  const cells = heatCapacityCells(catalogue, { medium: 'water', temperatureC: 63 })
  expect(cells.map(([at]) => at < 63)).toEqual([true, false])
  expect(heatCapacityCells(catalogue, { medium: 'other', temperatureC: 63 })).toEqual([])
})

// ISO 13732-1, smooth metal: the cells of the catalogue around 5 s, and that of 1 min.
test('a burn threshold tells the contact time it was read at, and its cells', () => {
  const surface = { touchClass: 'smooth-metal', coating: null, coatingThicknessM: null } as const
  const read = (contactS: number) =>
    burnThreshold(catalogue.burnThresholds, surface, contactS)?.read
  expect(read(5)).toEqual({
    contactS: 5,
    cells: [
      { contactS: 4, thresholdC: 58 },
      { contactS: 10, thresholdC: 55 },
    ],
  })
  expect(read(60)).toEqual({ contactS: 60, cells: [{ contactS: 60, thresholdC: 51 }] })
  // Longer than eight hours is looked up at eight hours.
  expect(read(86_400)?.contactS).toBe(28_800)
})
