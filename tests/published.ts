/** Figures from print, compared by the digits they were printed with. */
import { describe, expect, test } from 'vitest'

/** A tolerance other than the printed digits, and the reason for it. */
export type Within = ({ readonly fraction: number } | { readonly absolute: number }) & {
  readonly because: string
}

export interface PublishedRow<Given> {
  /** The source, and where in it. */
  readonly from: string
  readonly given: Given
  /** The figure as printed: a string, since its digits are the tolerance. */
  readonly printed: string
  readonly within?: Within
}

/** Half a unit of the last printed digit, unless the row states another tolerance. */
export function toleranceOf({ printed, within }: PublishedRow<unknown>): number {
  if (within) {
    return 'absolute' in within ? within.absolute : within.fraction * Math.abs(Number(printed))
  }
  const parts = /^-?\d+(?:\.(?<decimals>\d+))?(?:e(?<exponent>[-+]?\d+))?$/.exec(printed)?.groups
  if (!parts) throw new Error(`Not a printed number: ${printed}`)
  return 0.5 * 10 ** (Number(parts.exponent ?? 0) - (parts.decimals?.length ?? 0))
}

/** Digits that binary fractions cost: a printed 0.15 may compute to 0.15000000000000002. */
const BINARY_SLACK = 1e-12

export function expectPublished<Given>(
  compute: (given: Given) => number,
  row: PublishedRow<Given>,
): void {
  const computed = compute(row.given)
  const tolerance = toleranceOf(row) + BINARY_SLACK * Math.abs(computed)
  const isMet = Math.abs(computed - Number(row.printed)) <= tolerance
  expect(isMet, `computed ${computed}, printed ${row.printed} ± ${tolerance} (${row.from})`).toBe(
    true,
  )
}

/** One test for each printed figure. */
export function published<Given>(
  compute: (given: Given) => number,
  rows: readonly PublishedRow<Given>[],
): void {
  describe('as printed', () => {
    test.each(rows.map((row) => [titleOf(row), row] as const))('%s', (_, row) =>
      expectPublished(compute, row),
    )
  })
}

const titleOf = ({ from, given, printed }: PublishedRow<unknown>): string =>
  `${from}: ${JSON.stringify(given)} gives ${printed}`.replaceAll('%', '%%')
