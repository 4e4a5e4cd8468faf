import { mkdir, writeFile } from 'node:fs/promises'
import { join, relative } from 'node:path'
import { Stryker } from '@stryker-mutator/core'
import { program } from '../runner/tool.ts'
import { type Folder, folders, isFolder, putUnderTest } from './folders.ts'
import { isEnough, type Mutant, survivorsText, tallyLine, tallyOf } from './tally.ts'

/** Kept out of git: what a campaign leaves behind, also to start the next one from. */
const RESULTS = 'mutation-results'

/** Mutates the named folders of src, or all, one after the other; the exit code. */
export async function mutate(words: readonly string[]): Promise<number> {
  const unknown = words.filter((word) => !isFolder(word))
  if (unknown.length > 0) {
    console.error(
      `There is no folder ${unknown.join(', ')} to mutate; there are ${folders.join(', ')}. ` +
        'Example: npm run mutate -- solver',
    )
    return 2
  }
  const chosen = words.length > 0 ? folders.filter((folder) => words.includes(folder)) : folders
  process.chdir(program)
  const lines: string[] = []
  let isAllEnough = true
  for (const folder of chosen) {
    const startMs = performance.now()
    const mutants = await mutantsOf(folder)
    const survivors = join(RESULTS, folder, 'survivors.txt')
    await writeFile(survivors, survivorsText(mutants))
    const tally = tallyOf(mutants)
    const minutes = ((performance.now() - startMs) / 60_000).toFixed(1)
    lines.push(`${tallyLine(folder, tally)} (${minutes} min; survivors in ${survivors})`)
    isAllEnough &&= isEnough(tally)
  }
  console.log(`\n${lines.join('\n')}`)
  return isAllEnough ? 0 : 1
}

async function mutantsOf(folder: Folder): Promise<Mutant[]> {
  const results = join(RESULTS, folder)
  await mkdir(results, { recursive: true })
  putUnderTest(folder)
  const campaign = new Stryker({
    mutate: [`src/${folder}/**/*.ts`],
    testRunner: 'vitest',
    vitest: { configFile: 'tests/mutation/vitest.config.ts' },
    coverageAnalysis: 'perTest',
    concurrency: 2,
    incremental: true,
    incrementalFile: join(results, 'incremental.json'),
    tempDirName: join(results, 'sandbox'),
    // What the tests of these folders need, and nothing else, is copied.
    ignorePatterns: ['**', '!src/**', '!tests/**', '!db/**', '!package.json', '!tsconfig.json'],
    reporters: [process.stdout.isTTY ? 'progress' : 'progress-append-only'],
    allowConsoleColors: false,
    // A mutant that runs twice as long as its tests usually do, and five seconds, never ends.
    timeoutFactor: 2,
    timeoutMS: 5_000,
  })
  const mutants = await campaign.runMutationTest()
  return mutants.map((mutant) => ({ ...mutant, fileName: relative(program, mutant.fileName) }))
}
