/** The printed figures that tests met, as Vitest's own JSON report tells them. */
import { z } from 'zod'

const found = z.object({
  from: z.string(),
  given: z.string(),
  printed: z.string(),
  deviation: z.number().nullable(),
  // JSON has no word for what is no number, which a failing test may compute.
  ofTolerance: z.number().nullable(),
})

const reportSchema = z.object({
  testResults: z.array(
    z.object({
      name: z.string(),
      assertionResults: z.array(
        z.object({
          ancestorTitles: z.array(z.string()),
          meta: z.object({ published: z.array(found).optional() }).optional(),
        }),
      ),
    }),
  ),
})

/**
 * `printed`: read in the source; `regression`: known through a companion calculation of the book, see the file's name;
 * `unread`: by its own words from memory, an estimate, or computed from something else that is printed.
 */
export type Standing = 'printed' | 'regression' | 'unread'

const UNREAD = /from memory|\bestimate\b|computed from/

export interface Row extends z.infer<typeof found> {
  readonly standing: Standing
  /** What is computed, in the words of the test. */
  readonly what: string
}

/** The tests of `published` itself compare with figures that they make up. */
const OWN_TEST = /published\.test\.ts$/

/** Null where it is no report. */
export function rowsOf(report: unknown): Row[] | null {
  const { data } = reportSchema.safeParse(report)
  if (!data) return null
  return data.testResults
    .filter(({ name }) => !OWN_TEST.test(name))
    .flatMap(({ name, assertionResults }) =>
      assertionResults.flatMap(({ ancestorTitles, meta }) =>
        (meta?.published ?? []).map((row) => ({
          ...row,
          standing: standingOf(row.from, name),
          what: ancestorTitles.filter((title) => title !== '' && title !== 'as printed').join(', '),
        })),
      ),
    )
}

function standingOf(from: string, file: string): Standing {
  if (UNREAD.test(from)) return 'unread'
  return file.endsWith('.regression.test.ts') ? 'regression' : 'printed'
}
