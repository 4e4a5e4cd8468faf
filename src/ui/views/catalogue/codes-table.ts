/** The code tables in words: what each is for, and one line for each of its bands. */
import type { BandBorder, CodeRow, CodeTable } from '#catalogue/types.ts'
import { formatNumber, formatQuantity, formatWithUnit, unitLabel } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'
import { type CatalogueTable, table } from './catalogue-table.ts'

interface Band {
  readonly min: number | null
  readonly max: number | null
}

export function codesTables(
  codes: readonly CodeTable[],
  units: UnitSystem,
): readonly CatalogueTable[] {
  const temperature = (value: number) => formatQuantity(value, 'temperature', units, 0)
  const size = (value: number) => formatQuantity(value, 'size', units, units === 'si' ? 0 : 2)
  return [
    table(
      'Codes',
      'A run selects one by its id; a factor for its case goes into the code factor. Every figure is to be verified against your own edition.',
      [['Id'], ['Code'], ['Edition'], ['For'], ['Factors']],
      codes,
      (code) => ({
        id: code.id,
        cells: [code.id, code.name, code.edition, code.service, factorWords(code)],
        note: `${code.note} ${code.warning.charAt(0).toUpperCase()}${code.warning.slice(1)}.`.trim(),
      }),
    ),
    table(
      'Code figures',
      'What each code asks for, by the size of the pipe and the temperature of the medium.',
      [
        ['Id'],
        [`Pipe ${unitLabel('size', units)}`],
        [`Medium ${unitLabel('temperature', units)}`],
        [`Conductivity ${unitLabel('conductivity', units)}`],
        ['Asks for'],
      ],
      codes.flatMap((code) => code.rows.map((row, index) => ({ ...row, code, index }))),
      ({ code, index, ...row }) => ({
        id: `${code.id} ${index}`,
        cells: [
          code.id,
          code.sizeBasis === 'any'
            ? 'any'
            : `${sizeWords[code.sizeBasis]} ${bandWords(sizeOf(row), code.rows.map(sizeOf), code.sizeBorder, size)}`,
          bandWords(fluidOf(row), code.rows.map(fluidOf), code.fluidBorder, temperature),
          conductivityWords(row, units),
          asked(row, units),
        ],
        note: row.note,
      }),
    ),
  ]
}

const sizeWords = { nominal: 'nominal', 'outer-diameter': 'outside', 'inner-diameter': 'inside' }
const sizeOf = ({ sizeMinM, sizeMaxM }: CodeRow): Band => ({ min: sizeMinM, max: sizeMaxM })
const fluidOf = ({ fluidMinC, fluidMaxC }: CodeRow): Band => ({ min: fluidMinC, max: fluidMaxC })

function factorWords({ factors }: CodeTable): string {
  const cases = factors.map(({ factor, appliesTo }) => `${factor} for ${appliesTo}`)
  return cases.length > 0 ? cases.join('; ') : '–'
}

/** `above 22 to 35`, `25 to below 40`: a border belongs to one band only, the outermost ends to the table. */
function bandWords(
  { min, max }: Band,
  bands: readonly Band[],
  border: BandBorder,
  text: (value: number) => string,
): string {
  const isLowOpen = border === 'band-below' && bands.some((band) => band.max === min)
  const isHighOpen = border === 'band-above' && bands.some((band) => band.min === max)
  if (min === null && max === null) return 'any'
  if (min === null) return `${isHighOpen ? 'below' : 'up to'} ${text(max ?? 0)}`
  if (max === null) return `${isLowOpen ? 'above' : 'from'} ${text(min)}`
  return `${isLowOpen ? 'above ' : ''}${text(min)} to ${isHighOpen ? 'below ' : ''}${text(max)}`
}

function conductivityWords(row: CodeRow, units: UnitSystem): string {
  const { conductivityMinWPerMK: low, conductivityMaxWPerMK: high, ratingMeanC } = row
  const number = (value: number | null) =>
    formatQuantity(value, 'conductivity', units, units === 'si' ? 3 : 2)
  const range = low === high ? number(low) : `${number(low)} to ${number(high)}`
  if (ratingMeanC === null) return range
  return `${low === null ? '' : `${range} `}at ${formatWithUnit(ratingMeanC, 'temperature', units, 0)}`
}

function asked({ quantity, value, rule, conditions }: CodeRow, units: UnitSystem): string {
  if (rule === 'inner-diameter') return 'thickness = inner diameter'
  if (quantity === 'min-thickness')
    return `at least ${formatWithUnit(value, 'thickness', units, units === 'si' ? 0 : 1)}`
  if (quantity === 'min-resistance') return `at least ${formatNumber(value, 2)}\u00a0m²K/W`
  const most = `at most ${formatWithUnit(value, 'heatLossPerLength', units)}`
  if (!conditions) return most
  const { mediumC, airC, windMPerS, emissivity } = conditions
  const parts = [
    `medium ${formatWithUnit(mediumC, 'temperature', units, 0)}`,
    `air ${formatWithUnit(airC, 'temperature', units, 0)}`,
    `wind ${formatWithUnit(windMPerS, 'speed', units)}`,
    emissivity === null ? 'emissivity of the finish' : `emissivity ${formatNumber(emissivity, 2)}`,
  ]
  return `${most} with ${parts.join(', ')}`
}
