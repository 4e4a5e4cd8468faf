import { globSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { folders, type Part, parts, partsOf } from './folders.ts'

const found = (root: string, globs: readonly string[]): string[] => {
  const taken = globs.filter((glob) => glob.startsWith('!')).map((glob) => glob.slice(1))
  const away = new Set(globSync(taken, { cwd: root }))
  return globSync(
    globs.filter((glob) => !glob.startsWith('!')),
    { cwd: root },
  ).filter((file) => !away.has(file))
}
const sourcesOf = ({ sources }: Part): string[] => found('src', sources)

describe.each(folders)('%s', (folder) => {
  test('has each of its files in exactly one part', () => {
    const inParts = partsOf(folder).flatMap(sourcesOf)
    expect(inParts.toSorted()).toEqual(found('src', [`${folder}/**/*.ts`]).toSorted())
  })
})

describe.each(parts)('$name', (part) => {
  test('has tests of its own, and every name in it is that of a file', () => {
    expect(found('tests', part.tests).length).toBeGreaterThan(0)
    for (const glob of part.sources) {
      expect(found('src', [glob.replace('!', '')]), glob).not.toEqual([])
    }
  })
})

test('a word means a folder with all its parts, or one part', () => {
  expect(partsOf('solver').length).toBeGreaterThan(1)
  expect(partsOf('solver/heat').map(({ name }) => name)).toEqual(['solver/heat'])
  expect(partsOf('report')).toEqual([])
})
