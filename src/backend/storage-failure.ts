/** Turns what SQLite and the file system throw into the failures people read; anything else stays a bug. */
import { AppError } from '#contract/failures.ts'

const systemWords: Readonly<Record<string, string>> = {
  EACCES: 'permission denied',
  EPERM: 'permission denied',
  EROFS: 'the drive is read-only',
  ENOSPC: 'the drive is full',
  EDQUOT: 'your share of the drive is full',
  ENOENT: 'there is no such folder',
  ENOTDIR: 'part of the path is not a folder',
  ENAMETOOLONG: 'the name is too long',
  EINVAL: 'the name is not allowed here',
  EISDIR: 'there is a folder of that name',
  EEXIST: 'there is a file where a folder should be',
  EBUSY: 'another program holds the file',
  EIO: 'the drive reports an error',
}

/** What went wrong on the way to read a file. */
export function readFailure(path: string, error: unknown): unknown {
  const code = codeOf(error)
  if (error instanceof AppError || code === null) return error
  if (code === 'ENOENT' || code === 'ENOTDIR')
    return new AppError({ code: 'job/not-found', path }, { cause: error })
  if (code === 'EISDIR')
    return new AppError({ code: 'job/not-a-job', path, why: 'it is a folder' }, { cause: error })
  if (isBusy(code)) return new AppError({ code: 'job/in-use', path }, { cause: error })
  if (code === 'SQLITE_NOTADB' || code.startsWith('SQLITE'))
    return new AppError({ code: 'job/damaged', path, why: sqliteWords(error) }, { cause: error })
  return new AppError(
    { code: 'job/unreadable', path, why: systemWords[code] ?? code },
    { cause: error },
  )
}

/** What went wrong on the way to write a file. */
export function writeFailure(path: string, error: unknown): unknown {
  const code = codeOf(error)
  if (error instanceof AppError || code === null) return error
  if (isBusy(code)) return new AppError({ code: 'job/in-use', path }, { cause: error })
  if (code.startsWith('SQLITE_CORRUPT') || code === 'SQLITE_NOTADB')
    return new AppError({ code: 'job/damaged', path, why: sqliteWords(error) }, { cause: error })
  if (/^SQLITE_(READONLY|CANTOPEN|FULL|IOERR|PERM|AUTH)/.test(code))
    return new AppError(
      { code: 'job/not-writable', path, why: sqliteWords(error) },
      { cause: error },
    )
  if (code.startsWith('SQLITE')) return error
  return new AppError(
    { code: 'job/not-writable', path, why: systemWords[code] ?? code },
    { cause: error },
  )
}

/** Why a place takes no files, in words; null where the error is about something else. */
export function noPlaceWords(error: unknown): string | null {
  const failure = writeFailure('', error)
  return failure instanceof AppError && failure.failure.code === 'job/not-writable'
    ? failure.failure.why
    : null
}

/** SQLite's code or the system's; null for anything that is not about storage. */
function codeOf(error: unknown): string | null {
  if (!(error instanceof Error) || !('code' in error)) return null
  const { code } = error
  return typeof code === 'string' && /^(SQLITE|E[A-Z]+$)/.test(code) ? code : null
}

const isBusy = (code: string): boolean => /^SQLITE_(BUSY|LOCKED)/.test(code)

function sqliteWords(error: unknown): string {
  const code = codeOf(error) ?? ''
  if (code.startsWith('SQLITE_FULL')) return 'the drive is full'
  if (code.startsWith('SQLITE_READONLY')) return 'the file or its folder is read-only'
  if (code.startsWith('SQLITE_CANTOPEN')) return 'the folder does not take new files'
  if (code.startsWith('SQLITE_IOERR')) return 'the drive reports an error'
  return (error as Error).message
}
