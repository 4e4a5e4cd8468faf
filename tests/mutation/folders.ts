/**
 * What can be mutated: the folders of src that only calculate, in parts, each with the test files that examine it and
 * no others. A survivor runs every test that reaches it, so that whole solves over a formula with tests of its own
 * would take most of the hour; so would the second implementations in `independent/`, which `npm test` has.
 */
export const folders = ['solver', 'sizing', 'money', 'touch'] as const
export type Folder = (typeof folders)[number]

export interface Part {
  readonly folder: Folder
  /** `money`, or `solver/heat` where a folder has several. */
  readonly name: string
  /** Globs under src; a leading exclamation mark takes away. */
  readonly sources: readonly string[]
  /** Globs under tests. */
  readonly tests: readonly string[]
}

const files = (folder: string, names: readonly string[], ending: string): string[] =>
  names.map((name) => `${folder}/${name}${ending}`)

/** Sources with a test file of the same name each, and any other tests that reach them on short ways. */
function ofOneName(
  folder: Folder,
  name: string,
  names: readonly string[],
  others: readonly string[] = [],
): Part {
  return {
    folder,
    name: `${folder}/${name}`,
    sources: files(folder, names, '.ts'),
    tests: files(folder, [...names, ...others], '{,.*}.test.ts'),
  }
}

const insideFolder = (folder: Folder, name: string, others: readonly string[] = []): Part => ({
  folder,
  name: `${folder}/${name}`,
  sources: [`${folder}/${name}/**/*.ts`],
  tests: [`${folder}/${name}/**/*.test.ts`, ...others],
})

/** What other parts have not taken of a folder, or of one inside it. */
const rest = (
  name: string,
  within: string,
  tests: readonly string[],
  others: readonly Part[],
): Part => {
  const folder = others[0]?.folder
  if (!folder) throw new Error(`${name} is the rest of nothing`)
  const taken = others.flatMap(({ sources }) => sources).filter((glob) => !glob.startsWith('!'))
  return { folder, name, sources: [`${within}/**/*.ts`, ...taken.map((glob) => `!${glob}`)], tests }
}

const whole = (folder: Folder): Part => ({
  folder,
  name: folder,
  sources: [`${folder}/**/*.ts`],
  tests: [`${folder}/**/*.test.ts`],
})

const solver: readonly Part[] = [
  insideFolder('solver', 'convection', ['solver/pedigrees.test.ts']),
  insideFolder('solver', 'properties'),
  ofOneName(
    'solver',
    'small',
    ['corner', 'correlation', 'flow', 'frost', 'ground', 'radiation', 'sky', 'sources'],
    ['pedigrees'],
  ),
  ofOneName(
    'solver',
    'layers',
    ['conductivity', 'geometry', 'grown', 'heads', 'root'],
    ['solve.balance'],
  ),
]

const workingTests = ['sizing/working/**/*.test.ts', 'report/working{,-*}.test.ts']

/** The workings are text upon text: in parts, so that one of them is soon tried again. */
const working = (name: string, names: readonly string[]): Part => ({
  folder: 'sizing',
  name: `sizing/working-${name}`,
  sources: files('sizing/working', names, '.ts'),
  tests: workingTests,
})

const workings: readonly Part[] = [
  working('heat', ['air', 'conductivity', 'film', 'free', 'geometry', 'simplified', 'wind']),
  working('limits', ['arrival', 'code', 'frost', 'limits', 'survey']),
  working('money', ['money', 'totals', 'year']),
]

const sizing: readonly Part[] = [
  ...workings,
  rest('sizing/working', 'sizing/working', workingTests, workings),
  ofOneName(
    'sizing',
    'limits',
    [
      'arrival',
      'code',
      'continuous',
      'curve-notes',
      'equilibrium',
      'frost',
      'limits',
      'passes-limit',
      'service',
      'space',
      'unmet',
    ],
    ['size'],
  ),
  ofOneName('sizing', 'ladder', ['build-up', 'ladder']),
  ofOneName('sizing', 'words', ['reason', 'unmet-words', 'words']),
  ofOneName('sizing', 'inverse', ['moved', 'sensitivity', 'sensitivity-moves', 'survey']),
]

export const parts: readonly Part[] = [
  ...solver,
  rest('solver/heat', 'solver', ['solver/{film,from-surface,solve}{,.*}.test.ts'], solver),
  ...sizing,
  rest(
    'sizing/rungs',
    'sizing',
    ['sizing/{money,oracle,reason,run-loss,size}{,.*}.test.ts'],
    sizing,
  ),
  whole('money'),
  whole('touch'),
]

/** The parts that a word on the command line means: one, or all of a folder. */
export const partsOf = (word: string): readonly Part[] =>
  parts.filter(({ folder, name }) => word === folder || word === name)

/** Told to the processes that run the tests by an environment variable, since they read a configuration of their own. */
const VARIABLE = 'LAGWRIGHT_MUTATED_PART'

export function putUnderTest({ name }: Part): void {
  process.env[VARIABLE] = name
}

export function partUnderTest(): Part {
  const name = process.env[VARIABLE] ?? ''
  const part = parts.find((any) => any.name === name)
  if (!part) throw new Error(`${VARIABLE} is "${name}", which is no part to mutate.`)
  return part
}
