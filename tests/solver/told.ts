/** What the solver says of a system, for the tests of its notes. */
import { notesOf } from '#solver/notes.ts'
import { solve } from '#solver/solve.ts'
import type { System } from '#solver/types.ts'
import { plainFilm, still } from './systems.ts'

/** What a system has besides shape and layers where a test says nothing else. */
export const base: Omit<System, 'shape' | 'layers'> = {
  ...plainFilm,
  mediumC: 60,
  around: still(20),
}

export const textsOf = (system: System, code: string): string[] =>
  notesOf(system, solve(system))
    .filter((note) => note.code === code)
    .map(({ text }) => text)
