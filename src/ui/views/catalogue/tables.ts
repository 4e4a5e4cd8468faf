/** The catalogue as tables of words: one line per row, with where it comes from. */
import type { Catalogue } from '#catalogue/types.ts'
import { wordsFor } from '#ui/state/cell-text.ts'
import { formatNumber, formatQuantity, unitLabel } from '#units/format.ts'
import type { QuantityName, UnitSystem } from '#units/quantities.ts'
import { type CatalogueTable, table } from './catalogue-table.ts'
import { codesTables } from './codes-table.ts'
import { fittingsTables } from './fittings-tables.ts'

export function tablesOf(catalogue: Catalogue, units: UnitSystem): readonly CatalogueTable[] {
  const shown = (value: number | null, quantity: QuantityName, decimals?: number) =>
    formatQuantity(value, quantity, units, decimals)
  const unit = (quantity: QuantityName) => unitLabel(quantity, units)
  const temperature = unit('temperature')
  const size = unit('size')

  return [
    table(
      'Materials',
      'Conductivity at mean temperatures, and the service range that is never exceeded.',
      [
        ['Material'],
        ['Family'],
        [`Conductivity, ${unit('conductivity')} at ${temperature}`],
        [`Service ${temperature}`, true],
        ['Density kg/m³', true],
        ['µ', true],
      ],
      // The confidence of the curve is what a thickness stands on.
      catalogue.materials.map((row) => ({
        ...row,
        confidence: row.curveConfidence,
        source: row.curveSource || row.source,
      })),
      (row) => ({
        id: row.id,
        cells: [
          row.name,
          row.family,
          row.conductivity.pointsC
            .map(
              (pointC, at) =>
                `${shown(row.conductivity.valuesWPerMK[at] ?? null, 'conductivity', units === 'si' ? 3 : 2)} at ${shown(pointC, 'temperature', 0)}`,
            )
            .join(', '),
          `${shown(row.serviceMinC, 'temperature', 0)} to ${shown(row.serviceMaxC, 'temperature', 0)}`,
          formatNumber(row.densityKgPerM3, 0),
          row.vapourResistance === null ? '–' : formatNumber(row.vapourResistance, 0),
        ],
        note: row.note,
      }),
    ),
    table(
      'Finishes',
      'New emissivity judges touch and damp, aged emissivity loss and money.',
      [
        ['Finish'],
        ['Kind'],
        ['Emissivity, new', true],
        ['Emissivity, aged', true],
        ['Touch class'],
        [`At most ${temperature}`, true],
        ['Outdoors'],
        ['Sun taken up, aged', true],
        ['Keeps vapour out'],
      ],
      catalogue.finishes,
      (row) => ({
        id: row.id,
        cells: [
          row.name,
          row.category,
          formatNumber(row.emissivityNew, 2),
          formatNumber(row.emissivityAged, 2),
          wordsFor(row.touchClass),
          shown(row.surfaceMaxC, 'temperature', 0),
          row.outdoor ? 'yes' : 'no',
          formatNumber(row.solarAbsorptanceAged, 2),
          row.vapourNote || '–',
        ],
        note: row.note,
      }),
    ),
    table(
      'Pipe sizes',
      'Outside diameter and wall, as the run takes them from its size.',
      [['Size'], ['Standard'], ['Series'], [`Outside ${size}`, true], [`Wall ${size}`, true]],
      catalogue.pipeSizes,
      (row) => ({
        id: `${row.system} ${row.label} ${row.series}`,
        cells: [
          row.label,
          row.standard,
          row.series,
          shown(row.outerDiameterM, 'size'),
          shown(row.wallM, 'size', units === 'si' ? 2 : 3),
        ],
      }),
    ),
    table(
      'Duct sizes',
      'Sizes that are usually made; any other can be typed.',
      [['Size'], ['Standard'], [`Width or diameter ${size}`, true], [`Height ${size}`, true]],
      catalogue.ductSizes,
      (row) => ({
        id: `${row.standard} ${row.label}`,
        cells: [
          row.label,
          row.standard,
          shown(row.diameterM ?? row.widthM, 'size', units === 'si' ? 0 : 2),
          shown(row.heightM, 'size', units === 'si' ? 0 : 2),
        ],
      }),
    ),
    ...codesTables(catalogue.codeTables, units),
    ...fittingsTables(catalogue, units),
    table(
      'Fuels',
      'Price, efficiency and CO₂ belong to the same calorific basis. Prices are illustrative.',
      [['Fuel'], ['Basis'], ['Price per kWh', true], ['Efficiency', true], ['CO₂ kg/kWh', true]],
      catalogue.fuels,
      (row) => ({
        id: row.id,
        cells: [
          row.name,
          row.basis,
          formatNumber(row.pricePerKWh, 3),
          formatNumber(row.efficiency, 2),
          formatNumber(row.co2KgPerKWh, 3),
        ],
        note: row.note,
      }),
    ),
    table(
      'Burn thresholds',
      'Lower curve of ISO 13732-1 by surface and contact time. Cells of grade L never pass a surface.',
      [
        ['Surface'],
        ['Contact s', true],
        [`Burns from ${temperature}`, true],
        [`Surely from ${temperature}`, true],
        ['Grade'],
      ],
      catalogue.burnThresholds,
      (row) => ({
        id: `${row.surface} ${row.contactS}`,
        cells: [
          surfaceWords(row.surface),
          formatNumber(row.contactS, row.contactS < 10 ? 1 : 0),
          shown(row.lowerC, 'temperature'),
          shown(row.upperC, 'temperature'),
          row.grade,
        ],
      }),
    ),
    table(
      'Prices',
      'Installed, without tax. All of them illustrate until your own are in.',
      [
        ['For'],
        ['per m³', true],
        ['per m²', true],
        ['per m', true],
        ['Hours per m', true],
        ['Hours per m²', true],
        ['Waste %', true],
      ],
      [
        ...catalogue.priceModels.map((row) => ({
          ...row,
          name: nameIn(catalogue.materials, row.materialId),
        })),
        ...catalogue.finishPrices.map((row) => ({
          ...row,
          name: nameIn(catalogue.finishes, row.finishId),
          perM3: null,
          perM: null,
        })),
      ],
      (row) => ({
        id: row.name,
        cells: [
          row.name,
          formatNumber(row.perM3, 0),
          formatNumber(row.perM2, 2),
          formatNumber(row.perM, 2),
          formatNumber(row.labourHoursPerM, 2),
          formatNumber(row.labourHoursPerM2, 2),
          formatNumber(row.wasteFraction * 100, 0),
        ],
      }),
    ),
  ]
}

/** `lacquer-50` is a lacquer of 50 µm on metal. */
function surfaceWords(surface: string): string {
  const [, coating, micrometres] = /^(.+)-(\d+)$/.exec(surface) ?? []
  return coating ? `metal with ${coating}, ${micrometres} µm` : wordsFor(surface)
}

function nameIn(
  list: readonly { readonly id: string; readonly name: string }[],
  id: string,
): string {
  return list.find((row) => row.id === id)?.name ?? id
}
