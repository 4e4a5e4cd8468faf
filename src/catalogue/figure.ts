/** A figure read out of a table: with what had to be assumed, or why it is not known. Whole sentences. */
export type Figure =
  | { readonly ok: true; readonly value: number; readonly assumption: string | null }
  | { readonly ok: false; readonly reason: string }

export const known = (value: number, assumption: string | null = null): Figure => ({
  ok: true,
  value,
  assumption,
})
export const unknown = (reason: string): Figure => ({ ok: false, reason })

export type Point = readonly [at: number, value: number]

export const rising = (points: readonly Point[]): readonly Point[] =>
  points.toSorted(([a], [b]) => a - b)

/** Linear between neighbours of rising points; null beyond the ends. */
export function between(points: readonly Point[], at: number): number | null {
  const next = points.findIndex(([end]) => end >= at)
  const upper = points[next]
  if (!upper) return null
  if (upper[0] === at) return upper[1]
  const lower = points[next - 1]
  if (!lower) return null
  return lower[1] + ((upper[1] - lower[1]) * (at - lower[0])) / (upper[0] - lower[0])
}

/** What `between` reads: the point that is meant, or the two around it; none beyond the ends. */
export function readAt(points: readonly Point[], at: number): readonly Point[] {
  const next = points.findIndex(([end]) => end >= at)
  const [lower, upper] = [points[next - 1], points[next]]
  if (!upper) return []
  if (upper[0] === at) return [upper]
  return lower ? [lower, upper] : []
}

/** The point within the ends that is nearest. */
export function clamped(points: readonly Point[], at: number): number {
  const ends = points.map(([end]) => end)
  return Math.min(Math.max(at, Math.min(...ends)), Math.max(...ends))
}

export const figureText = (value: number, digits = 1): string =>
  String(Number(value.toFixed(digits))).replace('-', '−')
