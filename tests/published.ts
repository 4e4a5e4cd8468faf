/** Figures from print, compared by the digits they were printed with. */
import { describe, expect, TestRunner, test } from 'vitest'

/** What a test found beside a printed figure; told to whoever reads the tests' own report. */
export interface Found {
  readonly from: string
  readonly given: string
  readonly printed: string
  /** As a fraction of the printed figure; null where that is nought. */
  readonly deviation: number | null
  /** Part of the tolerance that the deviation takes. */
  readonly ofTolerance: number
}

declare module 'vitest' {
  interface TaskMeta {
    published?: Found[]
  }
}

/** A tolerance other than the printed digits, and the reason for it. */
export type Within = ({ readonly fraction: number } | { readonly absolute: number }) & {
  readonly because: string
}

export interface PublishedRow<Given> {
  /**
   * The source, and where in it; it begins as in tests/published/works.ts. "from memory" or "estimate" in it says that
   * nobody has read the figure there.
   */
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
  const difference = computed - Number(row.printed)
  const isMet = Math.abs(difference) <= tolerance
  record({
    from: row.from,
    given: briefly(row.given),
    printed: row.printed,
    deviation: Number(row.printed) === 0 ? null : difference / Math.abs(Number(row.printed)),
    ofTolerance: Math.abs(difference) / tolerance,
  })
  expect(isMet, `computed ${computed}, printed ${row.printed} ± ${tolerance} (${row.from})`).toBe(
    true,
  )
}

/** Nothing to record where no test is running, as while the tests are collected. */
function record(found: Found): void {
  const meta = TestRunner.getCurrentTest()?.meta
  if (meta) meta.published = [...(meta.published ?? []), found]
}

const LONGEST_GIVEN = 90

/** What was given, to tell one row from the next: bare numbers of six digits at most, cut where it is long. */
function briefly(given: unknown): string {
  const text = JSON.stringify(given, (_, value: unknown) =>
    typeof value === 'number' ? Number(value.toPrecision(6)) : value,
  )
  const bare = (text ?? '').replaceAll(/["{}]/g, '').replaceAll(':', ' ').replaceAll(',', ', ')
  return bare.length > LONGEST_GIVEN ? `${bare.slice(0, LONGEST_GIVEN - 1).trimEnd()}…` : bare
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
