import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { mkdtemp, readFile, rm } from 'node:fs/promises'
import { createRequire } from 'node:module'
import { tmpdir } from 'node:os'
import { dirname, join } from 'node:path'

export const program: string = join(import.meta.dirname, '..', '..')
const require = createRequire(import.meta.url)

interface Options {
  readonly env?: Readonly<Record<string, string>>
  /** Whether its output is ours; the default. */
  readonly isShown?: boolean
}

/** Runs a program; its exit code. */
export async function runCommand(
  command: string,
  args: readonly string[],
  { env = {}, isShown = true }: Options = {},
): Promise<number> {
  const stdio = isShown ? 'inherit' : 'ignore'
  const options = { cwd: program, stdio, env: { ...process.env, ...env } } as const
  const child = spawn(command, args, options)
  const failure = once(child, 'error').then(([error]) => {
    console.error(`${command} cannot be started: ${error}`)
    return 127
  })
  const end = once(child, 'exit').then(([code]) => (typeof code === 'number' ? code : 1))
  return Promise.race([failure, end])
}

/** Runs an installed tool under this very Node, whatever `node` on PATH is. */
export async function runTool(
  tool: Tool,
  args: readonly string[],
  options: Options = {},
): Promise<number> {
  return runCommand(process.execPath, [scriptOf(tool), ...args], options)
}

/** Gives a tool a file to write its JSON report to; what it wrote, or null. */
export async function withReport(
  work: (file: string) => Promise<number>,
): Promise<{ exitCode: number; report: unknown }> {
  const folder = await mkdtemp(join(tmpdir(), 'lagwright-report-'))
  try {
    const file = join(folder, 'report.json')
    const exitCode = await work(file)
    return { exitCode, report: await readJson(file) }
  } finally {
    await rm(folder, { recursive: true, force: true })
  }
}

export interface Tool {
  readonly package: string
  /** Its name under `bin` in its package.json, where that differs from the package's own. */
  readonly bin?: string
}

function scriptOf({ package: name, bin = name }: Tool): string {
  const file = packageFile(name)
  const { bin: bins } = require(file) as { bin: string | Record<string, string> }
  const script = typeof bins === 'string' ? bins : bins[bin]
  if (!script) throw new Error(`${name} has no program ${bin}.`)
  return join(dirname(file), script)
}

/** By folder: some packages do not export their own package.json. */
const packageFile = (name: string): string => join(program, 'node_modules', name, 'package.json')

async function readJson(file: string): Promise<unknown> {
  try {
    return JSON.parse(await readFile(file, 'utf8'))
  } catch {
    return null
  }
}
