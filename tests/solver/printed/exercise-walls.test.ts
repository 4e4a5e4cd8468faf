/** Lagged pipes and radiation as a public library checks them, and as exercises print their answers. */
import { describe } from 'vitest'
import { soilResistanceMKPerW } from '#solver/ground.ts'
import { radiationWPerM2K } from '#solver/radiation.ts'
import { published } from '../../published.ts'
import { lying } from '../systems.ts'
import { border, type Example, perM, row, worked } from './walls.ts'

describe('a public heat-transfer library', () => {
  const library = 'check value of a public heat-transfer library'
  const pipe: Example = {
    shape: lying(0.0779272),
    layers: [
      [0.0054864, 56.045],
      [0.05, 0.0598535265],
    ],
    insideFilmWPerM2K: 1e12,
    outsideFilmWPerM2K: 22.697193,
    insideC: 180,
    outsideC: 28,
  }
  published(perM, [row(`${library}, lagged pipe, heat loss`, pipe, '73.1200088')])
  published(
    (given: Example) => worked(given).heatFluxWPerM2,
    [row(`${library}, lagged pipe, flux`, pipe, '123.2123965')],
  )
  published(
    (given: Example) => border(1)(given) + 273.15,
    [row(`${library}, lagged pipe, under the lagging [K]`, pipe, '453.1226456')],
  )
  published(
    (given: Example) => border(2)(given) + 273.15,
    [row(`${library}, lagged pipe, surface [K]`, pipe, '306.5785301')],
  )
  published(
    ({
      depthM,
      outerDiameterM,
      lengthM,
    }: Record<'depthM' | 'outerDiameterM' | 'lengthM', number>) =>
      lengthM / (soilResistanceMKPerW({ depthM, outerDiameterM, soilWPerMK: 1 }) ?? Number.NaN),
    [
      {
        from: `${library}, shape factor of a buried pipe`,
        given: { depthM: 100, outerDiameterM: 1, lengthM: 3 },
        printed: '3.146071454894645',
      },
    ],
  )
  published(
    ({ emissivity, surfaceK, roomK }: Record<'emissivity' | 'surfaceK' | 'roomK', number>) =>
      radiationWPerM2K(emissivity, surfaceK - 273.15, roomK - 273.15) * (surfaceK - roomK),
    [
      [{ emissivity: 1, surfaceK: 400, roomK: 0 }, '1451.613952'] as const,
      [{ emissivity: 0.85, surfaceK: 400, roomK: 305 }, '816.7821722650002'] as const,
    ].map(([given, printed]) => ({
      from: `${library}, flux of radiation`,
      given,
      printed,
      within: { fraction: 3e-6, because: 'the library has the constant of CODATA 2014' },
    })),
  )
})

describe('exercises of universities with their answers', () => {
  const copper: Example = {
    shape: lying(0.1),
    layers: [[0.01, 400]],
    outsideFilmWPerM2K: 15,
    insideC: 110,
    outsideC: 30,
  }
  const lagged: Example = { ...copper, layers: [...copper.layers, [0.05, 0.2]] }
  const plastic: Example = {
    shape: lying(0.03),
    layers: [[0.005, 0.5]],
    insideFilmWPerM2K: 300,
    outsideFilmWPerM2K: 10,
    insideC: 200,
    outsideC: 30,
  }
  const foamed: Example = {
    shape: lying(0.1),
    layers: [
      [0.003, 17],
      [0.05, 0.033],
    ],
    insideFilmWPerM2K: 4500,
    outsideFilmWPerM2K: 10,
    insideC: 130,
    outsideC: -5,
  }
  const steamLine: Example = {
    shape: lying(0.05),
    layers: [
      [0.005, 43],
      [0.012, 0.11],
    ],
    insideFilmWPerM2K: 500,
    outsideFilmWPerM2K: 17,
    insideC: 150,
    outsideC: 16,
  }
  published(perM, [
    row('university exercise sheet on cylinders, bare copper pipe', copper, '452'),
    row('university exercise sheet on cylinders, the same lagged', lagged, '138'),
    row('university exercise sheet on cylinders, plastic pipe', plastic, '184', {
      absolute: 1,
      because: 'the sheet goes on with its coefficient of three digits',
    }),
    row('university exercise of Finland, foamed steel pipe', foamed, '40.2'),
  ])
  published(
    (given: Example) => worked(given).heatFluxWPerM2 / (given.insideC - given.outsideC),
    [row('university exercise sheet on cylinders, U of the plastic pipe', plastic, '8.62')],
  )
  published(
    (given: Example) => perM(given) * 6,
    [
      row('university exercise on a steam line, 6 m', steamLine, '1.113e3', {
        absolute: 2,
        because: 'the exercise goes on with its resistance of 0.1204 K/W',
      }),
    ],
  )
})
