/** Runs the command line as a user does: a process of its own, files of its own. */
import { spawn } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { onTestFinished } from 'vitest'

export const program = join(import.meta.dirname, '../..')
const main = join(program, 'src/cli/main.ts')
export const demoFile = join(program, 'db/demo/harrowmere-creamery.csv')

export interface Ended {
  readonly code: number | null
  readonly out: string
  readonly err: readonly string[]
}

export interface Place {
  readonly folder: string
  /** Writes a file into the folder and gives its name. */
  readonly put: (name: string, content: string | Uint8Array) => string
  readonly lagwright: (...words: readonly string[]) => Promise<Ended>
  readonly lagwrightReading: (
    input: string | Uint8Array,
    ...words: readonly string[]
  ) => Promise<Ended>
}

/** A folder that goes when the test ends, with a catalogue of its own. */
export function place(): Place {
  const folder = mkdtempSync(join(tmpdir(), 'lagwright-cli-'))
  onTestFinished(() => rmSync(folder, { recursive: true, force: true, maxRetries: 3 }))
  const data = mkdtempSync(join(tmpdir(), 'lagwright-data-'))
  onTestFinished(() => rmSync(data, { recursive: true, force: true, maxRetries: 3 }))
  const env = { ...process.env, LAGWRIGHT_DATA: data }
  const reading = (input: string | Uint8Array, words: readonly string[]) =>
    ended(process.execPath, [main, ...words], { cwd: folder, env, input })
  return {
    folder,
    put: (name, content) => {
      writeFileSync(join(folder, name), content)
      return name
    },
    lagwright: (...words) => reading('', words),
    lagwrightReading: (input, ...words) => reading(input, words),
  }
}

interface Surroundings {
  readonly cwd: string
  readonly env: NodeJS.ProcessEnv
  readonly input?: string | Uint8Array
}

export function ended(
  command: string,
  words: readonly string[],
  around: Surroundings,
): Promise<Ended> {
  return new Promise((resolve, reject) => {
    const child = spawn(command, words, { cwd: around.cwd, env: around.env })
    const out: Buffer[] = []
    const err: Buffer[] = []
    child.stdout.on('data', (chunk: Buffer) => out.push(chunk))
    child.stderr.on('data', (chunk: Buffer) => err.push(chunk))
    child.on('error', reject)
    child.on('close', (code) =>
      resolve({
        code,
        out: Buffer.concat(out).toString(),
        err: Buffer.concat(err).toString().split('\n').filter(Boolean),
      }),
    )
    // A program that refuses before it reads closes its end.
    child.stdin.on('error', () => undefined)
    child.stdin.end(around.input ?? '')
  })
}

export const goodList = `tag,shape,size,length_m,medium_c,air_c,material,finish,max_loss_w_m
A-1,pipe,DN 50,10,80,20,stone_wool_pipe_section,al_plain,20
A-2,pipe,DN 80,5,80,20,stone_wool_pipe_section,al_plain,25
`

/** Processes of their own take their time on a busy machine. */
export const slow = { timeout: 60_000 }
