/** A window is a page of Chromium. */
import { EventEmitter, once } from 'node:events'
import { readFileSync } from 'node:fs'
import type { Page } from 'playwright-core'
import { browser, takePage } from './browser.ts'
import { preventableEvent } from './event.ts'
import { answerInvoke } from './ipc.ts'
import { answerRequests, toBrowserUrl } from './scheme.ts'

interface Bounds {
  x: number
  y: number
  width: number
  height: number
}

interface WindowOptions extends Partial<Bounds> {
  readonly webPreferences?: {
    readonly preload?: string
    readonly sandbox?: boolean
    readonly contextIsolation?: boolean
    readonly nodeIntegration?: boolean
  }
}

/** Emits `all-closed` once the last window is gone. */
export const windowEvents = new EventEmitter()
const windows = new Set<BrowserWindow>()

/** What pages logged as errors, from their first line on: a test attaches too late for those. */
export const pageErrors: string[] = []

class WebContents extends EventEmitter {
  /** Accepted, and left to Electron: this Chromium is not under its control. */
  setWindowOpenHandler(): void {}
}

export class BrowserWindow extends EventEmitter {
  static getAllWindows = (): BrowserWindow[] => [...windows]

  readonly webContents = new WebContents()
  /** How often the program asked for the focus. */
  focused = 0
  readonly #bounds: Bounds
  readonly #page: Promise<Page>

  constructor(options: WindowOptions = {}) {
    super()
    const { x = 0, y = 0, width = 800, height = 600, webPreferences = {} } = options
    const { sandbox = true, contextIsolation = true, nodeIntegration = false } = webPreferences
    if (!sandbox || !contextIsolation || nodeIntegration)
      throw new Error('stand-in: only sandboxed and isolated windows')
    this.#bounds = { x, y, width, height }
    windows.add(this)
    this.#page = this.#open(webPreferences.preload)
  }

  async loadURL(url: string): Promise<void> {
    const page = await this.#page
    await page.goto(toBrowserUrl(url))
  }

  /** Asks the window to close; false where it refused. */
  async tryClose(): Promise<boolean> {
    const event = preventableEvent()
    this.emit('close', event)
    if (event.defaultPrevented) return false
    const page = await this.#page
    if (page.isClosed()) return true
    const closed = once(this, 'closed')
    await page.close()
    await closed
    return true
  }

  getNormalBounds = (): Bounds => this.#bounds
  setBounds = (bounds: Partial<Bounds>): void => void Object.assign(this.#bounds, bounds)
  isMinimized = (): boolean => false
  restore(): void {}
  show(): void {}
  focus(): void {
    this.focused += 1
  }
  async #open(preload: string | undefined): Promise<Page> {
    const page = await takePage()
    await page.setViewportSize({ width: this.#bounds.width, height: this.#bounds.height })
    await answerRequests(page)
    await page.exposeBinding('toMain', ({ frame }, text: string) => answerInvoke(frame.url(), text))
    if (preload) await page.addInitScript(await withPreload(preload))
    page.on('pageerror', (error) => pageErrors.push(error.message))
    page.on('console', (message) => {
      if (message.type() === 'error') pageErrors.push(message.text())
    })
    page.on('load', () => this.emit('ready-to-show'))
    page.once('close', () => {
      windows.delete(this)
      this.emit('closed')
      if (windows.size === 0) windowEvents.emit('all-closed')
    })
    return page
  }
}

/** The real preload's text, run with nothing but the sandbox's `require`. */
async function withPreload(file: string): Promise<string> {
  const { pageScript } = await browser
  return `if (window === top && location.protocol !== 'about:') {
${pageScript};
((require, module, exports) => {
${readFileSync(file, 'utf8')}
})(standin.preloadRequire, { exports: {} }, {});
}`
}
