import { mkdir, readFile, writeFile } from 'node:fs/promises'
import { join, relative } from 'node:path'
import { Stryker } from '@stryker-mutator/core'
import { program } from '../runner/tool.ts'
import { folders, type Part, parts, partsOf, putUnderTest } from './folders.ts'
import { isEnough, isSurvivor, type Mutant, survivorsText, tallyLine, tallyOf } from './tally.ts'

/** Kept out of git: what a campaign leaves behind, also to start the next one from. */
const RESULTS = 'mutation-results'
/** Given where other work keeps the machine busy, so that a slow trial does not count as one without end. */
const BUSY = '--busy'

/**
 * A mutant never ends that runs `timeoutFactor` times as long as its tests usually do, and so many milliseconds.
 */
const patience = { timeoutFactor: 2, timeoutMS: 5_000 }
const busyPatience = { timeoutFactor: 4, timeoutMS: 20_000 }

/** Mutates the named folders of src or parts of them, or all, one after the other; the exit code. */
export async function mutate(given: readonly string[]): Promise<number> {
  const words = given.filter((word) => word !== BUSY)
  const unknown = words.filter((word) => partsOf(word).length === 0)
  if (unknown.length > 0) {
    console.error(
      `There is no ${unknown.join(', ')} to mutate; there are the folders ${folders.join(', ')} and the parts ` +
        `${parts.map(({ name }) => name).join(', ')}. Example: npm run mutate -- solver ${BUSY}`,
    )
    return 2
  }
  const chosen = words.length > 0 ? words.flatMap(partsOf) : parts
  process.chdir(program)
  const trials: Trial[] = []
  const untried: string[] = []
  for (const part of parts.filter((any) => chosen.includes(any))) {
    try {
      trials.push(await trialOf(part, given.includes(BUSY)))
    } catch (error) {
      // Most of all where its tests fail as they are: the other parts are tried all the same.
      untried.push(
        `${part.name} could not be tried: ${error instanceof Error ? error.message : error}`,
      )
    }
  }
  const report = reportOf(trials)
  console.log(`\n${[...report.lines, ...untried].join('\n')}`)
  return report.isEnough && untried.length === 0 ? 0 : 1
}

interface Trial {
  readonly part: Part
  readonly mutants: readonly Mutant[]
  readonly minutes: number
}

async function trialOf(part: Part, isBusy: boolean): Promise<Trial> {
  const startMs = performance.now()
  const mutants = await mutantsOf(part, isBusy)
  await writeFile(survivorsOf(part), survivorsText(mutants))
  return { part, mutants, minutes: (performance.now() - startMs) / 60_000 }
}

const resultsOf = ({ name }: Part): string => join(RESULTS, name.replace('/', '-'))
const survivorsOf = (part: Part): string => join(resultsOf(part), 'survivors.txt')

/** A line for each part, and for each folder of several parts one for all of them: that is the score that counts. */
function reportOf(trials: readonly Trial[]): { lines: string[]; isEnough: boolean } {
  const lines: string[] = []
  let isAllEnough = true
  for (const folder of folders) {
    const own = trials.filter(({ part }) => part.folder === folder)
    if (own.length === 0) continue
    for (const trial of own) lines.push(`${lineOf(trial)}; survivors in ${survivorsOf(trial.part)}`)
    const mutants = own.flatMap((trial) => trial.mutants)
    const minutes = own.reduce((sum, trial) => sum + trial.minutes, 0)
    if (own.length > 1) lines.push(lineOf({ part: { name: folder }, mutants, minutes }))
    isAllEnough &&= isEnough(tallyOf(mutants))
  }
  return { lines, isEnough: isAllEnough }
}

const lineOf = ({
  part,
  mutants,
  minutes,
}: Omit<Trial, 'part'> & { part: Pick<Part, 'name'> }): string =>
  `${tallyLine(part.name, tallyOf(mutants))} (${minutes.toFixed(1)} min)`

async function mutantsOf(part: Part, isBusy: boolean): Promise<Mutant[]> {
  const results = resultsOf(part)
  const former = join(results, 'incremental.json')
  await mkdir(results, { recursive: true })
  await forgetSurvivors(former)
  putUnderTest(part)
  const campaign = new Stryker({
    mutate: part.sources.map(inSrc),
    testRunner: 'vitest',
    // A part says itself which tests examine it.
    vitest: { configFile: 'tests/mutation/vitest.config.ts', related: false },
    coverageAnalysis: 'perTest',
    concurrency: 2,
    incremental: true,
    incrementalFile: former,
    tempDirName: join(results, 'sandbox'),
    // What the tests of these folders need, and nothing else, is copied.
    ignorePatterns: ['**', '!src/**', '!tests/**', '!db/**', '!package.json', '!tsconfig.json'],
    reporters: [process.stdout.isTTY ? 'progress' : 'progress-append-only'],
    allowConsoleColors: false,
    ...(isBusy ? busyPatience : patience),
  })
  const mutants = await campaign.runMutationTest()
  return mutants.map((mutant) => ({ ...mutant, fileName: relative(program, mutant.fileName) }))
}

/**
 * Takes the mutants that no test noticed out of what a former campaign left, so that they are tried again: of those in
 * what a module computes once when it loads, a new test would otherwise never get to see any.
 */
async function forgetSurvivors(file: string): Promise<void> {
  const text = await readFile(file, 'utf8').catch(() => null)
  if (text === null) return
  const former = JSON.parse(text) as { files: Record<string, { mutants: Mutant[] }> }
  for (const one of Object.values(former.files)) {
    one.mutants = one.mutants.filter((mutant) => !isSurvivor(mutant))
  }
  await writeFile(file, JSON.stringify(former))
}

const inSrc = (glob: string): string =>
  glob.startsWith('!') ? `!src/${glob.slice(1)}` : `src/${glob}`
