import type { Outcome } from './outcome.ts'
import { runTool, type Tool } from './tool.ts'

interface Step {
  readonly name: string
  readonly tool: Tool
  readonly args: readonly string[]
}

export const checks: readonly Step[] = [
  {
    name: 'format and lint',
    tool: { package: '@biomejs/biome', bin: 'biome' },
    args: ['ci', '--colors=off', '--max-diagnostics=50', '--error-on-warnings'],
  },
  {
    name: 'types',
    tool: { package: 'svelte-check' },
    args: ['--tsconfig', './tsconfig.json', '--fail-on-warnings'],
  },
  {
    name: 'types, pure layers',
    tool: { package: 'typescript', bin: 'tsc' },
    args: ['-p', 'tsconfig.pure.json'],
  },
  {
    name: 'layers',
    tool: { package: 'dependency-cruiser', bin: 'depcruise' },
    args: ['--config', '.dependency-cruiser.mjs', 'src', 'electron', 'tests'],
  },
  { name: 'unused code', tool: { package: 'knip' }, args: ['--no-progress'] },
]

/** A Vitest test, so the full run has it already; the quick check runs it by itself. */
export const names: readonly Step[] = [
  {
    name: 'units in names',
    tool: { package: 'vitest' },
    args: ['run', '--project', 'node', 'tests/names.test.ts'],
  },
]

export const builds: readonly Step[] = [
  { name: 'build', tool: { package: 'vite' }, args: ['build', '--logLevel', 'warn'] },
]

/** Runs them one after the other; each counts as one. */
export async function runSteps(steps: readonly Step[], outcomes: Outcome[]): Promise<void> {
  for (const { name, tool, args } of steps) {
    console.log(`\n== ${name}`)
    const isPassed = (await runTool(tool, args)) === 0
    outcomes.push({ name, passed: isPassed ? 1 : 0, failed: isPassed ? 0 : 1, notRun: 0 })
  }
}
