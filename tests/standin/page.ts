/** The page's side of the stand-in: what `require('electron')` gives a sandboxed preload. */
import { pack, unpack } from './codec.ts'

type Binding = (text: string) => Promise<string>

const toMain = (globalThis as unknown as { toMain: Binding }).toMain
// The page itself must reach main through the preload alone.
delete (globalThis as { toMain?: Binding }).toMain

const ipcRenderer = {
  async invoke(channel: string, ...args: unknown[]): Promise<unknown> {
    const [isAnswered, value] = unpack(await toMain(pack([channel, args]))) as [boolean, unknown]
    if (isAnswered) return value
    throw new Error(`Error invoking remote method '${channel}': ${value}`)
  },
}

const contextBridge = {
  exposeInMainWorld(key: string, api: unknown): void {
    if (Object.hasOwn(globalThis, key))
      throw new Error('Cannot bind an API on top of an existing property on the window object')
    Object.defineProperty(globalThis, key, { value: crossed(api), enumerable: true })
  },
}

/** A sandboxed preload has no other modules. */
export function preloadRequire(name: string): unknown {
  if (name === 'electron') return { contextBridge, ipcRenderer }
  throw new Error(`module not found: ${name}`)
}

/** contextBridge's rules: functions become proxies, promises pass, the rest is cloned and frozen. */
function crossed(value: unknown): unknown {
  if (typeof value === 'function')
    return (...args: unknown[]) => {
      try {
        return crossed(value(...args.map(crossed)))
      } catch (error) {
        throw crossedError(error)
      }
    }
  if (value instanceof Promise)
    return value.then(crossed, (error) => Promise.reject(crossedError(error)))
  if (isPlain(value) && Object.values(value).some((part) => typeof part === 'function'))
    return Object.freeze(
      Object.fromEntries(Object.entries(value).map(([key, part]) => [key, crossed(part)])),
    )
  return structuredClone(value) // a Proxy throws here, as it does in Electron
}

const isPlain = (value: unknown): value is object =>
  typeof value === 'object' && value !== null && Object.getPrototypeOf(value) === Object.prototype

const crossedError = (error: unknown): Error =>
  new Error(error instanceof Error ? error.message : String(error))
