import { describe, expect, test } from 'vitest'
import { page, userEvent } from 'vitest/browser'
import { render } from 'vitest-browser-svelte'
import { setJobName } from '#model/edits.ts'
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
    await expect.element(page.getByText('Give a number from −70 to 200 °C.')).toBeVisible()
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

  test('leads back to drafts that were left', async () => {
    const file = new TestFile(jobOf([{ tag: 'A' }]))
    const savedAt = '2026-03-01T12:04:00.000Z'
    file.drafts = [{ path: '/data/drafts/1.lagjob', name: 'Pump house', runs: 12, savedAt }]
    const workspace = await startWorkspace(file)
    await render(App, { workspace })
    await page.getByRole('navigation', { name: 'Places' }).getByText('Job', { exact: true }).click()
    await expect.element(page.getByText(/12 runs, saved 1 Mar 2026/)).toBeVisible()
    const before = workspace.session.opened
    await page.getByRole('button', { name: 'Open the draft Pump house' }).click()
    await expect.poll(() => workspace.session.opened).toBe(before + 1)
  })
})

test('a window that is behind its file is offered what helps: to copy what changed, and to reopen', async () => {
  const file = new TestFile(jobOf([{ tag: 'A' }]))
  const workspace = await startWorkspace(file)
  await render(App, { workspace })
  file.revision = 4
  workspace.session.edit(setJobName, 'Behind')
  const alert = page.getByRole('alert').filter({ hasText: 'This window is behind its file' })
  await expect.element(alert).toBeVisible()
  await expect.element(alert.getByText('Try again')).not.toBeInTheDocument()
  await alert.getByRole('button', { name: 'Reopen the job' }).click()
  await expect.element(page.getByText('This window is behind')).not.toBeInTheDocument()
  expect(workspace.session.job.name).toBe('Test job')
})
