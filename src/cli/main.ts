/** The command line: `lagwright size RUNS.csv` and its like. */
import { readArguments } from './arguments.ts'
import type { Outcome } from './deliver.ts'
import { helpOf } from './help.ts'
import { loss } from './loss.ts'
import { print, printProblems } from './print.ts'
import { size } from './size.ts'
import { version } from './version.ts'
import { working } from './working.ts'

export const exitCodes = { done: 0, unmet: 1, badInput: 2, failed: 3 } as const
type ExitCode = (typeof exitCodes)[keyof typeof exitCodes]

async function run(words: readonly string[]): Promise<ExitCode> {
  const request = readArguments(words)
  switch (request.kind) {
    case 'help':
      await print([helpOf(request.command)])
      return exitCodes.done
    case 'version':
      await print([`lagwright ${version()}\n`])
      return exitCodes.done
    case 'mistaken':
      await printProblems(request.problems)
      return exitCodes.badInput
    case 'size':
      return ended(await size(request))
    case 'loss':
      return ended(await loss(request))
    case 'working':
      return ended(await working(request))
  }
}

async function ended({ end, problems }: Outcome): Promise<ExitCode> {
  await printProblems(problems)
  return exitCodes[end]
}

async function runToTheEnd(): Promise<void> {
  try {
    process.exitCode = await run(process.argv.slice(2))
  } catch (error) {
    process.exitCode = exitCodes.failed
    await printProblems([
      `Lagwright itself failed: ${error instanceof Error ? error.stack : String(error)}`,
    ])
  }
}

await runToTheEnd()
