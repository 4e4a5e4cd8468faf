/** Bare steam lines in still air, as public sheets print them without their emissivity. */
import { describe } from 'vitest'
import { solve } from '#solver/solve.ts'
import { type PublishedRow, published } from '../../published.ts'
import { constant, lying, plainFilm, still } from '../systems.ts'

interface Line {
  readonly outerDiameterM: number
  readonly steamC: number
  readonly airC: number
  readonly emissivity: number
}

const lossWPerM = ({ outerDiameterM, steamC, airC, emissivity }: Line): number =>
  solve({
    ...plainFilm,
    shape: lying(outerDiameterM),
    layers: [],
    emissivity,
    mediumC: steamC,
    around: still(airC),
  }).heatLossWPerM ?? Number.NaN

/** A million Btu a year per 100 ft, in W/m. */
const MMBTU_PER_YEAR_AND_100_FT = (1e6 * 1055.056) / (8760 * 3600) / 30.48

describe('a tip sheet of a government', () => {
  // Steam of 150 psig has 366 °F, of 15 psig 250 °F; the air of 75 °F is that of the other rows of the sheet.
  const line = (outerDiameterM: number, steamF: number): Line => ({
    outerDiameterM,
    steamC: (steamF - 32) / 1.8,
    airC: (75 - 32) / 1.8,
    emissivity: 0.8,
  })
  published(
    (given: Line) => lossWPerM(given) / MMBTU_PER_YEAR_AND_100_FT,
    (
      [
        ['1 in, 150 psig', line(0.0334, 366), '285'],
        ['2 in, 150 psig', line(0.0603, 366), '480'],
        ['4 in, 15 psig', line(0.1143, 250), '415'],
      ] as const
    ).map(([size, given, printed]) => ({
      from: `US government tip sheet on steam lines, ${size} [MMBtu a year per 100 ft]`,
      given,
      printed,
      within: { fraction: 0.1, because: 'the sheet states neither its emissivity nor its air' },
    })),
  )
})

describe('an engineering handbook of the web', () => {
  // Outside diameters of EN 10220; the air is in the middle of the 10 to 25 °C that the page names.
  const sizes = [
    [15, 0.0213],
    [20, 0.0269],
    [25, 0.0337],
    [50, 0.0603],
    [100, 0.1143],
    [150, 0.1683],
  ] as const
  const table = [
    [56, '54', '65', '79', '132', '233', '324'],
    [100, '116', '140', '169', '285', '501', '696'],
    [153, '210', '255', '312', '528', '939', '1305'],
    [180, '274', '329', '408', '676', '1190', '1660'],
  ] as const
  const rows = table.flatMap(([differenceK, ...printed]): PublishedRow<Line>[] =>
    sizes.map(([nominal, outerDiameterM], j) => ({
      from: `engineering handbook of the web, heat losses of bare steam pipes, ${nominal} mm`,
      given: { outerDiameterM, steamC: 18 + differenceK, airC: 18, emissivity: 0.9 },
      printed: printed[j] ?? '',
      within: {
        fraction: 0.13,
        because: 'the page states no emissivity; its large pipes lie 5 to 12 % below the handbook',
      },
    })),
  )
  published(lossWPerM, rows)
})

describe('what an inch of insulation saves', () => {
  // The handbook says no more than that: indoors, a pipe with steam of 175 °C, 25 mm of insulation.
  const ratio = (outerDiameterM: number): number => {
    const bare: Line = { outerDiameterM, steamC: 175, airC: 25, emissivity: 0.8 }
    const lagged = solve({
      ...plainFilm,
      shape: lying(outerDiameterM),
      layers: [constant(0.025, 0.05)],
      mediumC: bare.steamC,
      around: still(bare.airC),
    })
    return lossWPerM(bare) / (lagged.heatLossWPerM ?? Number.NaN)
  }
  published(
    ratio,
    [0.0603, 0.1143, 0.1683].map((given) => ({
      from: 'ASHRAE Handbook Fundamentals 2021, ch. 23, section 3, bare to 25 mm of insulation',
      given,
      printed: '8',
      within: { absolute: 1, because: 'a round figure, without pipe and conductivity (here 0.05)' },
    })),
  )
})
