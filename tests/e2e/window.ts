/** What the end-to-end tests do in the window, as a person does it. */
import type { Locator, Page } from '@playwright/test'
import { expect } from './fixture.ts'

export const cell = (page: Page, tag: string, column: string): Locator =>
  page
    .locator('tbody tr')
    .filter({ has: page.locator('td.tag', { hasText: new RegExp(`^\\s*${tag}\\s*$`) }) })
    .locator(`td.${column}`)

export async function type(page: Page, tag: string, column: string, text: string): Promise<void> {
  await cell(page, tag, column).click()
  await page.keyboard.type(text)
  await page.keyboard.press('Enter')
}

/** Pastes as a spreadsheet does, into whatever has the keyboard. */
export async function paste(page: Page, text: string): Promise<void> {
  await page.evaluate((plain) => {
    const clipboardData = new DataTransfer()
    clipboardData.setData('text/plain', plain)
    const event = new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true })
    document.activeElement?.dispatchEvent(event)
  }, text)
}

export async function newJob(page: Page): Promise<void> {
  await expect(page.getByRole('grid')).toBeVisible()
  await page.keyboard.press('Alt+n')
  await expect(page.getByRole('heading', { name: 'Start with the runs' })).toBeVisible()
}
