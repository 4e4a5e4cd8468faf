/** Properties of dry air beside tables of other hands, at 1 atm unless said otherwise. */
import { describe } from 'vitest'
import {
  airAt,
  airDensityKgPerM3,
  airHeatCapacityJPerKgK,
  airViscosityPaS,
} from '#solver/properties/air.ts'
import { type PublishedRow, published, type Within } from '../../published.ts'

const ATMOSPHERE_PA = 101325
const viscosity = (tempC: number): number => airViscosityPaS(tempC + 273.15)
const heatCapacity = (tempC: number): number => airHeatCapacityJPerKgK(tempC + 273.15)
const density = (tempC: number): number => airDensityKgPerM3(tempC, ATMOSPHERE_PA)
const at = (tempC: number, pressurePa = ATMOSPHERE_PA) => airAt(tempC, pressurePa)

const rows = (
  from: string,
  within: Within | undefined,
  cells: readonly (readonly [tempC: number, printed: string])[],
): PublishedRow<number>[] =>
  cells.map(([given, printed]) => ({ from, given, printed, ...(within ? { within } : {}) }))

describe('a textbook', () => {
  const from = 'Çengel, Heat and Mass Transfer, table A-15'
  describe('density', () => {
    published(
      density,
      rows(from, { fraction: 6e-4, because: 'four digits of another gas constant' }, [
        [-20, '1.394'],
        [0, '1.292'],
        [20, '1.204'],
        [60, '1.059'],
        [100, '0.9458'],
      ]),
    )
  })
  describe('heat capacity', () => {
    published(
      heatCapacity,
      rows(from, { fraction: 0.0025, because: 'the polynomial is good to 0.2 % of tables' }, [
        [-20, '1005'],
        [0, '1006'],
        [20, '1007'],
        [60, '1007'],
        [100, '1009'],
      ]),
    )
  })
  describe('dynamic viscosity', () => {
    published(
      viscosity,
      rows(from, { fraction: 0.01, because: 'Lemmon and Jacobsen state 1 % for theirs' }, [
        [-20, '1.630e-5'],
        [0, '1.729e-5'],
        [20, '1.825e-5'],
        [60, '2.008e-5'],
        [100, '2.181e-5'],
        [140, '2.345e-5'],
      ]),
    )
  })
  describe('kinematic viscosity', () => {
    published(
      (tempC: number) => at(tempC).kinematicViscosityM2PerS,
      rows(from, { fraction: 0.01, because: 'Lemmon and Jacobsen state 1 % for theirs' }, [
        [-20, '1.169e-5'],
        [20, '1.516e-5'],
        [60, '1.896e-5'],
        [100, '2.306e-5'],
        [140, '2.745e-5'],
      ]),
    )
  })
  describe('conductivity', () => {
    published(
      (tempC: number) => at(tempC).conductivityWPerMK,
      rows(
        from,
        { fraction: 0.031, because: 'the book lies 2 to 3 % below the other tables of this file' },
        [
          [-20, '0.02211'],
          [0, '0.02364'],
          [20, '0.02514'],
          [60, '0.02808'],
          [100, '0.03095'],
          [140, '0.03374'],
        ],
      ),
    )
  })
})

describe('an older textbook, in a free textbook of food processing', () => {
  const from = 'Fishenden and Saunders, properties of air, in Unit Operations in Food Processing'
  describe('dynamic viscosity', () => {
    published(
      viscosity,
      rows(from, { fraction: 0.015, because: 'measurements of before 1950' }, [
        [-18, '1.65e-5'],
        [0, '1.73e-5'],
        [38, '1.91e-5'],
        [93, '2.15e-5'],
        [149, '2.40e-5'],
        [204, '2.60e-5'],
      ]),
    )
  })
  describe('conductivity', () => {
    // From 149 °C on the old table lies 5 % below newer ones.
    published(
      (tempC: number) => at(tempC).conductivityWPerMK,
      rows(from, { fraction: 0.02, because: 'measurements of before 1950' }, [
        [-18, '0.0230'],
        [0, '0.0242'],
        [38, '0.0267'],
        [93, '0.031'],
      ]),
    )
  })
  describe('heat capacity', () => {
    published(
      heatCapacity,
      rows(from, { fraction: 0.005, because: 'measurements of before 1950' }, [
        [-18, '1.00e3'],
        [0, '1.005e3'],
        [38, '1.005e3'],
        [93, '1.009e3'],
        [149, '1.017e3'],
        [204, '1.026e3'],
      ]),
    )
  })
  describe('density', () => {
    published(
      density,
      rows(from, undefined, [
        [-18, '1.38'],
        [0, '1.29'],
        [93, '0.96'],
        [204, '0.74'],
      ]),
    )
  })
})

describe('a data handbook, at 300 K', () => {
  const from = "Mechanical Engineer's Data Handbook, 3.4.3, air at 300 K"
  const oneKelvinOff = { fraction: 0.01, because: 'another correlation' }
  published(viscosity, rows(from, oneKelvinOff, [[26.85, '1.853e-5']]))
  published(heatCapacity, rows(from, oneKelvinOff, [[26.85, '1005']]))
  published(
    (tempC: number) => at(tempC).conductivityWPerMK,
    rows(from, oneKelvinOff, [[26.85, '0.02614']]),
  )
  published((tempC: number) => at(tempC).prandtl, rows(from, oneKelvinOff, [[26.85, '0.711']]))
})

describe('measurements of gaseous air at 1 bar', () => {
  published(
    (tempC: number) => at(tempC, 1e5).conductivityWPerMK,
    rows(
      'Carroll, Lo and Stiel 1968, conductivity of gaseous air, in a manual of cables',
      { fraction: 0.01, because: 'Lemmon and Jacobsen state 2 % for theirs' },
      [
        [0, '0.024545'],
        [15, '0.025681'],
        [25, '0.026426'],
        [50, '0.028245'],
        [75, '0.030001'],
        [100, '0.031695'],
      ],
    ),
  )
})

describe('an engineering handbook of the web, at 0 °C and 1 bar', () => {
  const from = 'Book of Engineering, ME12, properties of air at 0 °C'
  const within = { fraction: 0.0015, because: 'printed with four digits from another correlation' }
  published(viscosity, rows(from, within, [[0, '17.22e-6']]))
  published(
    (tempC: number) => at(tempC, 1e5).kinematicViscosityM2PerS,
    rows(from, within, [[0, '13.49e-6']]),
  )
  published(
    (tempC: number) => at(tempC, 1e5).conductivityWPerMK,
    rows(from, within, [[0, '24.35e-3']]),
  )
  published((tempC: number) => airDensityKgPerM3(tempC, 1e5), rows(from, within, [[0, '1.276']]))
})
