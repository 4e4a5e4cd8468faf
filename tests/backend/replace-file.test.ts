import { readdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { expect, test } from 'vitest'
import { replaceFile } from '#backend/replace-file.ts'
import { temporaryFolder } from './temporary-folder.ts'

test('the new content is there whole, and nothing else is', () => {
  const folder = temporaryFolder()
  const path = join(folder, 'a.json')
  for (const text of ['first', 'second']) {
    replaceFile(path, (temporary) => writeFileSync(temporary, text))
    expect(readFileSync(path, 'utf8')).toBe(text)
  }
  expect(readdirSync(folder)).toEqual(['a.json'])
})

test('a failure on the way leaves the old content', () => {
  const folder = temporaryFolder()
  const path = join(folder, 'a.json')
  writeFileSync(path, 'old')
  const half = (temporary: string) => {
    writeFileSync(temporary, 'ha')
    throw new Error('the power went')
  }
  expect(() => replaceFile(path, half)).toThrow('the power went')
  expect(readFileSync(path, 'utf8')).toBe('old')
  expect(readdirSync(folder)).toEqual(['a.json'])
})
