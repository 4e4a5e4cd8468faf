import { EventEmitter } from 'node:events'
import { browser } from './browser.ts'
import { preventableEvent } from './event.ts'
import { closeRegistration } from './scheme.ts'
import { isSecondInstance } from './settings.ts'
import { BrowserWindow, windowEvents } from './window.ts'

class App extends EventEmitter {
  readonly #codeLoaded = Promise.withResolvers<void>()
  #isQuitting = false

  constructor() {
    super()
    windowEvents.on('all-closed', () => {
      if (this.#isQuitting) return
      if (this.listenerCount('window-all-closed')) this.emit('window-all-closed')
      else this.quit()
    })
    void browser.then(({ context }) => context.on('close', () => this.exit()))
  }

  /** run.mjs calls this once the entry module has run: as in Electron, `ready` never comes before. */
  codeLoaded(): void {
    this.#codeLoaded.resolve()
  }

  async whenReady(): Promise<void> {
    await Promise.all([this.#codeLoaded.promise, browser])
    closeRegistration()
  }

  /** The stand-in's browser has its profile already: see settings.ts. */
  setPath(_name: string, _path: string): void {}

  requestSingleInstanceLock = (): boolean => !isSecondInstance

  quit(): void {
    if (!this.#isQuitting) void this.#closeAndExit()
  }

  exit(code = 0): void {
    this.#isQuitting = true
    void browser
      .then(({ context }) => context.close())
      .catch(() => {})
      .then(() => process.exit(code))
  }

  async #closeAndExit(): Promise<void> {
    for (const window of BrowserWindow.getAllWindows()) if (!(await window.tryClose())) return
    if (this.#isQuitting) return
    this.#isQuitting = true
    this.emit('will-quit', preventableEvent())
    this.exit()
  }
}

export const app = new App()
