import { glob, readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { renew } from '../published/report.ts'
import { program, runTool, withReport } from './tool.ts'

/** Runs the tests that compare with print and renews their table; the exit code. */
export async function renewPublished(): Promise<number> {
  const { exitCode, report } = await withReport(async (file) =>
    runTool({ package: 'vitest' }, [
      'run',
      '--project=node',
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${file}`,
      ...(await filesWithPrint()),
    ]),
  )
  // A file that does not even load leaves no rows.
  const fault =
    exitCode === 0
      ? await renew(report)
      : 'Some of these tests fail, so tests/published/REPORT.md stays as it was. Mend them first.'
  if (fault !== null) console.error(fault)
  else console.log('tests/published/REPORT.md is renewed.')
  return fault === null ? 0 : 1
}

async function filesWithPrint(): Promise<string[]> {
  const files: string[] = []
  for await (const file of glob('tests/**/*.test.ts', { cwd: program })) {
    if ((await readFile(join(program, file), 'utf8')).includes('/published.ts')) files.push(file)
  }
  return files
}
