import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { columnReader } from '#model/cell-edit.ts'
import { applyDifference, diffJob } from '#model/difference.ts'
import {
  addRun,
  clearCells,
  duplicateRuns,
  moveRuns,
  removeRuns,
  setCell,
  setDefault,
  setJobName,
  setSite,
  setValue,
} from '#model/edits.ts'
import { type FieldKey, fields } from '#model/fields.ts'
import { type Job, jobSchema } from '#model/job.ts'
import { pasteBlock } from '#model/paste.ts'

const empty: Job = { name: '', site: '', defaults: {}, runs: [] }

function jobOf(tags: readonly string[]): Job {
  const runs = tags.map((tag) => ({ id: tag, values: { tag, shape: 'pipe' as const }, drafts: {} }))
  return { ...empty, runs }
}

const tagsOf = (job: Job) => job.runs.map(({ values }) => values.tag)

/** Ids as they come in a test: 1, 2, 3. */
function counter(): () => string {
  let last = 0
  return () => `new ${++last}`
}

describe('duplicateRuns, tags', () => {
  const copyOf = (tag: string) =>
    tagsOf(duplicateRuns(jobOf([tag]), new Set([tag]), counter())).at(-1) ?? ''

  test.each(['ST-9', 'Riser', '9007199254740993', '1'.repeat(60), 'x'.repeat(60)])(
    'a copy of %s has a tag of its own that a tag may be',
    (tag) => {
      expect(copyOf(tag)).not.toBe(tag)
      expect(copyOf(tag).length).toBeLessThanOrEqual(60)
      const twice = duplicateRuns(jobOf([tag, copyOf(tag)]), new Set([tag]), counter())
      expect(new Set(tagsOf(twice)).size).toBe(3)
    },
  )

  test('all of a long list copied at once', () => {
    const tags = Array.from({ length: 10_000 }, (_, index) => `ST-${index + 1}`)
    const copied = duplicateRuns(jobOf(tags), new Set(tags), counter())
    expect(new Set(tagsOf(copied)).size).toBe(20_000)
  })
})

describe('setCell', () => {
  const job = jobOf(['A'])

  test('keeps what is not a value as it was typed, and takes the old value away', () => {
    const sized = setCell(job, 'A', 'mediumC', '150', columnReader)
    const spoilt = setCell(sized, 'A', 'mediumC', 'hot', columnReader)
    expect(spoilt.runs[0]?.values.mediumC).toBeUndefined()
    expect(spoilt.runs[0]?.drafts).toEqual({ mediumC: 'hot' })
    const mended = setCell(spoilt, 'A', 'mediumC', '1,5', columnReader)
    expect(mended.runs[0]).toEqual({
      id: 'A',
      values: { tag: 'A', shape: 'pipe', mediumC: 1.5 },
      drafts: {},
    })
  })

  test('an empty cell has neither value nor draft', () => {
    const spoilt = setCell(job, 'A', 'lengthM', 'long', columnReader)
    expect(setCell(spoilt, 'A', 'lengthM', '  ', columnReader).runs[0]).toEqual(job.runs[0])
  })

  test('leaves the job as it is where nothing changes', () => {
    expect(setCell(job, 'A', 'tag', 'A', columnReader)).toBe(job)
    expect(setCell(job, 'nobody', 'tag', 'B', columnReader)).toBe(job)
  })

  test('two sides typed as a size are a rectangular duct', () => {
    const duct = setCell(job, 'A', 'size', '600 x 400', columnReader).runs[0]
    expect(duct?.values).toEqual({ tag: 'A', shape: 'rect-duct', widthM: 0.6, heightM: 0.4 })
  })

  test('two sides typed as a size mend what was wrong with either', () => {
    const spoilt = setCell(job, 'A', 'widthM', 'wide', columnReader)
    expect(setCell(spoilt, 'A', 'size', '600 x 400', columnReader).runs[0]?.drafts).toEqual({})
  })
})

describe('runs', () => {
  test('a new run takes over what it has in common with the run above, not what makes it another', () => {
    const above = setCell(
      setCell(jobOf(['A']), 'A', 'mediumC', '150', columnReader),
      'A',
      'size',
      'DN 50',
      columnReader,
    )
    const added = addRun(above, 'B', 'A').runs[1]
    expect(added?.values).toEqual({ shape: 'pipe', mediumC: 150 })
  })

  test('copies stand below the last of their originals under the next free tag', () => {
    const job = jobOf(['ST-101', 'ST-102', 'Valve'])
    const copied = duplicateRuns(job, new Set(['ST-101', 'Valve']), counter())
    expect(tagsOf(copied)).toEqual(['ST-101', 'ST-102', 'Valve', 'ST-103', 'Valve 2'])
  })

  test('moved runs keep their order', () => {
    const job = jobOf(['A', 'B', 'C', 'D'])
    expect(tagsOf(moveRuns(job, new Set(['D', 'B']), 'A'))).toEqual(['B', 'D', 'A', 'C'])
    expect(tagsOf(moveRuns(job, new Set(['A']), null))).toEqual(['B', 'C', 'D', 'A'])
  })
})

describe('pasteBlock', () => {
  test('fills the cells from the anchor on and adds runs for the rest', () => {
    const block = {
      runIds: ['B'],
      keys: ['size', 'lengthM'] as FieldKey[],
      rows: [
        ['DN 50', '12'],
        ['DN 65', 'x'],
      ],
    }
    const pasted = pasteBlock(jobOf(['A', 'B', 'C']), block, counter(), columnReader)
    expect(tagsOf(pasted)).toEqual(['A', 'B', undefined, 'C'])
    expect(pasted.runs[1]?.values).toMatchObject({ size: 'DN 50', lengthM: 12 })
    expect(pasted.runs[2]).toMatchObject({ values: { size: 'DN 65' }, drafts: { lengthM: 'x' } })
  })

  test('an empty line of a block keeps its place, so that what follows does not move up', () => {
    const block = {
      runIds: ['A', 'B', 'C'],
      keys: ['lengthM'] as FieldKey[],
      rows: [['1'], [''], ['3'], [''], ['5']],
    }
    const pasted = pasteBlock(jobOf(['A', 'B', 'C']), block, counter(), columnReader)
    expect(pasted.runs.map(({ values }) => values.lengthM)).toEqual([1, undefined, 3, 5])
  })

  test('takes a list as long as a job may be', () => {
    const rows = Array.from({ length: 100_000 }, (_, index) => [`T-${index}`, '12'])
    const block = { runIds: [], keys: ['tag', 'lengthM'] as FieldKey[], rows }
    expect(pasteBlock(empty, block, counter(), columnReader).runs).toHaveLength(100_000)
  })

  test('a run that is added takes nothing over from the one above', () => {
    const sized = setCell(jobOf(['A']), 'A', 'airC', '35', columnReader)
    const block = { runIds: ['A'], keys: ['lengthM'] as FieldKey[], rows: [['12'], ['14']] }
    const pasted = pasteBlock(sized, block, counter(), columnReader)
    expect(pasted.runs[1]?.values).toEqual({ shape: 'pipe', lengthM: 14 })
  })
})

test('what was typed into no cell of ours is no part of a job', () => {
  const run = { id: 'A', values: {}, drafts: { colour: 'red' } }
  expect(jobSchema.safeParse({ ...empty, runs: [run] }).success).toBe(false)
})

/** Any edit, on whatever job there is. */
type Edit = (job: Job) => Job

const key = fc.constantFrom(...fields.map((field) => field.key))
const text = fc.oneof(
  fc.string(),
  fc.constantFrom('', 'DN 50', '600 x 400', '150', '-3,5', 'yes', 'pipe', '1e999', '12 000'),
  fc.double({ noNaN: true }).map(String),
)
const at = fc.nat({ max: 9 })
const idAt = (job: Job, index: number) => job.runs[index % Math.max(1, job.runs.length)]?.id ?? ''

let lastId = 0
const newId = () => `run ${++lastId}`

const anyEdit: fc.Arbitrary<Edit> = fc.oneof(
  at.map(
    (index): Edit =>
      (job) =>
        addRun(job, newId(), idAt(job, index) || null),
  ),
  at.map(
    (index): Edit =>
      (job) =>
        removeRuns(job, new Set([idAt(job, index)])),
  ),
  at.map(
    (index): Edit =>
      (job) =>
        duplicateRuns(job, new Set([idAt(job, index)]), newId),
  ),
  fc.tuple(at, at).map(
    ([one, other]): Edit =>
      (job) =>
        moveRuns(job, new Set([idAt(job, one)]), idAt(job, other)),
  ),
  fc.tuple(at, key, text).map(
    ([index, field, typed]): Edit =>
      (job) =>
        setCell(job, idAt(job, index), field, typed, columnReader),
  ),
  fc.tuple(at, fc.array(key, { maxLength: 3 })).map(
    ([index, keys]): Edit =>
      (job) =>
        clearCells(job, new Set([idAt(job, index)]), keys),
  ),
  fc
    .tuple(
      at,
      fc.array(key, { minLength: 1, maxLength: 4 }),
      fc.array(fc.array(text, { maxLength: 5 }), { maxLength: 4 }),
    )
    .map(
      ([index, keys, rows]): Edit =>
        (job) =>
          pasteBlock(
            job,
            { runIds: job.runs.slice(index).map(({ id }) => id), keys, rows },
            newId,
            columnReader,
          ),
    ),
  at.map(
    (index): Edit =>
      (job) =>
        setValue(job, idAt(job, index), 'thicknessM', 0.05),
  ),
  fc.string({ maxLength: 20 }).map(
    (name): Edit =>
      (job) =>
        setJobName(job, name),
  ),
  fc.string({ maxLength: 20 }).map(
    (site): Edit =>
      (job) =>
        setSite(job, site),
  ),
  fc.constantFrom(10, 25, undefined).map(
    (airC): Edit =>
      (job) =>
        setDefault(job, 'airC', airC),
  ),
)

describe('any sequence of edits', () => {
  test('leaves a job that can be written, and a difference that leads from one job to the next', () => {
    fc.assert(
      fc.property(fc.array(anyEdit, { maxLength: 30 }), (edits) => {
        let job = jobOf(['A', 'B', 'C'])
        for (const edit of edits) {
          const next = edit(job)
          const difference = diffJob(job, next)
          expect(difference ? applyDifference(job, difference) : job).toEqual(next)
          if (difference === null) expect(next).toEqual(job)
          job = next
        }
        expect(jobSchema.safeParse(job).success).toBe(true)
        expect(new Set(job.runs.map(({ id }) => id)).size).toBe(job.runs.length)
      }),
      { numRuns: 300 },
    )
  })

  test('many edits can be written as one difference', () => {
    fc.assert(
      fc.property(fc.array(anyEdit, { maxLength: 30 }), (edits) => {
        const first = jobOf(['A', 'B', 'C'])
        const last = edits.reduce((job, edit) => edit(job), first)
        const difference = diffJob(first, last)
        expect(difference ? applyDifference(first, difference) : first).toEqual(last)
        // And back, as undo has it.
        const back = diffJob(last, first)
        expect(back ? applyDifference(last, back) : last).toEqual(first)
      }),
      { numRuns: 300 },
    )
  })
})
