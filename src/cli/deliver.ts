/** Hands over what a command has found: to a file, and to standard output. */
import type { ListRequest } from './arguments.ts'
import type { OutFormat } from './commands.ts'
import { fullPath } from './place.ts'
import { print } from './print.ts'
import { writeWhole } from './write-file.ts'

/** How a command ended: see `exitCodes`. */
export interface Outcome {
  readonly end: 'done' | 'unmet' | 'badInput'
  /** For standard error, one a line. */
  readonly problems: readonly string[]
}

/** The result in each form a command has; made only when it is asked for. */
export interface Forms {
  readonly forFile: Readonly<Partial<Record<OutFormat, () => Iterable<string>>>>
  readonly json: () => Iterable<string>
  readonly terminal: () => Iterable<string>
  /** What is said where the result went to a file. */
  readonly summary: () => string
}

/** Prints and writes; gives back why the file could not be written. */
export async function deliver({ out, json }: ListRequest, forms: Forms): Promise<string | null> {
  if (out) {
    try {
      writeWhole(fullPath(out.path), forms.forFile[out.format]?.() ?? [])
    } catch (error) {
      if (!(error instanceof Error && 'syscall' in error)) throw error
      return `--out: ${out.path} cannot be written (${error.message}); allowed: a place with room and the right to write`
    }
  }
  if (json) await print(forms.json())
  else await print(out ? [`${out.path}: ${forms.summary()}\n`] : forms.terminal())
  return null
}
