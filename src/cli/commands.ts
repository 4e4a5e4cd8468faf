/** What each command takes. */

export const commandNames = ['size', 'loss', 'working'] as const
export type CommandName = (typeof commandNames)[number]
export type OutFormat = 'json' | 'csv' | 'txt'

interface Command {
  /** Options of its own besides those that every command takes. */
  readonly options: readonly OptionName[]
  readonly outFormats: readonly OutFormat[]
}

/** Options by name, and what their value is called; null where they take none. */
export const options = {
  '--json': null,
  '--out': 'FILE',
  '--force': null,
  '--units': 'si|us',
  '--job': 'JOB.lagjob',
  '--tag': 'TAG',
  '--help': null,
  '--version': null,
} as const
export type OptionName = keyof typeof options

const ofList: readonly OptionName[] = ['--json', '--out', '--force', '--units', '--job']

export const commands: Readonly<Record<CommandName, Command>> = {
  size: { options: ofList, outFormats: ['json', 'csv', 'txt'] },
  loss: { options: ofList, outFormats: ['json', 'csv', 'txt'] },
  working: {
    options: ['--tag', '--json', '--out', '--force', '--job'],
    outFormats: ['json', 'txt'],
  },
}

export const everywhere: readonly OptionName[] = ['--help', '--version']

/** Doors of the finished program that are refused by name. */
export const laterCommands: readonly string[] = ['touch', 'quote', 'walkdown']

export function isCommand(word: string): word is CommandName {
  return commandNames.some((name) => name === word)
}
