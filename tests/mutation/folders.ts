/** What can be mutated: the folders of src that only calculate, with the tests that have to notice. */
export const folders = ['solver', 'sizing', 'money', 'touch'] as const
export type Folder = (typeof folders)[number]

export const isFolder = (word: string): word is Folder => folders.some((folder) => folder === word)

export function testsOf(folder: Folder): {
  readonly include: readonly string[]
  readonly exclude: readonly string[]
} {
  return {
    include: [`tests/${folder}/**/*.test.ts`],
    // A survivor runs every test that reaches it, so the second implementations, which solve whole fields cell by
    // cell, would take more of the hour than all the others together. `npm test` has them.
    exclude: [`tests/${folder}/independent/**`],
  }
}

/** Told to the processes that run the tests by an environment variable, since they read a configuration of their own. */
const VARIABLE = 'LAGWRIGHT_MUTATED_FOLDER'

export function putUnderTest(folder: Folder): void {
  process.env[VARIABLE] = folder
}

export function folderUnderTest(): Folder {
  const word = process.env[VARIABLE] ?? ''
  if (!isFolder(word))
    throw new Error(`${VARIABLE} is "${word}"; it is one of ${folders.join(', ')}.`)
  return word
}
