import { describe, expect, inject, test } from 'vitest'
import { indexCatalogue, sizeRun } from '#model/size-run.ts'

/** Every number of a value with the path to it, and everything else as text. */
function* leaves(value: unknown, path = ''): Generator<[path: string, leaf: unknown]> {
  if (typeof value !== 'object' || value === null) {
    yield [path, value]
    return
  }
  for (const [key, child] of Object.entries(value)) yield* leaves(child, `${path}.${key}`)
}

describe('the command line and the window', () => {
  const index = indexCatalogue(inject('demoCatalogue'))
  const outcomes = inject('demoOutcomes')

  test.each(inject('demoRuns').map((run, position) => ({ tag: run.tag, run, position })))(
    'agree on $tag to 1e-12',
    ({ run, position }) => {
      const here = new Map(leaves(sizeRun(run, {}, index)))
      const there = new Map(leaves(outcomes[position]))
      expect([...here.keys()]).toEqual([...there.keys()])
      for (const [path, leaf] of here) {
        const other = there.get(path)
        if (typeof leaf === 'number' && typeof other === 'number') {
          expect(Math.abs(leaf - other), path).toBeLessThanOrEqual(
            1e-12 * Math.max(Math.abs(leaf), Math.abs(other)),
          )
        } else {
          expect(leaf, path).toEqual(other)
        }
      }
    },
  )
})
