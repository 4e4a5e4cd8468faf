/** Finds a code table by its id, and in it the rows for a pipe and its medium. */
import { figureText } from './figure.ts'
import { findNamed, type Lookup } from './lookup.ts'
import type { BandBorder, Catalogue, CodeRow, CodeTable } from './types.ts'

/** By id; titles are shared by several tables. */
export function findCodeTable({ codeTables }: Catalogue, text: string): Lookup<CodeTable> {
  const named = codeTables.map((table) => ({ id: table.id, name: table.id, table }))
  const lookup = findNamed(named, 'the id of a code table of the catalogue', text)
  return lookup.ok ? { ...lookup, item: lookup.item.table } : lookup
}

/** The run as the bands of a table count it: null what it does not have. */
export interface CodeCase {
  readonly nominalM: number | null
  readonly outerDiameterM: number | null
  readonly innerDiameterM: number | null
  readonly fluidC: number
}

export type CodeRows =
  | { readonly ok: true; readonly rows: readonly CodeRow[] }
  /** A whole sentence. */
  | { readonly ok: false; readonly reason: string }

/** All rows of the band: several where a table lists conductivities to interpolate between. */
export function codeRowsFor(table: CodeTable, run: CodeCase): CodeRows {
  const size = sizeOf(table, run)
  if (!size.ok) return size
  const bySize = inBand(table.rows, size.sizeM, table.sizeBorder, sizeBand)
  if (bySize.length === 0)
    return {
      ok: false,
      reason: `${table.id} asks for nothing at ${mm(size.sizeM ?? 0)} mm: it covers ${covered(table.rows.map(sizeBand), mm, 'mm')}.`,
    }
  const rows = inBand(bySize, run.fluidC, table.fluidBorder, fluidBand)
  if (rows.length === 0)
    return {
      ok: false,
      reason: `${table.id} asks for nothing at a medium of ${figureText(run.fluidC)} °C: it covers ${covered(bySize.map(fluidBand), figureText, '°C')}.`,
    }
  return { ok: true, rows }
}

/**
 * Nominal size [m] of a pipe of which only the outside diameter is known: that of the smallest steel pipe with a DN
 * that is not thinner, so that tube comes into the band of the pipe that takes its place. Beyond the largest, the
 * diameter itself.
 */
export function nominalSizeM({ pipeSizes }: Catalogue, outerDiameterM: number): number {
  let best: { readonly dn: number; readonly outerDiameterM: number } | null = null
  for (const { standard, dn, outerDiameterM: candidateM } of pipeSizes) {
    if (dn === null || !(standard.startsWith('EN 10220') || standard === 'ASME B36.10M')) continue
    if (micrometres(candidateM) < micrometres(outerDiameterM)) continue
    if (best === null || candidateM < best.outerDiameterM) best = { dn, outerDiameterM: candidateM }
  }
  return best === null ? outerDiameterM : best.dn / 1000
}

interface Band {
  readonly min: number | null
  readonly max: number | null
}

const sizeBand = ({ sizeMinM, sizeMaxM }: CodeRow): Band => ({ min: sizeMinM, max: sizeMaxM })
const fluidBand = ({ fluidMinC, fluidMaxC }: CodeRow): Band => ({ min: fluidMinC, max: fluidMaxC })

type Size =
  /** Null where the table counts no size. */
  | { readonly ok: true; readonly sizeM: number | null }
  | { readonly ok: false; readonly reason: string }

function sizeOf({ id, sizeBasis }: CodeTable, run: CodeCase): Size {
  if (sizeBasis === 'any') return { ok: true, sizeM: null }
  const { sizeM, measure } = {
    nominal: { sizeM: run.nominalM, measure: 'nominal sizes' },
    'outer-diameter': { sizeM: run.outerDiameterM, measure: 'outside diameters' },
    'inner-diameter': { sizeM: run.innerDiameterM, measure: 'inner diameters' },
  }[sizeBasis]
  if (sizeM !== null) return { ok: true, sizeM }
  const reason = `${id} goes by ${measure} of pipes, and this run has none: give a size such as DN 50, NPS 2 or CU 28, or take another table.`
  return { ok: false, reason }
}

/** Rows whose band holds the value; on a border only those on the side that the table says. */
function inBand(
  rows: readonly CodeRow[],
  value: number | null,
  border: BandBorder,
  bandOf: (row: CodeRow) => Band,
): readonly CodeRow[] {
  if (value === null) return rows
  const at = micrometres(value)
  const ends = rows.map(bandOf)
  const opens = ends.some(({ min }) => min !== null && micrometres(min) === at)
  const closes = ends.some(({ max }) => max !== null && micrometres(max) === at)
  const isBorder = opens && closes
  return rows.filter((row) => {
    const { min, max } = bandOf(row)
    const low = min === null ? Number.NEGATIVE_INFINITY : micrometres(min)
    const high = max === null ? Number.POSITIVE_INFINITY : micrometres(max)
    if (at < low || at > high) return false
    if (!isBorder || low === high) return true
    return border === 'band-above' ? at !== high : at !== low
  })
}

/** Whole millionths of a metre or kelvin: a bore from subtraction must meet the border it stands for. */
const micrometres = (value: number): number => Math.round(value * 1e6)

const mm = (valueM: number): string => figureText(valueM * 1000)

function covered(bands: readonly Band[], text: (value: number) => string, unit: string): string {
  const lows = bands.map(({ min }) => min ?? Number.NEGATIVE_INFINITY)
  const highs = bands.map(({ max }) => max ?? Number.POSITIVE_INFINITY)
  const [low, high] = [Math.min(...lows), Math.max(...highs)]
  if (low === Number.NEGATIVE_INFINITY) return `${text(high)} ${unit} and less`
  if (high === Number.POSITIVE_INFINITY) return `${text(low)} ${unit} and more`
  return `${text(low)} to ${text(high)} ${unit}`
}
