import { describe, expect, test } from 'vitest'
import { render } from './render.ts'
import { faultOf } from './report.ts'
import { type Row, rowsOf } from './rows.ts'
import { workOf } from './works.ts'

const row = (change: Partial<Row> = {}): Row => ({
  from: 'Holman 2-2, steel tube',
  what: 'heat loss',
  given: 'insideC 600',
  printed: '680',
  deviation: 0.0004,
  ofTolerance: 0.5,
  standing: 'printed',
  ...change,
})

function pageOf(rows: readonly Row[]): string {
  const made = render(rows)
  return 'page' in made ? made.page : expect.fail(made.unknown.join())
}

describe('a work', () => {
  test('counts once, whichever of its tables and examples is used', () => {
    const page = pageOf([
      row({ from: 'ASHRAE Handbook Fundamentals 2021, ch. 4, example 11' }),
      row({ from: 'ASHRAE Handbook Fundamentals 2017, ch. 1, table 1' }),
      row(),
    ])
    expect(page).toContain('| Printed figures | 3 | 2 |')
  })

  test('is told apart from the place in it', () => {
    expect(workOf('Lemmon and Jacobsen 2004, table V')?.where).toBe('table V')
    expect(workOf('Çengel 3-8, lagged steam pipe')?.where).toBe('3-8, lagged steam pipe')
  })

  test('that the list does not have is named instead of counted', () => {
    expect(render([row(), row({ from: 'hearsay, page 3' })])).toEqual({
      unknown: ['hearsay, page 3'],
    })
  })
})

describe('the page', () => {
  test('is the same whatever order the tests ran in', () => {
    const rows = [row(), row({ given: 'insideC 9' }), row({ from: 'Dutta 4.8' })]
    expect(pageOf(rows.toReversed())).toBe(pageOf(rows))
  })

  test('is the same where machines differ by the last bit', () => {
    const half = 0.00125
    const near = (factor: number) => row({ deviation: half * factor, ofTolerance: 0.25 * factor })
    expect(pageOf([near(1 - 1e-13)])).toBe(pageOf([near(1 + 1e-13)]))
    expect(pageOf([row({ deviation: -1e-16 })])).toBe(pageOf([row({ deviation: 1e-16 })]))
  })

  test('keeps what was not read in print apart', () => {
    const page = pageOf([row(), row({ standing: 'unread' }), row({ standing: 'regression' })])
    expect(page).toContain('| Printed figures | 1 | 1 |')
  })
})

describe('rows of a report', () => {
  const found = { from: 'Holman 2-2', given: '', printed: '680', deviation: 0, ofTolerance: 0 }
  const report = (file: string, from = found.from) => ({
    testResults: [
      {
        name: file,
        assertionResults: [
          {
            ancestorTitles: ['', 'a pipe', 'as printed'],
            meta: { published: [{ ...found, from }] },
          },
          { ancestorTitles: [''], meta: {} },
        ],
      },
    ],
  })

  test.each([
    ['/x/solve.test.ts', 'Holman 2-2', 'printed'],
    ['/x/solve.regression.test.ts', 'Holman 2-2', 'regression'],
    ['/x/solve.regression.test.ts', 'Holman 2-2 (from memory)', 'unread'],
    ['/x/solve.test.ts', 'generic mineral heat-transfer oil, estimate', 'unread'],
  ])('%s, %s: %s', (file, from, standing) => {
    expect(rowsOf(report(file, from))).toMatchObject([{ from, standing, what: 'a pipe' }])
  })

  test('leave out the figures that the test of the comparison makes up', () => {
    expect(rowsOf(report('/x/tests/published.test.ts'))).toEqual([])
  })

  test('of a run that left none are a fault, and so are others than the committed ones', async () => {
    expect(await faultOf(null)).toContain('left no report')
    expect(await faultOf(report('/x/solve.test.ts'))).toContain('npm run published')
    expect(await faultOf(report('/x/solve.test.ts', 'hearsay'))).toContain('works.ts')
  })
})
