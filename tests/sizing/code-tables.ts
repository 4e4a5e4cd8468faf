/** Code tables that do not ship, as a user would own them: test data with their sources. */

import type { CodeRow, CodeTable } from '#catalogue/types.ts'
import { indexCatalogue } from '#model/resolve/index-catalogue.ts'
import { catalogue } from './catalogue.ts'

const plainRow: Omit<CodeRow, 'quantity' | 'value' | 'source' | 'confidence'> = {
  sizeMinM: null,
  sizeMaxM: null,
  fluidMinC: null,
  fluidMaxC: null,
  conductivityMinWPerMK: null,
  conductivityMaxWPerMK: null,
  ratingMeanC: null,
  rule: null,
  conditions: null,
  note: '',
}
const plainTable = {
  sizeBorder: 'band-below',
  fluidBorder: 'band-below',
  note: '',
  warning: 'verify against your own edition',
  factors: [],
} as const

const bsSource = 'BS 5422:2023 table 20A, as quoted in an open-source hot-water model'

/** Outside diameter up to [mm], loss at most [W/m], thickness that the table guides to at 0.035 W/mK [mm]. */
export const bs5422: readonly (readonly [odMm: number, lossWPerM: string, guideMm: string])[] = [
  [8, '7.06', '9'],
  [10, '7.23', '11'],
  [12, '7.35', '14'],
  [15, '7.89', '15'],
  [22, '9.12', '18'],
  [28, '10.07', '20'],
  [35, '11.08', '22'],
  [42, '12.19', '23'],
  [54, '14.12', '24'],
]
/** Horizontal pipe at 60 °C in still air at 15 °C, emissivity 0.90. */
export const bsLoss: CodeTable = {
  ...plainTable,
  id: 'bs-5422-2023-domestic',
  name: 'BS 5422',
  edition: '2023, domestic base level',
  service: 'domestic heating and hot water',
  sizeBasis: 'outer-diameter',
  conversion: 'none',
  source: bsSource,
  confidence: 'found',
  rows: bs5422.map(([odMm, lossWPerM], n) => ({
    ...plainRow,
    sizeMinM: (bs5422[n - 1]?.[0] ?? 0) / 1000,
    sizeMaxM: odMm / 1000,
    quantity: 'max-loss',
    value: Number(lossWPerM),
    conditions: { mediumC: 60, airC: 15, windMPerS: 0, emissivity: 0.9 },
    source: bsSource,
    confidence: 'found',
  })),
}

const mukenSource = 'MuKEn 2014, from memory'
/** Nominal size from and to [mm]; thickness above 0.03 up to 0.05 W/mK, and up to 0.03 W/mK [mm]. */
export const muken: readonly (readonly [from: number, to: number, above: number, upTo: number])[] =
  [
    [10, 15, 40, 30],
    [20, 32, 50, 40],
    [40, 50, 60, 50],
    [65, 80, 80, 60],
    [100, 150, 100, 80],
    [175, 200, 120, 80],
  ]
export const mukenTable: CodeTable = {
  ...plainTable,
  id: 'muken-2014',
  name: 'MuKEn',
  edition: '2014',
  service: 'hot water and heating pipes up to 90 °C',
  sizeBasis: 'nominal',
  conversion: 'none',
  source: mukenSource,
  confidence: 'memory',
  rows: muken.flatMap(([from, to, above, upTo]) =>
    (
      [
        [0.03, 0.05, above],
        [0.001, 0.03, upTo],
      ] as const
    ).map(([min, max, thicknessMm]) => ({
      ...plainRow,
      sizeMinM: from / 1000,
      sizeMaxM: to / 1000,
      fluidMinC: 30,
      fluidMaxC: 90,
      conductivityMinWPerMK: min,
      conductivityMaxWPerMK: max,
      ratingMeanC: 40,
      quantity: 'min-thickness' as const,
      value: thicknessMm / 1000,
      source: mukenSource,
      confidence: 'memory' as const,
    })),
  ),
}

/** A gain: cooled services, 10 °C in 25 °C. */
const gainSource = 'BS 5422:2009 by way of a compliance guide, from memory'
export const bsGain: CodeTable = {
  ...bsLoss,
  id: 'bs-5422-2009-cooled',
  edition: '2009, cooled services',
  confidence: 'memory',
  source: gainSource,
  rows: [
    {
      ...plainRow,
      sizeMinM: 0.0603,
      sizeMaxM: 0.0603,
      quantity: 'max-loss',
      value: 4.78,
      conditions: { mediumC: 10, airC: 25, windMPerS: 0, emissivity: null },
      source: gainSource,
      confidence: 'memory',
    },
  ],
}

export const ownIndex = indexCatalogue({
  ...catalogue,
  codeTables: [...catalogue.codeTables, bsLoss, bsGain, mukenTable],
})
