/** A stand-in for the module `electron`: what this program uses of it, with Chromium for a window. */
import { app } from './app.ts'
import { debuggingAddress } from './browser.ts'
import { invokeFrom, ipcMain } from './ipc.ts'
import { protocol } from './scheme.ts'
import { BrowserWindow, pageErrors } from './window.ts'

export { app, BrowserWindow, ipcMain, protocol }

/** A test puts its own answers in place of these. */
export const dialog = {
  showSaveDialog: async (..._options: unknown[]) => ({ canceled: true, filePath: '' }),
  showOpenDialog: async (..._options: unknown[]) => ({ canceled: true, filePaths: [''] }),
}

export const session = {
  defaultSession: { setPermissionRequestHandler() {}, setPermissionCheckHandler() {} },
}

export const screen = {
  getAllDisplays: () => [{ workArea: { x: 0, y: 0, width: 1920, height: 1080 } }],
}

export const Menu = { setApplicationMenu() {} }

/** What a test may use in main: the module's own, a call as if from any frame, what the page logged. */
const electron = {
  app,
  BrowserWindow,
  dialog,
  invokeFrom,
  ipcMain,
  pageErrors,
  protocol,
  screen,
  session,
}
export type StandIn = typeof electron

/** One function of a test to be run here, in the main process. */
interface Order {
  readonly id: number
  readonly code: string
  readonly arg: unknown
}

process.on('message', async ({ id, code, arg }: Order) => {
  try {
    // biome-ignore lint/security/noGlobalEval: the test's own function, sent over as its text
    const run = globalThis.eval(`(${code})`) as (e: StandIn, arg: unknown) => unknown
    process.send?.({ id, isDone: true, value: await run(electron, arg) })
  } catch (error) {
    process.send?.({ id, isDone: false, value: String(error) })
  }
})
process.on('disconnect', () => app.exit())
void debuggingAddress().then((value) => process.send?.({ id: 0, isDone: true, value }))
