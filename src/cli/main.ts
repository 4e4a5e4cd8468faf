/** The command line: `lagwright size RUNS.csv`. */
import { readArguments } from './arguments.ts'
import { help } from './help.ts'
import { print, printProblems } from './print.ts'
import { size } from './size.ts'
import { version } from './version.ts'

export const exitCodes = { done: 0, unmet: 1, badInput: 2, failed: 3 } as const
type ExitCode = (typeof exitCodes)[keyof typeof exitCodes]

async function run(words: readonly string[]): Promise<ExitCode> {
  const request = readArguments(words)
  switch (request.kind) {
    case 'help':
      await print([help])
      return exitCodes.done
    case 'version':
      await print([`lagwright ${version()}\n`])
      return exitCodes.done
    case 'mistaken':
      await printProblems(request.problems)
      return exitCodes.badInput
    case 'size': {
      const outcome = await size(request)
      await printProblems(outcome.problems)
      return exitCodes[outcome.end]
    }
  }
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
