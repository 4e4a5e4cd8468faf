import AxeBuilder from '@axe-core/playwright'
import { expect, test } from './fixture.ts'

const levels = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']

for (const theme of ['Light', 'Dark'])
  for (const place of ['Schedule', 'Catalogue', 'Job'])
    test(`${place}, ${theme.toLowerCase()}, breaks no rule of WCAG 2.2 AA that axe knows`, async ({
      ui,
    }) => {
      const { page } = ui
      await page.getByText(theme, { exact: true }).click()
      await page
        .getByRole('navigation', { name: 'Places' })
        .getByRole('button', { name: place })
        .click()
      await expect(page.getByRole('main')).toBeVisible()
      const { violations } = await new AxeBuilder({ page }).withTags(levels).analyze()
      const found = violations.flatMap(({ id, help, nodes }) =>
        nodes.map(({ html }) => `${id}: ${help}: ${html.slice(0, 160)}`),
      )
      expect(found).toEqual([])
    })
