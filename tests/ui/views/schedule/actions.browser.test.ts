import { expect, test } from 'vitest'
import { commitEditing, startEditing } from '#ui/views/schedule/actions.ts'
import { Grid } from '#ui/views/schedule/grid.svelte.ts'
import { jobOf, startWorkspace, TestFile } from '../../workspace.ts'

test('a cell that is open keeps what is typed, though a filter hides its run meanwhile', async () => {
  const workspace = await startWorkspace(new TestFile(jobOf([{ tag: 'A' }, { tag: 'B' }])))
  const grid = new Grid(workspace)
  startEditing(grid)
  grid.filterText = 'B'
  commitEditing(grid, 'A1')
  expect(workspace.session.job.runs.map(({ values }) => values.tag)).toEqual(['A1', 'B'])
})
