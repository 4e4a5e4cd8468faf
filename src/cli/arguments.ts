/** What was asked on the command line, checked whole before anything is done. */
import type { UnitSystem } from '#units/quantities.ts'
import {
  type CommandName,
  commandNames,
  commands,
  everywhere,
  isCommand,
  laterCommands,
  type OptionName,
  type OutFormat,
  options,
} from './commands.ts'

/** What every command is asked. */
export interface ListRequest {
  /** Path as typed; `-` is standard input. */
  readonly input: string
  readonly json: boolean
  readonly out: OutFile | null
  readonly force: boolean
  readonly units: UnitSystem
  readonly job: string | null
}
export interface OutFile {
  readonly path: string
  readonly format: OutFormat
}
export interface WorkingRequest extends ListRequest {
  readonly tag: string
}
export type Request =
  | ({ readonly kind: 'size' } & ListRequest)
  | ({ readonly kind: 'loss' } & ListRequest)
  | ({ readonly kind: 'working' } & WorkingRequest)
  | { readonly kind: 'help'; readonly command: CommandName | null }
  | { readonly kind: 'version' }
  | { readonly kind: 'mistaken'; readonly problems: readonly string[] }

const unitSystems: readonly UnitSystem[] = ['si', 'us']

const shortNames: ReadonlyMap<string, OptionName> = new Map([
  ['-h', '--help'],
  ['-v', '--version'],
])

export function readArguments(words: readonly string[]): Request {
  const { places, given, problems } = sortWords(words)
  const [word, ...inputs] = places
  const command = word !== undefined && isCommand(word) ? word : null
  if (given.has('--help')) return { kind: 'help', command }
  if (given.has('--version')) return { kind: 'version' }
  if (command === null) problems.push(commandProblem(word))
  else problems.push(...inputProblems(inputs), ...optionProblems(command, given))
  const out = outFile(given.get('--out'), command, problems)
  const units = unitSystem(given.get('--units') ?? 'si', problems)
  const job = given.get('--job') ?? null
  if (job !== null && !isJobPath(job)) {
    problems.push(`--job: found ${show(job)}; allowed: a file name that ends in .lagjob`)
  }
  const tag = given.get('--tag')
  if (command === 'working' && tag === undefined) {
    problems.push('found no run to work out; allowed: --tag TAG')
  }
  const [input] = inputs
  if (problems.length > 0 || command === null || input === undefined || units === null) {
    return { kind: 'mistaken', problems }
  }
  const asked = { input, json: given.has('--json'), out, force: given.has('--force'), units, job }
  return command === 'working'
    ? { kind: 'working', ...asked, tag: tag ?? '' }
    : { kind: command, ...asked }
}

export function isJobPath(path: string): boolean {
  return path.toLowerCase().endsWith('.lagjob')
}

type Given = ReadonlyMap<OptionName, string>

function outFile(
  path: string | undefined,
  command: CommandName | null,
  problems: string[],
): OutFile | null {
  if (path === undefined) return null
  const { outFormats } = commands[command ?? 'size']
  const format = outFormats.find((ending) => path.toLowerCase().endsWith(`.${ending}`))
  if (format) return { path, format }
  problems.push(
    `--out: found ${show(path)}; allowed: a file name that ends in .${outFormats.join(', .')}`,
  )
  return null
}

function unitSystem(word: string, problems: string[]): UnitSystem | null {
  const found = unitSystems.find((system) => system === word.toLowerCase())
  if (!found) problems.push(`--units: found ${show(word)}; allowed: si, us`)
  return found ?? null
}

function sortWords(words: readonly string[]) {
  const places: string[] = []
  const given = new Map<OptionName, string>()
  const problems: string[] = []
  const rest = [...words]
  const command = words.find((word) => !word.startsWith('-'))
  for (let word = rest.shift(); word !== undefined; word = rest.shift()) {
    if (word === '--') {
      places.push(...rest.splice(0))
    } else if (!word.startsWith('-') || word === '-') {
      places.push(word)
    } else {
      const [, typed = word, attached] = /^(--[^=]*)=(.*)$/s.exec(word) ?? []
      const name = shortNames.get(typed) ?? typed
      if (!isOption(name)) {
        problems.push(`found the unknown option ${show(typed)}; allowed: ${optionList(command)}`)
      } else if (given.has(name)) problems.push(`${name}: found twice; allowed: once`)
      else if (options[name] === null && attached !== undefined)
        problems.push(`${name}: found a value; allowed: none`)
      else if (options[name] === null) given.set(name, '')
      else {
        const next = attached ?? (rest[0]?.startsWith('--') ? undefined : rest.shift())
        if (next) given.set(name, next)
        else problems.push(`${name}: found no value; allowed: ${name} ${options[name]}`)
      }
    }
  }
  return { places, given, problems }
}

const isOption = (name: string): name is OptionName => Object.hasOwn(options, name)

/** The options of a command; of all commands where none is known. */
function optionList(command: string | undefined): string {
  const all = Object.keys(options) as OptionName[]
  const own = command !== undefined && isCommand(command) ? commands[command].options : null
  return all
    .filter((name) => own === null || own.includes(name) || everywhere.includes(name))
    .map((name) => (options[name] ? `${name} ${options[name]}` : name))
    .join(', ')
}

function commandProblem(word: string | undefined): string {
  const allowed = commandNames.join(', ')
  if (word === undefined) return `found no command; allowed: ${allowed}. See --help.`
  return laterCommands.includes(word)
    ? `the command ${word} is not yet supported; allowed: ${allowed}`
    : `found the unknown command ${show(word)}; allowed: ${allowed}. See --help.`
}

function inputProblems([input, ...more]: readonly string[]): readonly string[] {
  if (input === undefined)
    return ['found no list of runs; allowed: RUNS.csv, JOB.lagjob, or - for standard input']
  if (more.length > 0) return [`found ${more.length + 1} inputs; allowed: one list of runs`]
  return []
}

function optionProblems(command: CommandName, given: Given): readonly string[] {
  const own = commands[command].options
  return [...given.keys()]
    .filter((name) => !own.includes(name) && !everywhere.includes(name))
    .map((name) => `${name}: not an option of ${command}; allowed: ${optionList(command)}`)
}

function show(text: string): string {
  return JSON.stringify(text.length > 80 ? `${text.slice(0, 80)}…` : text)
}
