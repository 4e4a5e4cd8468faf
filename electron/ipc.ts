import { ipcMain } from 'electron'
import type { Handlers } from '#contract/host.ts'
import { serve } from '#contract/wire.ts'
import { pageOrigin } from './scheme.ts'

/** Binds the contract to the one channel that the preload knows. */
export function answerCalls(handlers: Handlers): void {
  const answer = serve(handlers, (reference, name, error) =>
    console.error(`[${reference}] ${name}:`, error),
  )
  ipcMain.handle('call', (event, name: unknown, input: unknown) => {
    if (event.senderFrame?.origin !== pageOrigin) throw new Error('Refused: unknown sender.')
    return answer(name, input)
  })
}
