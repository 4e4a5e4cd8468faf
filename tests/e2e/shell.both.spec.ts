import { expect, test } from './fixture.ts'

test('opens without a word in the console, under the content security policy', async ({ ui }) => {
  await expect(ui.page).toHaveTitle(/Lagwright/)
  await expect(ui.page.locator('body')).not.toBeEmpty()
  const policy = await ui.page.evaluate(async () => {
    const response = await fetch(location.href)
    return response.headers.get('content-security-policy')
  })
  expect(policy).toContain("default-src 'none'")
})

test('the page can neither run text as code nor reach another address', async ({ ui }) => {
  const refused = await ui.page.evaluate(async () => {
    // From a timer, since the debugger that runs this function may do what the page itself may not.
    const attempt = (work: () => unknown) =>
      new Promise((resolve) => {
        setTimeout(async () => {
          try {
            await work()
            resolve('allowed')
          } catch {
            resolve('refused')
          }
        })
      })
    return {
      eval: await attempt(() => Function('return 1')()),
      fetch: await attempt(() => fetch('https://example.org/')),
      html: await attempt(() => {
        document.createElement('div').innerHTML = '<b>x</b>'
      }),
    }
  })
  expect(refused).toEqual({ eval: 'refused', fetch: 'refused', html: 'refused' })
  // Each refusal is also logged, which here is what was asked for.
  ui.problems.length = 0
})

test('starts again on the same data', async ({ ui }) => {
  const page = await ui.reopen()
  await expect(page).toHaveTitle(/Lagwright/)
})
