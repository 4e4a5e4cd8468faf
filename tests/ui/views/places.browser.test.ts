import { describe, expect, test } from 'vitest'
import { page, userEvent } from 'vitest/browser'
import { render } from 'vitest-browser-svelte'
import '#ui/theme.css'
import App from '#ui/App.svelte'
import { jobOf, startWorkspace, TestFile } from '../workspace.ts'

async function open(place: string) {
  await page.viewport(1440, 900)
  const workspace = await startWorkspace(new TestFile(jobOf([{ tag: 'A' }])))
  await render(App, { workspace })
  await page.getByRole('navigation', { name: 'Places' }).getByText(place, { exact: true }).click()
  return workspace
}

describe('the catalogue', () => {
  test('is searched in all tables at once, and says how far a row can be trusted', async () => {
    await open('Catalogue')
    await page.getByLabelText('Search the catalogue').fill('lamella')
    await expect.element(page.getByRole('rowheader', { name: /lamella mat/ })).toBeVisible()
    await expect.element(page.getByText('verify against your own copy').first()).toBeVisible()
    await expect.element(page.getByRole('button', { name: 'Fuels 0' })).toBeVisible()
  })

  test('says what to do where nothing is found', async () => {
    await open('Catalogue')
    await page.getByLabelText('Search the catalogue').fill('no such thing')
    await expect.element(page.getByText('Nothing here has all of these words.')).toBeVisible()
  })
})

describe('the job', () => {
  test('gives all runs a value; what is not valid stays in the field and the job keeps what it had', async () => {
    const { session } = await open('Job')
    const air = page.getByLabelText('Air °C')
    await air.fill('25')
    await userEvent.tab()
    expect(session.job.defaults.airC).toBe(25)
    await air.fill('mild')
    await userEvent.tab()
    await expect.element(air).toHaveValue('mild')
    await expect.element(page.getByText('Give a number from -70 to 200 °C.')).toBeVisible()
    expect(session.job.defaults.airC).toBe(25)
    session.undo()
    expect(session.job.defaults.airC).toBe(20)
  })

  test('is named in the header as well', async () => {
    const { session } = await open('Job')
    await page.getByLabelText('Name', { exact: true }).fill('Boiler house')
    await userEvent.tab()
    expect(session.job.name).toBe('Boiler house')
    await expect.element(page.getByLabelText('Name of the job')).toHaveValue('Boiler house')
  })
})
