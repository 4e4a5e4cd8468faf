/** Judges a file by its first bytes, before anything opens it as a database. */
import { closeSync, fstatSync, openSync, readSync } from 'node:fs'
import { AppError } from '#contract/failures.ts'
import { readFailure } from './storage-failure.ts'

/** "LAGJ": tells a job from any other SQLite database. */
export const applicationId = 0x4c41474a

const headerLength = 100
const magic = Buffer.from('SQLite format 3\0', 'latin1')

/** Offsets of the SQLite file format: https://sqlite.org/fileformat.html, section 1.3. */
const offsets = {
  pageSize: 16,
  writeVersion: 18,
  pageCount: 28,
  userVersion: 60,
  applicationId: 68,
}

/** The version of the job file. Throws the failure that a person should read, and never writes. */
export function judgeHeader(path: string, knownVersion: number): number {
  const { header, size } = firstBytes(path)
  const foreign = (why: string) => new AppError({ code: 'job/not-a-job', path, why })
  const damaged = (why: string) => new AppError({ code: 'job/damaged', path, why })

  if (size === 0) throw foreign('it is empty')
  if (!header.subarray(0, magic.length).equals(magic.subarray(0, header.length)))
    throw foreign(
      isText(header)
        ? 'it is text, as a list of runs is; its name should end in .csv then'
        : 'it is not a SQLite database',
    )
  if (header.length < headerLength) throw damaged(`it ends after ${size} bytes`)
  const foundId = header.readUInt32BE(offsets.applicationId)
  if (foundId !== applicationId) throw foreign('it is a database of another program')
  const version = header.readUInt32BE(offsets.userVersion)
  if (version > knownVersion)
    throw new AppError({ code: 'job/too-new', path, found: version, known: knownVersion })
  if (version === 0) throw damaged('it carries no version')
  // Jobs are never written with a write-ahead log, and opening one would create files beside it.
  if (header[offsets.writeVersion] !== 1 || header[offsets.writeVersion + 1] !== 1)
    throw damaged('its header names a journal that jobs do not use')
  return version
}

/** Whether the bytes may be the beginning of a text: no control characters but tabs and line ends, and mostly letters of ASCII. */
function isText(bytes: Buffer): boolean {
  const ascii = bytes.filter((byte) => byte < 0x7f)
  const isPlain = ascii.every((byte) => byte >= 0x20 || [0x09, 0x0a, 0x0d].includes(byte))
  return isPlain && ascii.length > bytes.length / 2
}

/** Bytes that the header promises and the file does not have, below 0 where it has too many; 0 for a whole file. */
export function missingBytes(path: string): number {
  const { header, size } = firstBytes(path)
  const stored = header.readUInt16BE(offsets.pageSize)
  const pageSize = stored === 1 ? 65_536 : stored
  return pageSize * header.readUInt32BE(offsets.pageCount) - size
}

function firstBytes(path: string): { header: Buffer; size: number } {
  try {
    const file = openSync(path, 'r')
    try {
      const buffer = Buffer.alloc(headerLength)
      const length = readSync(file, buffer, 0, headerLength, 0)
      return { header: buffer.subarray(0, length), size: fstatSync(file).size }
    } finally {
      closeSync(file)
    }
  } catch (error) {
    throw readFailure(path, error)
  }
}
