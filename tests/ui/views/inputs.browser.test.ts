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
      .element(form.getByText('"1200" does not fit. Allowed: a number from −200 to 1000 °C.'))
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

  test('asks of a shape what it needs, and nothing else', async () => {
    const { session, form } = await openForm()
    await expect.element(form.getByLabelText('Heads')).not.toBeInTheDocument()
    await form.getByLabelText('Shape').selectOptions('sphere')
    await expect.element(form.getByLabelText('Outside diameter mm')).toBeVisible()
    await expect.element(form.getByLabelText('Length m')).not.toBeInTheDocument()
    await expect.element(form.getByLabelText('Valves')).not.toBeInTheDocument()
    await form.getByLabelText('Shape').selectOptions('vessel')
    await form.getByLabelText('Heads').selectOptions('flat')
    await expect.element(form.getByLabelText('Length m')).toBeVisible()
    expect(session.job.runs[0]?.values).toMatchObject({ shape: 'vessel', heads: 'flat' })
  })

  test('a survey is asked for once a surface was measured', async () => {
    const { form } = await openForm()
    await expect.element(form.getByLabelText('Air that day °C')).not.toBeInTheDocument()
    await form.getByLabelText('Surface, measured °C').fill('48')
    await expect
      .element(form.getByLabelText('Thermometer, ± K'))
      .toHaveAttribute('placeholder', '2')
    await expect
      .element(form.getByLabelText('Air that day °C'))
      .toHaveAttribute('placeholder', 'as the air')
  })

  test('frost is asked for water in pipes, its day once hours are given', async () => {
    const { form } = await openForm()
    await form.getByLabelText('Must not freeze for h').fill('12')
    await expect.element(form.getByLabelText('Air, coldest °C')).toBeVisible()
    await form.getByLabelText('Must not freeze for h').fill('')
    await userEvent.tab()
    await form.getByLabelText('What flows').selectOptions('oil')
    await expect.element(form.getByLabelText('Must not freeze for h')).not.toBeInTheDocument()
  })

  test('a code is chosen by name and edition, and its factors are offered with what for', async () => {
    const { session, form } = await openForm()
    const code = form.getByLabelText('Code table')
    await code.selectOptions('geg-2024-heating')
    expect(session.job.runs[0]?.values.codeTable).toBe('geg-2024-heating')
    await expect.element(code).toHaveDisplayValue(/2024.*heat distribution/)
    const list = form.getByLabelText('Factor on the code').element().getAttribute('list')
    const options = document.querySelectorAll<HTMLOptionElement>(`[id="${list}"] option`)
    expect([...options].map(({ value }) => value)).toContain('0.5')
    expect(options[0]?.label).toMatch(/penetrations/)
  })

  test('a buried run is asked nothing of the weather', async () => {
    const { form } = await openForm([{ ...run, buryDepthM: 0.8, maxLossWPerM: 20 }])
    await expect
      .element(form.getByLabelText('Soil conducts W/mK'))
      .toHaveAttribute('placeholder', '1.5')
    for (const label of ['Wind m/s', 'Humidity %', 'Within reach', 'Lies'])
      await expect.element(form.getByLabelText(label)).not.toBeInTheDocument()
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
