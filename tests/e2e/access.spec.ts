/** Every screen, in both themes, under axe: nothing that keeps anyone out. */
import { AxeBuilder } from '@axe-core/playwright'
import type { Page } from '@playwright/test'
import { expect, test } from './fixture.ts'
import { cell, paste } from './window.ts'

async function violations(page: Page): Promise<string[]> {
  const { violations: found } = await new AxeBuilder({ page }).analyze()
  return found.flatMap(({ id, nodes }) => nodes.map(({ html }) => `${id}: ${html.slice(0, 160)}`))
}

const screens: readonly { readonly name: string; readonly go: (page: Page) => Promise<void> }[] = [
  { name: 'the schedule', go: async () => {} },
  {
    name: 'the take-off and the form',
    go: async (page) => {
      await page.getByText('Take-off', { exact: true }).click()
      await page.getByText('Inputs', { exact: true }).click()
    },
  },
  {
    name: 'a survey and what moves the answer',
    go: async (page) => {
      await cell(page, 'ST-106', 'description').click()
      await expect(page.getByRole('table', { name: 'As measured' })).toBeVisible()
      await page.getByRole('tab', { name: 'Sensitivity' }).click()
    },
  },
  {
    name: 'the form of a buried run',
    go: async (page) => {
      // Far down: only the lines in sight are there to be clicked.
      await page.getByPlaceholder(/^Filter/).fill('LH-414')
      await cell(page, 'LH-414', 'description').click()
      await page.getByText('Inputs', { exact: true }).click()
    },
  },
  {
    name: 'a wrong cell',
    go: async (page) => {
      await page.locator('td.mediumC').first().click()
      await page.keyboard.type('hot')
      await page.keyboard.press('Enter')
      await page.keyboard.press('ArrowUp')
    },
  },
  { name: 'the catalogue', go: (page) => page.keyboard.press('Alt+2') },
  { name: 'the job', go: (page) => page.keyboard.press('Alt+3') },
  { name: 'an empty job', go: (page) => page.keyboard.press('Alt+n') },
  {
    name: 'the columns of a foreign list',
    go: async (page) => {
      await page.getByRole('grid').focus()
      await paste(page, 'Line No\tPipe size\tRemark\nL-1\tDN 50\tby the door')
    },
  },
  { name: 'a dialog', go: (page) => page.keyboard.press('Control+o') },
]

// axe reads every element, which takes its time on a machine that does other things.
test.setTimeout(90_000)

for (const theme of ['Light', 'Dark'] as const) {
  for (const { name, go } of screens) {
    test(`${name}, ${theme.toLowerCase()}`, async ({ ui: { page } }) => {
      await expect(page.locator('td.lagging').first()).toHaveText(/\d/)
      await page.getByText(theme, { exact: true }).click()
      await go(page)
      // What moves in has to be there before it is looked at.
      await page.waitForTimeout(300)
      expect(await violations(page)).toEqual([])
    })
  }
}
