import { describe, expect, test } from 'vitest'
import { page, userEvent } from 'vitest/browser'
import { render } from 'vitest-browser-svelte'
import type { RunValues } from '#model/fields.ts'
import '#ui/theme.css'
import App from '#ui/App.svelte'
import type { Workspace } from '#ui/state/workspace.svelte.ts'
import { jobOf, startWorkspace, TestFile } from '../../workspace.ts'

const steam: RunValues = {
  shape: 'pipe',
  size: 'DN 50',
  lengthM: 10,
  mediumC: 150,
  material: 'stone_wool_pipe_section',
  finish: 'al_plain',
}
const threeRuns = ['ST-1', 'ST-2', 'ST-3'].map((tag) => ({ ...steam, tag }))

async function open(runs: readonly RunValues[]): Promise<{ workspace: Workspace; file: TestFile }> {
  await page.viewport(1440, 900)
  const file = new TestFile(jobOf(runs))
  const workspace = await startWorkspace(file)
  await render(App, { workspace })
  return { workspace, file }
}

function cell(tag: string, column: string): HTMLElement {
  const row = [...document.querySelectorAll('tbody tr')].find(
    (one) => one.querySelector('td.tag')?.textContent?.trim() === tag,
  )
  const found = row?.querySelector<HTMLElement>(`td.${column}`)
  if (!found) throw new Error(`No cell ${tag} ${column}`)
  return found
}
const shown = (tag: string, column: string) => cell(tag, column).textContent.trim()

function paste(text: string): void {
  const clipboardData = new DataTransfer()
  clipboardData.setData('text/plain', text)
  const event = new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true })
  document.activeElement?.dispatchEvent(event)
}
function copied(): string {
  const clipboardData = new DataTransfer()
  const event = new ClipboardEvent('copy', { clipboardData, bubbles: true, cancelable: true })
  document.activeElement?.dispatchEvent(event)
  return clipboardData.getData('text/plain')
}

describe('the schedule', () => {
  test('shows the thickness of every run', async () => {
    await open(threeRuns)
    await expect.poll(() => shown('ST-3', 'lagging')).toMatch(/^\d+$/)
  })

  test('typing replaces a cell, Enter goes down, and the answer follows', async () => {
    const { workspace } = await open(threeRuns)
    await expect.poll(() => shown('ST-1', 'loss')).not.toBe('')
    const before = shown('ST-1', 'loss')
    await userEvent.click(cell('ST-1', 'size'))
    await userEvent.keyboard('DN 100{Enter}')
    expect(workspace.session.job.runs[0]?.values.size).toBe('DN 100')
    await expect.poll(() => shown('ST-1', 'loss')).not.toBe(before)
    expect(workspace.session.activeRunId).toBe('run-1')
    await userEvent.keyboard('{Control>}z{/Control}')
    await expect.poll(() => shown('ST-1', 'size')).toBe('DN 50')
  })

  test('Escape leaves a cell as it was', async () => {
    const { workspace } = await open(threeRuns)
    const before = workspace.session.job
    await userEvent.click(cell('ST-1', 'lengthM'))
    await userEvent.keyboard('{F2}99{Escape}')
    expect(workspace.session.job).toBe(before)
  })

  test('an open cell that is scrolled out of sight keeps what was typed', async () => {
    const { workspace } = await open(
      Array.from({ length: 300 }, (_, index) => ({ ...steam, tag: `ST-${index}` })),
    )
    await userEvent.click(cell('ST-0', 'lengthM'))
    await userEvent.keyboard('99')
    const view = document.querySelector('.view.grid')
    view?.scrollTo(0, 6000)
    await expect.poll(() => document.body.textContent.includes('ST-200')).toBe(true)
    expect(workspace.session.job.runs[0]?.values.lengthM).toBe(99)
  })

  test('keeps what was typed into a cell that cannot be that, and says what can', async () => {
    const { workspace } = await open(threeRuns)
    await userEvent.click(cell('ST-2', 'mediumC'))
    await userEvent.keyboard('hot{Enter}{ArrowUp}')
    await expect.poll(() => shown('ST-2', 'mediumC')).toBe('hot')
    expect(cell('ST-2', 'mediumC').getAttribute('aria-invalid')).toBe('true')
    await expect
      .element(page.getByText('"hot" does not fit. Allowed: a number from −200 to 1000 °C.'))
      .toBeVisible()
    expect(workspace.session.job.runs[1]?.drafts).toEqual({ mediumC: 'hot' })
    await userEvent.keyboard('150{Enter}')
    await expect.poll(() => shown('ST-2', 'lagging')).toMatch(/^\d+$/)
  })

  test('pastes a block, adding runs below, and copies it back', async () => {
    const { workspace } = await open(threeRuns)
    await userEvent.click(cell('ST-3', 'size'))
    paste('DN 65\t12\nDN 80\t14,5')
    await expect.poll(() => workspace.session.job.runs.length).toBe(4)
    expect(workspace.session.job.runs[2]?.values).toMatchObject({ size: 'DN 65', lengthM: 12 })
    expect(workspace.session.job.runs[3]?.values).toMatchObject({ size: 'DN 80', lengthM: 14.5 })
    await userEvent.keyboard('{Shift>}{ArrowDown}{ArrowRight}{/Shift}')
    expect(copied()).toBe('DN 65\t12\nDN 80\t14.5')
    await userEvent.keyboard('{Control>}z{/Control}')
    expect(workspace.session.job.runs.length).toBe(3)
  })

  const foreign = [
    'Line No\tService\tPipe size\tLength (m)\tFluid temp °C\tRoom temp\tInsulation\tCladding\tLocation\tBy',
    'L-1\tHeating\tDN 50\t12\t80\t18\tstone_wool_pipe_section\tal_plain\tRoof\tA. N.',
    'L-2\tHeating\tDN 65\t8\t80\t18\tstone_wool_pipe_section\tal_plain\tRoof\tA. N.',
  ].join('\n')

  test('asks what the columns of a foreign list are, and adds it below what stands', async () => {
    const { workspace } = await open(threeRuns)
    const standing = workspace.session.job.runs
    await userEvent.click(cell('ST-2', 'size'))
    paste(foreign)
    const dialog = page.getByRole('dialog', { name: 'Which column is what?' })
    await expect.element(dialog.getByText('Left out: By')).toBeVisible()
    await expect.element(dialog.getByText('DN 50 · DN 65')).toBeVisible()
    await dialog.getByLabelText('Room temp is read as').selectOptions('Left out')
    await dialog.getByLabelText('By is read as').selectOptions('Group')
    await expect.element(dialog.getByText('Left out: Room temp')).toBeVisible()
    expect(workspace.session.job.runs).toBe(standing)
    await dialog.getByRole('button', { name: 'Paste 2 runs' }).click()
    expect(workspace.session.job.runs.slice(0, 3)).toEqual(standing)
    expect(workspace.session.job.runs.slice(3).map(({ values }) => values)).toEqual(
      ['L-1', 'L-2'].map((tag, index) => ({
        tag,
        shape: 'pipe',
        service: 'Heating',
        size: ['DN 50', 'DN 65'][index],
        lengthM: [12, 8][index],
        mediumC: 80,
        material: 'stone_wool_pipe_section',
        finish: 'al_plain',
        place: 'Roof',
        group: 'A. N.',
      })),
    )
    await userEvent.keyboard('{Control>}z{/Control}')
    expect(workspace.session.job.runs).toBe(standing)
  })

  test('a foreign list can be turned back, or pasted as cells, by keyboard', async () => {
    const { workspace } = await open(threeRuns)
    const standing = workspace.session.job
    await userEvent.click(cell('ST-3', 'tag'))
    paste(foreign)
    await expect.element(page.getByRole('dialog')).toBeVisible()
    await userEvent.keyboard('{Escape}')
    await expect.element(page.getByRole('dialog')).not.toBeInTheDocument()
    expect(workspace.session.job).toBe(standing)
  })

  test('the header alone is no list, and says so', async () => {
    const { workspace } = await open(threeRuns)
    await userEvent.click(cell('ST-3', 'tag'))
    const standing = workspace.session.job
    paste('tag\tsize\tlength_m')
    await expect.element(page.getByText('Only the names of columns were pasted')).toBeVisible()
    expect(workspace.session.job).toBe(standing)
  })

  test('names what met no column to go to; results copied from here stay behind unsaid', async () => {
    const { workspace } = await open(threeRuns)
    await userEvent.click(cell('ST-3', 'mediumC'))
    paste('80\tYard\t40\t12')
    await expect.element(page.getByText('2 columns of what was pasted')).toBeVisible()
    await userEvent.keyboard('{Shift>} {/Shift}')
    const line = copied()
    await userEvent.click(cell('ST-1', 'tag'))
    paste(line)
    await expect.element(page.getByText('of what was pasted')).not.toBeInTheDocument()
    expect(workspace.session.job.runs[0]?.values).toMatchObject({ tag: 'ST-3', mediumC: 80 })
  })

  test('one cell pasted fills all that are marked; Delete empties them', async () => {
    const { workspace } = await open(threeRuns)
    await userEvent.click(cell('ST-1', 'lengthM'))
    await userEvent.keyboard('{Shift>}{ArrowDown}{ArrowDown}{/Shift}')
    paste('33')
    expect(workspace.session.job.runs.map(({ values }) => values.lengthM)).toEqual([33, 33, 33])
    await userEvent.keyboard('{Delete}')
    expect(workspace.session.job.runs.map(({ values }) => values.lengthM)).toEqual([
      undefined,
      undefined,
      undefined,
    ])
  })

  test('Insert adds a run like the one above; Ctrl Delete takes the marked ones away', async () => {
    const { workspace } = await open(threeRuns)
    await userEvent.click(cell('ST-1', 'tag'))
    await userEvent.keyboard('{Insert}ST-9{Tab}Branch{Tab}DN 80{Enter}')
    const added = workspace.session.job.runs[1]
    expect(added?.values).toMatchObject({
      tag: 'ST-9',
      description: 'Branch',
      size: 'DN 80',
      mediumC: 150,
    })
    await expect.poll(() => shown('ST-9', 'lagging')).toMatch(/^\d+$/)
    await userEvent.click(cell('ST-9', 'tag'))
    await userEvent.keyboard('{Shift>}{ArrowDown}{/Shift}{Control>}{Delete}{/Control}')
    expect(workspace.session.job.runs.map(({ values }) => values.tag)).toEqual(['ST-1', 'ST-3'])
  })

  test('Alt with arrows moves the marked runs', async () => {
    const { workspace } = await open(threeRuns)
    const order = () => workspace.session.job.runs.map(({ values }) => values.tag)
    await userEvent.click(cell('ST-1', 'tag'))
    await userEvent.keyboard('{Alt>}{ArrowDown}{/Alt}')
    expect(order()).toEqual(['ST-2', 'ST-1', 'ST-3'])
    await userEvent.keyboard('{Shift>}{ArrowDown}{/Shift}{Alt>}{ArrowUp}{/Alt}')
    expect(order()).toEqual(['ST-1', 'ST-3', 'ST-2'])
    await userEvent.keyboard('{Alt>}{ArrowUp}{/Alt}')
    expect(order()).toEqual(['ST-1', 'ST-3', 'ST-2'])
  })

  test('heads of services fold their runs away', async () => {
    await open([
      { ...steam, tag: 'A', service: 'Steam' },
      { ...steam, tag: 'B', service: 'Hot water' },
    ])
    await page.getByRole('button', { name: /^Steam/ }).click()
    expect(() => cell('A', 'tag')).toThrow()
    expect(shown('B', 'tag')).toBe('B')
  })

  test('two runs with one tag are told of until one has another', async () => {
    await open([...threeRuns.slice(0, 2), { ...steam, tag: 'ST-1' }])
    await expect.poll(() => shown('ST-1', 'governed')).toBe('Check')
    await userEvent.click(cell('ST-1', 'tag'))
    await userEvent.keyboard('ST-7{Enter}')
    await expect.poll(() => shown('ST-7', 'lagging')).toMatch(/^\d+$/)
    await expect.poll(() => shown('ST-1', 'lagging')).toMatch(/^\d+$/)
  })

  test('draws a few dozen of ten thousand lines, and says how many there are', async () => {
    const many = Array.from({ length: 10_000 }, (_, index) => ({ ...steam, tag: `R-${index}` }))
    await open(many)
    expect(document.querySelectorAll('tbody tr').length).toBeLessThan(80)
    expect(page.getByRole('grid').element().getAttribute('aria-rowcount')).toBe('10001')
    await userEvent.click(cell('R-0', 'tag'))
    await userEvent.keyboard('{Control>}{End}{/Control}')
    await expect.poll(() => shown('R-9999', 'tag')).toBe('R-9999')
  })

  test('an empty job offers what to do first', async () => {
    const { workspace } = await open([])
    await page.getByRole('button', { name: 'Add a run' }).click()
    expect(workspace.session.job.runs.length).toBe(1)
    await userEvent.keyboard('ST-1{Enter}')
    expect(workspace.session.job.runs[0]?.values).toEqual({ shape: 'pipe', tag: 'ST-1' })
  })
})
