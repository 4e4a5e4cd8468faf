import Database from 'better-sqlite3'
import { describe, expect, test } from 'vitest'
import { noPlaceWords, readFailure, writeFailure } from '#backend/storage-failure.ts'
import { AppError } from '#contract/failures.ts'

const system = (code: string) => Object.assign(new Error(code), { code })
const sqlite = (code: string) => new Database.SqliteError('words of SQLite', code)
const failure = (error: unknown) => (error instanceof AppError ? error.failure : null)

describe('on the way to read', () => {
  test.each([
    [system('ENOENT'), { code: 'job/not-found' }],
    [system('ENOTDIR'), { code: 'job/not-found' }],
    [system('EISDIR'), { code: 'job/not-a-job', why: 'it is a folder' }],
    [system('EACCES'), { code: 'job/unreadable', why: 'permission denied' }],
    [system('EIO'), { code: 'job/unreadable', why: 'the drive reports an error' }],
    [sqlite('SQLITE_BUSY'), { code: 'job/in-use' }],
    [sqlite('SQLITE_CORRUPT_VTAB'), { code: 'job/damaged', why: 'words of SQLite' }],
    [sqlite('SQLITE_NOTADB'), { code: 'job/damaged' }],
    [sqlite('SQLITE_IOERR_SHORT_READ'), { code: 'job/damaged', why: 'the drive reports an error' }],
  ])('%s', (error, expected) => {
    expect(failure(readFailure('/a.lagjob', error))).toMatchObject({
      path: '/a.lagjob',
      ...expected,
    })
  })
})

describe('on the way to write', () => {
  test.each([
    [system('ENOSPC'), { code: 'job/not-writable', why: 'the drive is full' }],
    [system('EROFS'), { code: 'job/not-writable', why: 'the drive is read-only' }],
    [system('EPERM'), { code: 'job/not-writable', why: 'permission denied' }],
    [system('ENOENT'), { code: 'job/not-writable', why: 'there is no such folder' }],
    [sqlite('SQLITE_FULL'), { code: 'job/not-writable', why: 'the drive is full' }],
    [sqlite('SQLITE_READONLY_DBMOVED'), { code: 'job/not-writable' }],
    [sqlite('SQLITE_CANTOPEN'), { code: 'job/not-writable' }],
    [sqlite('SQLITE_IOERR_WRITE'), { code: 'job/not-writable', why: 'the drive reports an error' }],
    [sqlite('SQLITE_BUSY'), { code: 'job/in-use' }],
    [sqlite('SQLITE_CORRUPT'), { code: 'job/damaged' }],
  ])('%s', (error, expected) => {
    expect(failure(writeFailure('/a.lagjob', error))).toMatchObject({
      path: '/a.lagjob',
      ...expected,
    })
  })
})

test('why a place takes no files', () => {
  expect(noPlaceWords(system('EROFS'))).toBe('the drive is read-only')
  expect(noPlaceWords(sqlite('SQLITE_CANTOPEN'))).toBe('the folder does not take new files')
  for (const other of [sqlite('SQLITE_CORRUPT'), sqlite('SQLITE_BUSY'), new TypeError('x')])
    expect(noPlaceWords(other)).toBeNull()
})

test('what is not about storage stays the bug it is', () => {
  const bugs = [new TypeError('x is not a function'), sqlite('SQLITE_CONSTRAINT_CHECK'), 'text']
  for (const bug of bugs) expect(writeFailure('/a.lagjob', bug)).toBe(bug)
  const known = new AppError({ code: 'job/exists', path: '/b' })
  expect(readFailure('/a.lagjob', known)).toBe(known)
  expect(readFailure('/a.lagjob', new TypeError('x'))).toBeInstanceOf(TypeError)
})
