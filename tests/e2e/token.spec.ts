import { expect, test } from './fixture.ts'
import { runHost } from './host.ts'

test('the key leaves the address bar, survives a reload and is not shared with another tab', async ({
  dataFolder,
  context,
}) => {
  const host = await runHost(dataFolder)
  const page = await context.newPage()
  const calls: number[] = []
  page.on('response', (response) => {
    if (response.url().endsWith('/call')) calls.push(response.status())
  })
  await page.goto(host.url)
  await expect.poll(() => calls.length).toBeGreaterThan(0)
  expect(page.url()).not.toContain('token')
  const before = calls.length
  await page.reload()
  await expect.poll(() => calls.length).toBeGreaterThan(before)
  expect(calls.every((status) => status === 200)).toBe(true)

  const other = await context.newPage()
  const refused = other.waitForResponse((response) => response.url().endsWith('/call'))
  await other.goto(new URL(host.url).origin)
  expect((await refused).status()).toBe(403)
  await expect(other.getByText('This page has no key to Lagwright.')).toBeVisible()
  await host.stop()
})

test('the host ends cleanly when it is told to', async ({ dataFolder }) => {
  const host = await runHost(dataFolder)
  expect((await fetch(new URL(host.url).origin)).status).toBe(200)
  expect(await host.stop()).toBe(0)
  await expect(fetch(new URL(host.url).origin)).rejects.toThrow()
})
