/** Burn thresholds: the lower curve of ISO 13732-1 for a touchable surface and a contact time. */
import type { BurnThreshold, Confidence, TouchClass } from '#catalogue/types.ts'

export interface TouchedSurface {
  readonly touchClass: TouchClass
  /** Kind of coating on metal, e.g. `lacquer`; null for none or unknown. */
  readonly coating: string | null
  /** Null where unknown: then the coating gives no relief. */
  readonly coatingThicknessM: number | null
}

export interface Threshold {
  /** Temperature at which a burn begins to be possible [°C]; a surface passes only below it. */
  readonly thresholdC: number
  /** The class whose row decided, e.g. `smooth-metal`. */
  readonly surface: string
  /** The least sure of the cells that decided. */
  readonly confidence: Confidence
  /** Why another row than the surface's own decided; null where its own did. */
  readonly because: string | null
  readonly read: ThresholdReading
}

/** How the threshold was read off its row: at one cell, or in between two. */
export interface ThresholdReading {
  /** Contact time that was looked up [s]. */
  readonly contactS: number
  readonly cells: readonly ThresholdCell[]
}

export interface ThresholdCell {
  readonly contactS: number
  readonly thresholdC: number
}

/** Contact times above eight hours have the eight-hour value. Source: ISO 13732-1, as `domain` data of the catalogue. */
const LONGEST_CONTACT_S = 8 * 3600

/** The lowest of the table, at eight hours: no surface below it burns [°C]. Source: ISO 13732-1, as in the catalogue. */
export const LEAST_BURN_THRESHOLD_C = 43

/** Who decides where a class has no confirmed cell: always the next stricter one. */
const stricter: Readonly<Record<string, string>> = {
  wood: 'plastic',
  plastic: 'ceramic-glass-stone',
  'ceramic-glass-stone': 'smooth-metal',
}

/**
 * The threshold that a surface is judged by.
 *
 * Contact time [s], at least 0.5. Between the columns of the table the threshold is straight in log10(t). A cell of low
 * confidence never passes a surface: the next stricter class with confirmed cells decides, and says so. Null where the
 * table has no row at all. Source: ISO 13732-1 lower curve, rows and grades as in the catalogue.
 */
export function burnThreshold(
  table: readonly BurnThreshold[],
  surface: TouchedSurface,
  contactS: number,
): Threshold | null {
  const own = rowName(table, surface)
  let name = own.name
  let because = own.because
  for (;;) {
    const cells = table.filter((cell) => cell.surface === name)
    const found =
      cells.length > 0 ? interpolate(cells, Math.min(contactS, LONGEST_CONTACT_S)) : null
    if (found?.confirmed) return { ...told(found), surface: name, because }
    const next = stricterThan(table, name)
    if (next === null) {
      return found ? { ...told(found), surface: name, because } : null
    }
    because ??= `the threshold for ${surfaceWords(name)} at this contact time is not confirmed`
    name = next
  }
}

/** Of a coated metal the next thinner coat, then bare metal; of the rest the next class; of bare metal none. */
function stricterThan(table: readonly BurnThreshold[], name: string): string | null {
  if (name === 'smooth-metal') return null
  const coat = /^(.+)-(\d+)$/.exec(name)
  if (!coat) return stricter[name] ?? 'smooth-metal'
  return thickestCoat(table, coat[1] ?? '', Number(coat[2]) - 1) ?? 'smooth-metal'
}

/** The thickest row of a coating that is not thicker than this [µm]. */
function thickestCoat(
  table: readonly BurnThreshold[],
  coating: string,
  upToUm: number,
): string | null {
  const rows = [...new Set(table.map((cell) => cell.surface))]
    .filter((name) => name.startsWith(`${coating}-`))
    .map((name) => ({ name, um: Number(name.slice(coating.length + 1)) }))
    .filter(({ um }) => um <= upToUm)
  return rows.sort((a, b) => b.um - a.um)[0]?.name ?? null
}

/** Which row of the table is the surface's own. */
function rowName(
  table: readonly BurnThreshold[],
  { touchClass, coating, coatingThicknessM }: TouchedSurface,
): { name: string; because: string | null } {
  if (touchClass !== 'coated-metal') return { name: touchClass, because: null }
  if (coating === null || coatingThicknessM === null) {
    return { name: 'smooth-metal', because: 'a coating of unknown thickness gives no relief' }
  }
  const coatingUm = Math.round(coatingThicknessM * 1e6)
  const name = thickestCoat(table, coating, coatingUm)
  return name === null
    ? { name: 'smooth-metal', because: `a coating of ${coatingUm} µm is too thin to give relief` }
    : { name, because: null }
}

/** What the cells around a contact time give. */
interface Reading {
  readonly thresholdC: number
  readonly confidence: Confidence
  readonly confirmed: boolean
  readonly read: ThresholdReading
}

const told = ({ thresholdC, confidence, read }: Reading) => ({ thresholdC, confidence, read })

function interpolate(cells: readonly BurnThreshold[], contactS: number): Reading | null {
  const sorted = [...cells].sort((a, b) => a.contactS - b.contactS)
  const after = sorted.findIndex((cell) => cell.contactS >= contactS)
  const high = after < 0 ? sorted[sorted.length - 1] : sorted[after]
  const low = after <= 0 ? high : sorted[after - 1]
  if (!high || !low) return null
  if (high === low || high.contactS === contactS) return reading(high.lowerC, [high], contactS)
  const share = Math.log10(contactS / low.contactS) / Math.log10(high.contactS / low.contactS)
  return reading(low.lowerC + share * (high.lowerC - low.lowerC), [low, high], contactS)
}

function reading(thresholdC: number, cells: readonly BurnThreshold[], contactS: number): Reading {
  const least = (['estimate', 'memory'] as const).find((confidence) =>
    cells.some((cell) => cell.confidence === confidence),
  )
  return {
    thresholdC,
    confidence: least ?? 'found',
    confirmed: cells.every((cell) => cell.grade !== 'L'),
    read: {
      contactS,
      cells: cells.map((cell) => ({ contactS: cell.contactS, thresholdC: cell.lowerC })),
    },
  }
}

/** A row of the table in words: "smooth metal", "ceramic, glass or stone", "metal with 50 µm lacquer". */
export function surfaceWords(row: string): string {
  const coat = /^(.+)-(\d+)$/.exec(row)
  if (coat) return `metal with ${coat[2]} µm ${coat[1]}`
  return row === 'ceramic-glass-stone' ? 'ceramic, glass or stone' : row.replace('-', ' ')
}

/** A contact time in words: "5 s", "1 min", "8 h", "4.5 days (the threshold of 8 h)". */
export function contactWords(contactS: number): string {
  return contactS > LONGEST_CONTACT_S
    ? `${timeWords(contactS)} (the threshold of ${timeWords(LONGEST_CONTACT_S)})`
    : timeWords(contactS)
}

const DAY_S = 24 * 3600

function timeWords(timeS: number): string {
  const rounded = (units: number): number =>
    units < 100 ? Number(units.toPrecision(units < 10 ? 2 : 3)) : Math.round(units)
  if (timeS >= 2 * DAY_S) return `${rounded(timeS / DAY_S)} days`
  if (timeS >= 3600 && (timeS % 3600 === 0 || timeS > 2 * 3600)) return `${rounded(timeS / 3600)} h`
  if (timeS >= 60 && (timeS % 60 === 0 || timeS > 600)) return `${rounded(timeS / 60)} min`
  return `${timeS < 10 ? Number(timeS.toPrecision(3)) : rounded(timeS)} s`
}
