/** Fittings, supports and media in words. */
import { usualFittings } from '#catalogue/fittings.ts'
import type { Catalogue } from '#catalogue/types.ts'
import { formatNumber, formatQuantity, unitLabel } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'
import { type CatalogueTable, table } from './catalogue-table.ts'

const items = { 'flange-pair': 'Flange pair', valve: 'Valve' } as const
const places = { indoors: 'indoors', outdoors: 'outdoors', any: 'anywhere' } as const

export function fittingsTables(catalogue: Catalogue, units: UnitSystem): readonly CatalogueTable[] {
  const size = (value: number) => formatQuantity(value, 'size', units)
  const metres = (value: number) => formatQuantity(value, 'length', units, 2)
  const temperature = unitLabel('temperature', units)
  return [
    table(
      'Bare fittings',
      'Surface that loses heat as the same area of bare pipe does. Never mixed with metres of insulated pipe.',
      [
        ['Fitting'],
        ['DN', true],
        [`Pipe outside ${unitLabel('size', units)}`, true],
        ['Class', true],
        [`Area ${unitLabel('area', units)}`, true],
      ],
      catalogue.fittingAreas,
      (row) => ({
        id: `${row.item} ${row.pressureClass} ${row.dn}`,
        cells: [
          items[row.item],
          String(row.dn),
          size(row.pipeOuterDiameterM),
          String(row.pressureClass),
          formatQuantity(row.areaM2, 'area', units, units === 'si' ? 4 : 3),
        ],
        note: row.note,
      }),
    ),
    table(
      'Fitting lengths',
      'Metres of the insulated pipe beside it that lose as much as the fitting. The program takes the lagged ones; bare fittings go by their area.',
      [
        ['Fitting'],
        ['State'],
        ['Where'],
        ['DN', true],
        [`Medium ${temperature}`, true],
        [`Length ${unitLabel('length', units)}`, true],
        ['Range', true],
      ],
      catalogue.fittingLengths,
      (row) => ({
        id: `${row.item} ${row.lagged} ${row.place} ${row.dn} ${row.mediumC}`,
        cells: [
          items[row.item],
          row.lagged ? 'lagged' : 'bare',
          places[row.place],
          String(row.dn),
          formatQuantity(row.mediumC, 'temperature', units, 0),
          metres(row.lengthM),
          `${metres(row.lowM)} to ${metres(row.highM)}`,
        ],
        note: row.note,
      }),
    ),
    table(
      'Supports and the rest',
      'What supports add to the loss of the pipe, and how fittings without a table of their own are counted.',
      [['What'], ['Counts as']],
      [
        ...catalogue.supportAllowances.map((row) => ({
          ...row,
          what: `Supports ${places[row.place]}`,
          counts: `${formatNumber(row.lossFraction * 100, 0)} % more loss`,
        })),
        ...usualFittings.map(({ item, countsAs, why, source }) => ({
          what: `${item.charAt(0).toUpperCase()}${item.slice(1)}`,
          counts: countsAs,
          note: why,
          source,
          confidence: 'estimate' as const,
        })),
      ],
      ({ what, counts, note }) => ({ id: what, cells: [what, counts], note }),
    ),
    table(
      'Media',
      'What flows, for arrival and frost. Linear between the states.',
      [
        ['Medium'],
        ['Share by mass %', true],
        [temperature, true],
        ['Density kg/m³', true],
        ['Heat capacity J/kgK', true],
      ],
      catalogue.media,
      (row) => ({
        id: `${row.mediumId} ${row.massFraction} ${row.temperatureC}`,
        cells: [
          row.name,
          row.massFraction === null ? '–' : formatNumber(row.massFraction * 100, 0),
          formatQuantity(row.temperatureC, 'temperature', units),
          formatNumber(row.densityKgPerM3, row.phase === 'liquid' ? 0 : 3),
          formatNumber(row.specificHeatJPerKgK, 0),
        ],
      }),
    ),
  ]
}
