import { describe, expect, test } from 'vitest'
import { page, userEvent } from 'vitest/browser'
import { render } from 'vitest-browser-svelte'
import type { RunValues } from '#model/fields.ts'
import '#ui/theme.css'
import App from '#ui/App.svelte'
import { jobOf, startWorkspace, TestFile } from '../workspace.ts'

const run: RunValues = {
  tag: 'ST-1',
  shape: 'pipe',
  size: 'DN 50',
  mediumC: 150,
  material: 'stone_wool_pipe_section',
  finish: 'al_plain',
}

async function openForm(runs: readonly RunValues[] = [run]) {
  await page.viewport(1440, 900)
  const workspace = await startWorkspace(new TestFile(jobOf(runs)))
  await render(App, { workspace })
  await page.getByText('Inputs', { exact: true }).click()
  return { ...workspace, session: workspace.session, form: page.getByRole('form') }
}

describe('the form of a run', () => {
  test('sizes while one types, and takes back all that was typed in one step', async () => {
    const { session, form } = await openForm()
    const before = session.job
    await form.getByLabelText('Size').fill('DN 100')
    await expect.poll(() => session.job.runs[0]?.values.size).toBe('DN 100')
    await form.getByLabelText('Size').fill('DN 150')
    await userEvent.tab()
    expect(session.job.runs[0]?.values.size).toBe('DN 150')
    session.undo()
    expect(session.job).toBe(before)
  })

  test('does not call half a number a mistake, but keeps and explains a whole one', async () => {
    const { session, form } = await openForm()
    const medium = form.getByLabelText('Medium °C')
    await medium.fill('-')
    await new Promise((resolve) => setTimeout(resolve, 400))
    expect(session.job.runs[0]?.values.mediumC).toBe(150)
    await medium.fill('1200')
    await userEvent.tab()
    await expect.element(medium).toHaveValue('1200')
    await expect.element(medium).toHaveAttribute('aria-invalid', 'true')
    await expect
      .element(form.getByText('"1200" does not fit. Allowed: a number from -200 to 1000 °C.'))
      .toBeVisible()
  })

  test('a change is made in all runs that are marked, and the form says so', async () => {
    const { session, form } = await openForm([
      run,
      { ...run, tag: 'ST-2' },
      { ...run, tag: 'ST-3' },
    ])
    await page.getByRole('gridcell', { name: 'ST-1' }).click()
    await userEvent.keyboard('{Shift>}{ArrowDown}{/Shift}')
    await expect.element(page.getByText('2 runs are marked.')).toBeVisible()
    await expect.element(page.getByRole('button', { name: 'Duplicate 2 runs' })).toBeVisible()
    const before = session.job
    await form.getByLabelText('Medium °C').fill('90')
    // Leaving the field by a click that unmarks them does not change what was meant.
    await page.getByRole('gridcell', { name: 'ST-2' }).click()
    expect(session.job.runs.map(({ values }) => values.mediumC)).toEqual([90, 90, 150])
    session.undo()
    expect(session.job).toBe(before)
    await userEvent.keyboard('{Shift>}{ArrowDown}{/Shift}')
    await form.getByLabelText('Tag').fill('ST-9')
    await userEvent.tab()
    expect(session.job.runs.map(({ values }) => values.tag)).toEqual(['ST-1', 'ST-2', 'ST-9'])
  })

  test('what is typed stays with its run when another one is pointed at', async () => {
    const { session, form } = await openForm([run, { ...run, tag: 'ST-2', mediumC: 90 }])
    const medium = form.getByLabelText('Medium °C')
    await medium.fill('200')
    // Before it took effect by itself, and after.
    await page.getByRole('gridcell', { name: 'ST-2' }).click()
    expect(session.job.runs.map(({ values }) => values.mediumC)).toEqual([200, 90])
    await medium.fill('95')
    await expect.poll(() => session.job.runs[1]?.values.mediumC).toBe(95)
    await page.getByRole('gridcell', { name: 'ST-1' }).click()
    expect(session.job.runs.map(({ values }) => values.mediumC)).toEqual([200, 95])
  })

  test('shows what holds where a field is empty', async () => {
    const { form } = await openForm()
    await expect
      .element(form.getByLabelText('Air °C', { exact: true }))
      .toHaveAttribute('placeholder', '20')
    await expect.element(form.getByLabelText('Wind')).toHaveAttribute('placeholder', 'none')
  })

  test('reads and shows US units when the window does', async () => {
    const { session, form } = await openForm()
    await page.getByText('US', { exact: true }).click()
    const medium = form.getByLabelText('Medium °F')
    await expect.element(medium).toHaveValue('302')
    await medium.fill('212')
    await userEvent.tab()
    expect(session.job.runs[0]?.values.mediumC).toBe(100)
    await medium.fill('2000')
    await userEvent.tab()
    await expect
      .element(form.getByText('"2000" does not fit. Allowed: a number from −328 to 1 832 °F.'))
      .toBeVisible()
  })

  test('a choice from a list is one step', async () => {
    const { session, form } = await openForm()
    const before = session.job
    await form.getByLabelText('Finish').selectOptions('al_painted')
    expect(session.job.runs[0]?.values.finish).toBe('al_painted')
    session.undo()
    expect(session.job).toBe(before)
  })
})
