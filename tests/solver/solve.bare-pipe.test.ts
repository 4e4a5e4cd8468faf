/** The handbook's tables of bare pipes, cell by cell, through the whole solver. */
import { describe } from 'vitest'
import { solve } from '#solver/solve.ts'
import { published, type Within } from '../published.ts'
import { type BarePipe, bareCopper, bareSteel } from './printed/bare-pipe.ts'
import { plainFilm } from './systems.ts'

/** Still air of 80 °F; the wall's own resistance is neglected, as it is thousands of times smaller than the film's. */
const AIR_C = (80 - 32) / 1.8

const lossWPerM =
  (emissivity: number) =>
  ({ outerDiameterIn, insideF }: BarePipe): number =>
    solve({
      ...plainFilm,
      shape: {
        kind: 'pipe',
        outerDiameterM: outerDiameterIn * 0.0254,
        orientation: 'horizontal',
      },
      layers: [],
      emissivity,
      mediumC: (insideF - 32) / 1.8,
      around: { airC: AIR_C, surroundingsC: AIR_C, windMPerS: 0, altitudeM: 0 },
    }).heatLossWPerM ?? Number.NaN

const rows = (table: string, pipes: readonly BarePipe[], within: Within) =>
  pipes.map((given) => ({
    from: `ASHRAE Handbook Fundamentals 2021, ch. 23, table ${table}`,
    given,
    printed: given.printed,
    within,
  }))

describe('bare steel pipe, emissivity 0.80', () => {
  published(
    lossWPerM(0.8),
    rows('17', bareSteel, {
      fraction: 0.025,
      because:
        'the table was made with another fit of the air properties and printed with three digits',
    }),
  )
})

describe('bare copper tube, emissivity 0.60', () => {
  published(
    lossWPerM(0.6),
    rows('18', bareCopper, {
      fraction: 0.01,
      because: 'the table does not print its emissivity; 0.60 reproduces every cell of it',
    }),
  )
})
