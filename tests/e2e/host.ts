import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { join } from 'node:path'
import { createInterface } from 'node:readline'

const program = join(import.meta.dirname, '..', '..')

export interface RunningHost {
  readonly url: string
  /** Stops it as Ctrl+C would; its exit code. */
  stop(): Promise<number | null>
  /** Ends it at once, as a power cut would. */
  kill(): Promise<void>
}

/** Starts the built loopback host on a data folder of its own. */
export async function runHost(dataFolder: string): Promise<RunningHost> {
  const child = spawn(process.execPath, [join(program, 'dist', 'host', 'host.js')], {
    env: { ...process.env, LAGWRIGHT_DATA: dataFolder, LAGWRIGHT_PORT: '' },
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  const gone = once(child, 'exit') as Promise<[number | null]>
  const ended = async (signal: NodeJS.Signals): Promise<number | null> => {
    child.kill(signal)
    const [code] = await gone
    return code
  }
  const url = await Promise.race([
    urlIn(child.stdout),
    gone.then(([code]) => Promise.reject(new Error(`The host ended with ${code}.`))),
  ])
  return {
    url,
    stop: () => ended('SIGTERM'),
    kill: async () => void (await ended('SIGKILL')),
  }
}

/** The address in what a host prints. */
export async function urlIn(output: NodeJS.ReadableStream): Promise<string> {
  for await (const line of createInterface({ input: output })) {
    const [url] = /http:\/\/\S+/.exec(line) ?? []
    if (url) return url
  }
  throw new Error('The host printed no address.')
}
