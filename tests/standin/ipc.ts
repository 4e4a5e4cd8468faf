import { pack, unpack } from './codec.ts'
import { toAppUrl } from './scheme.ts'

type Listener = (event: unknown, ...args: unknown[]) => unknown
const listeners = new Map<string, Listener>()

export const ipcMain = {
  handle(channel: string, listener: Listener): void {
    if (listeners.has(channel))
      throw new Error(`Attempted to register a second handler for '${channel}'`)
    listeners.set(channel, listener)
  },
}

/** Answers one `ipcRenderer.invoke` of a frame; what cannot be cloned is refused, as in Electron. */
export async function answerInvoke(frameUrl: string, text: string): Promise<string> {
  const [channel, args] = unpack(text) as [string, unknown[]]
  try {
    return pack([true, await invokeFrom(toAppUrl(frameUrl), channel, ...args)])
  } catch (error) {
    return pack([false, String(error)])
  }
}

/** What main answers to a frame at that address. */
export async function invokeFrom(
  url: string,
  channel: string,
  ...args: unknown[]
): Promise<unknown> {
  const listener = listeners.get(channel)
  if (!listener) throw new Error(`No handler registered for '${channel}'`)
  const origin = /^[a-z]+:\/\/[^/]*/.exec(url)?.[0] ?? 'null'
  return listener({ senderFrame: { url, origin } }, ...args)
}
