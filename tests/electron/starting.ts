/** Runs `npm start`'s script for a test, in an environment that says nothing of this machine's display. */
import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { join } from 'node:path'
import { text } from 'node:stream/consumers'
import { urlIn } from '../e2e/host.ts'

const program = join(import.meta.dirname, '..', '..')

export interface Started {
  /** The address it printed. */
  url(): Promise<string>
  /** Its exit code, and what it wrote on stderr. */
  ended(): Promise<{ code: number | null; complaints: string }>
  stop(): void
}

export function start(
  dataFolder: string,
  env: Readonly<Record<string, string>>,
  options: readonly string[] = ['--no-open'],
): Started {
  const { DISPLAY: _x, WAYLAND_DISPLAY: _wayland, CI: _ci, ...own } = process.env
  const child = spawn(process.execPath, [join(program, 'electron', 'start.mjs'), ...options], {
    env: { ...own, LAGWRIGHT_DATA: dataFolder, LAGWRIGHT_PORT: '', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  const complaints = text(child.stderr)
  const end = once(child, 'exit') as Promise<[number | null]>
  return {
    url: () => urlIn(child.stdout),
    ended: async () => {
      const [code] = await end
      return { code, complaints: await complaints }
    },
    stop: () => void child.kill('SIGTERM'),
  }
}
