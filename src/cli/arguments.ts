/** What was asked on the command line, checked whole before anything is done. */
import type { UnitSystem } from '#units/quantities.ts'

export interface SizeRequest {
  readonly kind: 'size'
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
export type Request =
  | SizeRequest
  | { readonly kind: 'help' }
  | { readonly kind: 'version' }
  | { readonly kind: 'mistaken'; readonly problems: readonly string[] }

const outFormats = ['json', 'csv', 'txt'] as const
export type OutFormat = (typeof outFormats)[number]

const unitSystems: readonly UnitSystem[] = ['si', 'us']
/** Doors of the finished program that are refused by name. */
const laterCommands = ['touch', 'loss', 'quote', 'walkdown', 'working']

/** Options by name, and what their value is called; null where they take none. */
const options: ReadonlyMap<string, string | null> = new Map([
  ['--json', null],
  ['--out', 'FILE'],
  ['--force', null],
  ['--units', 'si|us'],
  ['--job', 'JOB.lagjob'],
  ['--help', null],
  ['--version', null],
])
const shortNames: ReadonlyMap<string, string> = new Map([
  ['-h', '--help'],
  ['-v', '--version'],
])
const optionList = [...options]
  .map(([name, value]) => (value ? `${name} ${value}` : name))
  .join(', ')

export function readArguments(words: readonly string[]): Request {
  const { places, given, problems } = sortWords(words)
  if (given.has('--help')) return { kind: 'help' }
  if (given.has('--version')) return { kind: 'version' }
  const [command, ...inputs] = places
  problems.push(...commandProblems(command))
  if (command === 'size') problems.push(...inputProblems(inputs))
  const out = given.get('--out')
  const format =
    out === undefined
      ? undefined
      : outFormats.find((ending) => out.toLowerCase().endsWith(`.${ending}`))
  if (out !== undefined && !format) {
    problems.push(
      `--out: found ${show(out)}; allowed: a file name that ends in .${outFormats.join(', .')}`,
    )
  }
  const units = unitSystems.find(
    (system) => system === (given.get('--units') ?? 'si').toLowerCase(),
  )
  if (!units) problems.push(`--units: found ${show(given.get('--units') ?? '')}; allowed: si, us`)
  const job = given.get('--job') ?? null
  if (job !== null && !isJobPath(job)) {
    problems.push(`--job: found ${show(job)}; allowed: a file name that ends in .lagjob`)
  }
  const [input] = inputs
  if (problems.length > 0 || input === undefined || !units) return { kind: 'mistaken', problems }
  return {
    kind: 'size',
    input,
    json: given.has('--json'),
    out: out !== undefined && format ? { path: out, format } : null,
    force: given.has('--force'),
    units,
    job,
  }
}

export function isJobPath(path: string): boolean {
  return path.toLowerCase().endsWith('.lagjob')
}

function sortWords(words: readonly string[]) {
  const places: string[] = []
  const given = new Map<string, string>()
  const problems: string[] = []
  const rest = [...words]
  for (let word = rest.shift(); word !== undefined; word = rest.shift()) {
    if (word === '--') {
      places.push(...rest.splice(0))
    } else if (!word.startsWith('-') || word === '-') {
      places.push(word)
    } else {
      const [, typed = word, attached] = /^(--[^=]*)=(.*)$/s.exec(word) ?? []
      const name = shortNames.get(typed) ?? typed
      const value = options.get(name)
      if (value === undefined)
        problems.push(`found the unknown option ${show(typed)}; allowed: ${optionList}`)
      else if (given.has(name)) problems.push(`${name}: found twice; allowed: once`)
      else if (value === null && attached !== undefined)
        problems.push(`${name}: found a value; allowed: none`)
      else if (value === null) given.set(name, '')
      else {
        const next = attached ?? (rest[0]?.startsWith('--') ? undefined : rest.shift())
        if (next) given.set(name, next)
        else problems.push(`${name}: found no value; allowed: ${name} ${value}`)
      }
    }
  }
  return { places, given, problems }
}

function commandProblems(command: string | undefined): readonly string[] {
  if (command === 'size') return []
  if (command === undefined) return ['found no command; allowed: size. See --help.']
  return laterCommands.includes(command)
    ? [`the command ${command} is not yet supported; allowed: size`]
    : [`found the unknown command ${show(command)}; allowed: size. See --help.`]
}

function inputProblems([input, ...more]: readonly string[]): readonly string[] {
  if (input === undefined)
    return ['found no list of runs; allowed: RUNS.csv, JOB.lagjob, or - for standard input']
  if (more.length > 0) return [`found ${more.length + 1} inputs; allowed: one list of runs`]
  return []
}

function show(text: string): string {
  return JSON.stringify(text.length > 80 ? `${text.slice(0, 80)}…` : text)
}
