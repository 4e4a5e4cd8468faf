/** The Chromium behind all windows, and the script that every page of it runs first. */
import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { type BrowserContext, chromium, type Page } from 'playwright-core'
import { build, type Rolldown } from 'vite'
import { chromiumLaunch } from '../chromium.ts'
import { browserFolder } from './settings.ts'

interface Browser {
  readonly context: BrowserContext
  /** The page's side of the stand-in, bundled. */
  readonly pageScript: string
}

export const browser: Promise<Browser> = open()

async function open(): Promise<Browser> {
  const [context, pageScript] = await Promise.all([
    chromium.launchPersistentContext(browserFolder, {
      executablePath: chromiumLaunch.executablePath,
      headless: true,
      viewport: null,
      args: [...chromiumLaunch.args, '--remote-debugging-port=0'],
    }),
    bundlePageScript(),
  ])
  return { context, pageScript }
}

async function bundlePageScript(): Promise<string> {
  const lib = {
    entry: join(import.meta.dirname, 'page.ts'),
    formats: ['iife' as const],
    name: 'standin',
  }
  const [output] = (await build({
    configFile: false,
    logLevel: 'error',
    build: { write: false, minify: false, lib },
  })) as Rolldown.RolldownOutput[]
  return output?.output[0].code ?? ''
}

/** Where a test attaches to look at the pages. */
export async function debuggingAddress(): Promise<string> {
  await browser
  const [port] = readFileSync(join(browserFolder, 'DevToolsActivePort'), 'utf8').split('\n')
  return `http://127.0.0.1:${port}`
}

let isFirstTaken = false
/** Chromium opens with one empty page; it is the first window. */
export async function takePage(): Promise<Page> {
  const { context } = await browser
  const [first] = context.pages()
  if (!first || isFirstTaken) return context.newPage()
  isFirstTaken = true
  return first
}
