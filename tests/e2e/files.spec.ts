/** Files by their path, as the loopback host asks for it; the desktop shell has a dialog of its own for that. */
import { writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { expect, test } from './fixture.ts'
import { cell, newJob, type } from './window.ts'

test('saved under another name, reopened, the job is the same', async ({ ui, dataFolder }) => {
  const { page } = ui
  await expect(page.getByRole('grid')).toBeVisible()
  await type(page, 'ST-104', 'lengthM', '55')
  await page.keyboard.press('Control+Shift+S')
  const path = join(dataFolder, 'Creamery.lagjob')
  await page.getByLabel('Path').fill(path)
  await page.getByRole('button', { name: 'Save', exact: true }).click()
  await expect(page.getByRole('dialog')).toBeHidden()
  const lagging = (await cell(page, 'ST-104', 'lagging').textContent()) ?? ''
  await newJob(page)
  await page.keyboard.press('Control+o')
  await page.getByLabel('Path').fill(path)
  await page.getByRole('button', { name: 'Open', exact: true }).click()
  await expect(cell(page, 'ST-104', 'lengthM')).toHaveText('55.0')
  await expect(cell(page, 'ST-104', 'lagging')).toHaveText(lagging)
  await page.getByRole('button', { name: 'Job', exact: true }).first().click()
  await expect(page.getByText(path)).toBeVisible()
})

test('a foreign file is refused in a sentence, and what is open stays', async ({
  ui,
  dataFolder,
}) => {
  const { page } = ui
  const path = join(dataFolder, 'letter.lagjob')
  await writeFile(path, 'Dear reader')
  await expect(page.getByRole('grid')).toBeVisible()
  await page.keyboard.press('Control+o')
  await page.getByLabel('Path').fill(path)
  await page.getByRole('button', { name: 'Open', exact: true }).click()
  await expect(page.getByRole('alert').filter({ hasText: 'is not a Lagwright job' })).toBeVisible()
  await page.keyboard.press('Escape')
  await expect(page.getByLabel('Name of the job')).toHaveValue('Harrowmere Creamery')
})
