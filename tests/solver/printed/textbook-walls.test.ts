/** Walls and pipes of worked examples with given films, each figure read in the text. */
import { describe } from 'vitest'
import { soilResistanceMKPerW } from '#solver/ground.ts'
import { radiationWPerM2K } from '#solver/radiation.ts'
import type { Shape } from '#solver/types.ts'
import { published } from '../../published.ts'
import { lying } from '../systems.ts'
import { border, type Example, perM, row, worked } from './walls.ts'

const flat: Shape = { kind: 'flat', facing: 'vertical', characteristicLengthM: 1 }
const FOOT_M = 0.3048
const BTU_PER_H_W = 0.29307107
/** Btu/(h·ft·°F) in W/(m·K). */
const BTU_PER_H_FT_F = BTU_PER_H_W / FOOT_M / (5 / 9)
const fahrenheit = (tempF: number): number => (tempF - 32) / 1.8

describe('a handbook of a government for operators of plants', () => {
  const handbook = 'US Department of Energy, Fundamentals Handbook, Heat Transfer, HT-02'
  const pipe: Example = {
    shape: lying(2 * 0.46 * FOOT_M),
    layers: [[0.08 * FOOT_M, 108 * BTU_PER_H_FT_F]],
    insideC: fahrenheit(122),
    outsideC: fahrenheit(118),
  }
  published(
    (given: Example) => (perM(given) * 35 * FOOT_M) / BTU_PER_H_W,
    [row(`${handbook} p. 13, 35 ft of pipe [Btu/h]`, pipe, '5.92e5')],
  )

  const inch = FOOT_M / 12
  const wall: Example = {
    shape: flat,
    layers: [
      [inch, 240 * BTU_PER_H_FT_F],
      [inch / 8, 0.048 * BTU_PER_H_FT_F],
      [2 * inch, 0.022 * BTU_PER_H_FT_F],
    ],
    insideC: fahrenheit(500),
    outsideC: fahrenheit(0),
  }
  /** Temperature over a layer by the flux, in h·ft²·°F/Btu. */
  const resistance = (j: number) => (given: Example) => {
    const { heatFluxWPerM2, interfaceTempsC } = worked(given)
    const dropK = (interfaceTempsC[j] ?? Number.NaN) - (interfaceTempsC[j + 1] ?? Number.NaN)
    return (dropK / heatFluxWPerM2) * (BTU_PER_H_W / FOOT_M ** 2 / (5 / 9))
  }
  published(resistance(0), [row(`${handbook} p. 10, copper of 1 in`, wall, '0.000347')])
  published(resistance(1), [row(`${handbook} p. 10, asbestos of 1/8 in`, wall, '0.2170')])
  published(resistance(2), [row(`${handbook} p. 10, glass fibre of 2 in`, wall, '7.5758')])
})

const cengel = 'Çengel, Heat and Mass Transfer, 5th edition, example'

describe('examples of a textbook', () => {
  const steamPipe: Example = {
    shape: lying(0.05),
    layers: [
      [0.0025, 80],
      [0.03, 0.05],
    ],
    insideFilmWPerM2K: 60,
    outsideFilmWPerM2K: 18,
    insideC: 320,
    outsideC: 5,
  }
  published(perM, [row(`${cengel} 3-8, insulated steam pipe`, steamPipe, '121')])
  published(
    (given: Example) => border(1)(given) - border(2)(given),
    [
      row(`${cengel} 3-8, across the insulation [K]`, steamPipe, '284', {
        absolute: 1,
        because: 'the book multiplies its rounded heat flow and resistance',
      }),
    ],
  )

  const bareSteel: Example = {
    shape: lying(0.12),
    layers: [[0.02, 20]],
    insideC: 150,
    outsideC: 60,
  }
  published(
    (given: Example) => (perM(given) * 20) / 1000,
    [row(`${cengel} 2-15, 20 m of steam pipe [kW]`, bareSteel, '786')],
  )

  const icedWater: Example = {
    shape: { kind: 'sphere', outerDiameterM: 3 },
    layers: [[0.02, 15]],
    insideFilmWPerM2K: 80,
    outsideFilmWPerM2K: 10 + 5.34,
    insideC: 0,
    outsideC: 22,
  }
  published(
    (given: Example) => Math.abs(worked(given).heatFluxWPerM2) * Math.PI * 3.04 ** 2,
    [
      row(`${cengel} 3-7, sphere of iced water`, icedWater, '8029', {
        absolute: 20,
        because: 'the book rounds its resistance to 0.00274 K/W',
      }),
    ],
  )
  published(
    ({ surfaceK, roomK }: { surfaceK: number; roomK: number }) =>
      radiationWPerM2K(1, surfaceK - 273.15, roomK - 273.15),
    [
      {
        from: `${cengel} 3-7, radiation coefficient`,
        given: { surfaceK: 278, roomK: 295 },
        printed: '5.34',
      },
    ],
  )

  /** Temperature of a wire that gives off 80 W over 5 m, under a cover of a thickness [mm]. */
  const wireC = (coverMm: number): number =>
    30 +
    (80 / 5) *
      (1 /
        perM({
          shape: lying(0.003),
          layers: [[coverMm / 1000, 0.15]],
          outsideFilmWPerM2K: 12,
          insideC: 31,
          outsideC: 30,
        }))
  published(wireC, [
    { from: `${cengel} 3-9, wire under its cover`, given: 2, printed: '105' },
    { from: `${cengel} 3-9, cover twice as thick`, given: 4, printed: '90.6' },
    { from: `${cengel} 3-9, cover to the critical radius`, given: 11, printed: '83' },
  ])

  published(
    (given: Parameters<typeof soilResistanceMKPerW>[0]) =>
      (30 * (80 - 10)) / (soilResistanceMKPerW(given) ?? Number.NaN),
    [
      {
        from: `${cengel} 3-15, buried hot-water pipe`,
        given: { depthM: 0.5, outerDiameterM: 0.1, soilWPerMK: 0.9 },
        printed: '3963',
        within: { fraction: 0.0015, because: 'the book takes ln(4H/D) and rounds it to 62.9 m' },
      },
    ],
  )
})
