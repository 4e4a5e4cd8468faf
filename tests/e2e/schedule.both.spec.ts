/** The window on the real backend, as a person works it. */
import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { expect, test } from './fixture.ts'
import { cell, newJob, paste, type } from './window.ts'

test('the first start shows the demo, sized', async ({ ui: { page } }) => {
  await expect(page.getByLabel('Name of the job')).toHaveValue('Harrowmere Creamery')
  await expect(cell(page, 'ST-101', 'lagging')).toHaveText(/^\d+$/)
  await expect(page.getByRole('article', { name: 'Run sheet' })).toContainText('ST-101')
  // The grid and the panel scroll, the page as a whole does not.
  expect(
    await page.evaluate(() => {
      const { scrollHeight, clientHeight, scrollWidth, clientWidth } = document.documentElement
      return [scrollHeight - clientHeight, scrollWidth - clientWidth]
    }),
  ).toEqual([0, 0])
})

test('a run is added, sized, given another finish and undone', async ({ ui: { page } }) => {
  await newJob(page)
  await page.getByRole('button', { name: 'Add a run' }).click()
  await page.keyboard.type('ST-1')
  await page.keyboard.press('Tab')
  await page.keyboard.type('Steam to kettle')
  await page.keyboard.press('Tab')
  await page.keyboard.type('DN 50')
  await page.keyboard.press('Enter')
  await page.getByText('Inputs', { exact: true }).click()
  const form = page.getByRole('form')
  await form.getByLabel('Medium °C').fill('170')
  await form.getByLabel('Air °C', { exact: true }).fill('25')
  await form
    .getByLabel('Lagging', { exact: true })
    .selectOption({ label: 'Stone (rock) wool pipe section' })
  await form.getByLabel('Finish').selectOption('al_plain')
  // Sized while the form is still open.
  await expect(cell(page, 'ST-1', 'lagging')).toHaveText(/^\d+$/)
  const surface = (await cell(page, 'ST-1', 'surface').textContent()) ?? ''

  await form.getByLabel('Finish').selectOption('al_painted')
  await expect(cell(page, 'ST-1', 'surface')).not.toHaveText(surface)
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(cell(page, 'ST-1', 'surface')).toHaveText(surface)
  await expect(form.getByLabel('Finish')).toHaveValue('al_plain')
})

test('what is typed is there again after the program was killed', async ({ ui }) => {
  const { page } = ui
  await expect(page.getByRole('grid')).toBeVisible()
  await type(page, 'ST-104', 'lengthM', '77.5')
  await expect(page.getByText(/^Saved \d\d:\d\d/)).toBeVisible()
  const again = await ui.reopenAfterKill()
  await expect(cell(again, 'ST-104', 'lengthM')).toHaveText('77.5')
})

test('a take-off pasted with its header is sized; a bad cell keeps its text and says what may stand there', async ({
  ui: { page },
}) => {
  await newJob(page)
  await page.getByLabel('Paste from a spreadsheet here').focus()
  await paste(
    page,
    [
      'tag\tsize\tlength_m\tmedium_c\tair_c\tmaterial\tfinish',
      'HW-1\tDN 25\t12,5\t60\t20\tstone_wool_pipe_section\tal_plain',
      'HW-2\tDN 40\tlong\t60\t20\tstone_wool_pipe_section\tal_plain',
    ].join('\n'),
  )
  await expect(cell(page, 'HW-1', 'lagging')).toHaveText(/^\d+$/)
  await expect(cell(page, 'HW-1', 'lengthM')).toHaveText('12.5')
  await expect(cell(page, 'HW-2', 'lengthM')).toHaveText('long')
  await cell(page, 'HW-2', 'lengthM').click()
  await expect(page.getByText('HW-2, Length')).toBeVisible()
  await expect(page.getByText('a number from 0 to 1000000 m').first()).toBeVisible()
  await type(page, 'HW-2', 'lengthM', '8')
  await expect(cell(page, 'HW-2', 'lagging')).toHaveText(/^\d+$/)
})

test('a foreign take-off is pasted into an empty job by keyboard, once its columns are told', async ({
  ui: { page },
}) => {
  await newJob(page)
  await page.getByLabel('Paste from a spreadsheet here').focus()
  await paste(
    page,
    [
      'Line No\tPipe size\tLength (m)\tFluid temp °C\tRoom temp\tInsulation\tCladding\tBy',
      'L-1\tDN 50\t12\t80\t18\tstone wool pipe section\tal_plain\tA. N.',
    ].join('\n'),
  )
  const dialog = page.getByRole('dialog', { name: 'Which column is what?' })
  await expect(dialog.getByText('Left out: By')).toBeVisible()
  await expect(dialog.getByLabel('Line No is read as')).toBeFocused()
  const go = dialog.getByRole('button', { name: 'Paste 1 run' })
  for (let tabs = 0; tabs < 8; tabs++) await page.keyboard.press('Tab')
  await expect(go).toBeFocused()
  await page.keyboard.press('Enter')
  await expect(cell(page, 'L-1', 'lagging')).toHaveText(/^\d+$/)
  await expect(page.getByRole('grid')).toBeFocused()
})

test('units and theme can be switched at any time and stay', async ({ ui, dataFolder }) => {
  const { page } = ui
  await expect(cell(page, 'ST-101', 'lagging')).toHaveText(/^\d+$/)
  await page.getByText('US', { exact: true }).click()
  await expect(cell(page, 'ST-101', 'lagging')).toHaveText(/^\d\.\d\d$/)
  await page.getByText('Dark', { exact: true }).click()
  // A window that is shut in the same breath may forget its last preference: they are kept a moment after the click.
  await expect
    .poll(() => readFile(join(dataFolder, 'preferences.json'), 'utf8').catch(() => ''))
    .toContain('"theme": "dark"')
  const again = await ui.reopen()
  await expect(cell(again, 'ST-101', 'lagging')).toHaveText(/^\d\.\d\d$/)
  await expect(again.locator('html')).toHaveAttribute('data-theme', 'dark')
})
