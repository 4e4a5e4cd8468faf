import { type BrowserWindow, dialog } from 'electron'
import type { Dialogs } from '#backend/handlers.ts'

const filters = [{ name: 'Lagwright job', extensions: ['lagjob'] }]

/** The system's own dialogs for choosing a job file. */
export function nativeDialogs(window: BrowserWindow): Dialogs {
  return {
    async askOpen() {
      const options = { title: 'Open a job', filters, properties: ['openFile' as const] }
      const { canceled, filePaths } = await dialog.showOpenDialog(window, options)
      return canceled ? null : (filePaths[0] ?? null)
    },
    async askSave(suggestedName) {
      const options = { title: 'Save the job as', filters, defaultPath: suggestedName }
      const { canceled, filePath } = await dialog.showSaveDialog(window, options)
      return canceled || !filePath ? null : filePath
    },
  }
}
