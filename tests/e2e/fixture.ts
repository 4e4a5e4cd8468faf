/**
 * What every end-to-end test starts from: the program, opened on an empty data folder. The project `host` opens it by the
 * loopback host; `app` by the real main and preload bundles on the stand-in for Electron (*.both.spec.ts, *.app.spec.ts).
 */
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { type Browser, test as base, expect, type Page } from '@playwright/test'
import { type LaunchedApp, launchApp } from '../standin/launch.ts'
import { runHost } from './host.ts'

export { expect } from '@playwright/test'

interface Ui {
  readonly page: Page
  /** What the page logged as an error so far; a test that ends with any fails. */
  readonly problems: string[]
  /** Quits the program and starts it again on the same data. */
  reopen(): Promise<Page>
  /** As `reopen`, but the program is killed. */
  reopenAfterKill(): Promise<Page>
}

interface Fixtures {
  readonly dataFolder: string
  readonly ui: Ui
  /** The program on the stand-in, for what only the desktop shell does. */
  readonly app: LaunchedApp
}

export const test = base.extend<Fixtures>({
  // biome-ignore lint/correctness/noEmptyPattern: Playwright reads which fixtures this one needs
  dataFolder: async ({}, use) => {
    const folder = await mkdtemp(join(tmpdir(), 'lagwright-e2e-'))
    await use(folder)
    // Chromium may still be writing just after a kill.
    await rm(folder, { recursive: true, force: true, maxRetries: 10, retryDelay: 200 })
  },
  app: async ({ dataFolder }, use) => {
    const app = await launchApp(dataFolder)
    await use(app)
    await app.close()
  },
  ui: async ({ dataFolder, browser }, use, info) => {
    const problems: string[] = []
    const open = info.project.name === 'app' ? openApp : openHost
    let opened = await open(dataFolder, browser, problems)
    const reopenAfter = async (end: 'close' | 'kill'): Promise<Page> => {
      await opened[end]()
      opened = await open(dataFolder, browser, problems)
      return opened.page
    }
    await use({
      problems,
      get page() {
        return opened.page
      },
      reopen: () => reopenAfter('close'),
      reopenAfterKill: () => reopenAfter('kill'),
    })
    await opened.close()
    expect(problems, 'the page logged errors').toEqual([])
  },
})

interface Opened {
  readonly page: Page
  close(): Promise<unknown>
  kill(): Promise<unknown>
}

async function openApp(dataFolder: string, _browser: Browser, problems: string[]): Promise<Opened> {
  const app = await launchApp(dataFolder)
  problems.push(...(await app.main(({ pageErrors }) => pageErrors, null)))
  watch(app.page, problems)
  return app
}

async function openHost(dataFolder: string, browser: Browser, problems: string[]): Promise<Opened> {
  const host = await runHost(dataFolder)
  const context = await browser.newContext({ viewport: { width: 1280, height: 800 } })
  const page = await context.newPage()
  watch(page, problems)
  await page.goto(host.url)
  const end = async (stop: () => Promise<unknown>) => {
    await context.close()
    await stop()
  }
  return { page, close: () => end(host.stop), kill: () => end(host.kill) }
}

function watch(page: Page, problems: string[]): void {
  page.on('console', (message) => {
    if (message.type() === 'error') problems.push(message.text())
  })
  page.on('pageerror', (error) => problems.push(error.message))
}
