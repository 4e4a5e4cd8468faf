/** What the run sheet asks for besides the result. */
import { expect, test } from 'vitest'
import { openCatalogue, readCatalogue } from '#backend/catalogue-db.ts'
import type { RunValues } from '#model/fields.ts'
import { detailRun, indexCatalogue, sizeRun } from '#model/size-run.ts'

const db = openCatalogue(':memory:', 'db')
const index = indexCatalogue(readCatalogue(db))
db.close()

const free: RunValues = {
  tag: 'A',
  shape: 'pipe',
  size: 'DN 80',
  mediumC: 170,
  airC: 22,
  material: 'stone_wool_pipe_section',
  maxLossWPerM: 60,
}

test('a fixed thickness has the rungs and exact ends of the same run without it', () => {
  const sized = sizeRun(free, {}, index)
  const detail = detailRun({ ...free, thicknessM: 0.033 }, {}, index)
  expect(sized.ok && sized.result.ladder).toEqual(detail?.otherRungs)
  expect(detail?.ends).toEqual(detailRun(free, {}, index)?.ends)
})

test('a run that is sized, or bare, has no other rungs', () => {
  expect(detailRun(free, {}, index)?.otherRungs).toEqual([])
  expect(detailRun({ ...free, thicknessM: 0 }, {}, index)?.otherRungs).toEqual([])
})
