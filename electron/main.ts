/** The desktop shell: one window on the same page and the same backend as the loopback host. */
import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { app, BrowserWindow, Menu, session } from 'electron'
import { dataFolder } from '#backend/data-folder.ts'
import { makeHandlers } from '#backend/handlers.ts'
import { nativeDialogs } from './dialogs.ts'
import { answerCalls } from './ipc.ts'
import { declareScheme, pageUrl, servePage } from './scheme.ts'
import { keepBounds, savedBounds } from './window-bounds.ts'

const program = join(import.meta.dirname, '..', '..')

const folder = dataFolder()

// Chromium's own profile goes where the rest is, and with it the lock that keeps a second start out.
app.setPath('userData', join(folder, 'shell'))
declareScheme()
// Never awaited at the top level: Electron sends `ready` only once this module has run.
if (app.requestSingleInstanceLock()) void app.whenReady().then(start).catch(giveUp)
else app.quit()

/** A shell that cannot start ends with an error, so that `npm start` goes on to the browser. */
function giveUp(error: unknown): void {
  console.error(`Lagwright cannot start its window: ${String(error)}`)
  app.exit(1)
}

async function start(): Promise<void> {
  mkdirSync(folder, { recursive: true })
  refusePermissions()
  servePage(join(program, 'dist', 'ui'))
  // The window has its own commands; only macOS cannot do without a menu (copy, paste and quit live there).
  if (process.platform !== 'darwin') Menu.setApplicationMenu(null)

  const boundsFile = join(folder, 'window.json')
  const window = new BrowserWindow({
    ...savedBounds(boundsFile),
    minWidth: 900,
    minHeight: 480,
    title: 'Lagwright',
    icon: join(program, 'electron', 'icons', 'icon.png'),
    show: false,
    webPreferences: {
      preload: join(program, 'dist', 'preload', 'preload.cjs'),
      sandbox: true,
      contextIsolation: true,
      nodeIntegration: false,
      spellcheck: false,
    },
  })
  keepBounds(window, boundsFile)
  window.once('ready-to-show', () => window.show())
  window.webContents.setWindowOpenHandler(() => ({ action: 'deny' }))
  window.webContents.on('will-navigate', (event) => event.preventDefault())
  window.webContents.on('will-attach-webview', (event) => event.preventDefault())

  const backend = makeHandlers({
    dataFolder: folder,
    dbFolder: join(program, 'db'),
    dialogs: nativeDialogs(window),
    kind: 'desktop',
  })
  answerCalls(backend.handlers)

  app.on('second-instance', () => {
    if (window.isMinimized()) window.restore()
    window.focus()
  })
  app.on('window-all-closed', () => app.quit())
  app.on('will-quit', () => backend.close())

  await window.loadURL(pageUrl)
}

function refusePermissions(): void {
  session.defaultSession.setPermissionRequestHandler((_contents, _permission, done) => done(false))
  session.defaultSession.setPermissionCheckHandler(() => false)
}
