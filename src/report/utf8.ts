/** Reads UTF-8 strictly: a byte that is not UTF-8 is said with its line, never turned into a question mark. */

export type Decoded =
  | { readonly ok: true; readonly text: string }
  /** Line of the first byte that does not fit, the first line being 1, and the byte. */
  | { readonly ok: false; readonly line: number; readonly byte: number }

/** Few enough for one call of fromCharCode. */
const chunkLength = 8192

/** The text of UTF-8 bytes, without the byte order mark. */
export function decodeUtf8(bytes: Uint8Array): Decoded {
  const chunks: string[] = []
  let units: number[] = []
  let at = hasByteOrderMark(bytes) ? 3 : 0
  while (at < bytes.length) {
    const byte = bytes[at] ?? 0
    if (byte < 0x80) {
      units.push(byte)
      at += 1
    } else {
      const length = sequenceLength(bytes, at)
      if (length === 0) return { ok: false, line: lineAt(bytes, at), byte }
      pushCodePoint(units, codePoint(bytes, at, length))
      at += length
    }
    if (units.length >= chunkLength) {
      chunks.push(String.fromCharCode(...units))
      units = []
    }
  }
  chunks.push(String.fromCharCode(...units))
  return { ok: true, text: chunks.join('') }
}

function hasByteOrderMark(bytes: Uint8Array): boolean {
  return bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf
}

/**
 * Length of the well-formed sequence that starts at a byte above 0x7f, or 0 where there is none.
 * Source: The Unicode Standard 15.0, table 3-7, well-formed UTF-8 byte sequences.
 */
function sequenceLength(bytes: Uint8Array, at: number): 0 | 2 | 3 | 4 {
  const lead = bytes[at] ?? 0
  const second = bytes[at + 1] ?? 0
  if (lead >= 0xc2 && lead <= 0xdf) return isTail(second) ? 2 : 0
  if (lead >= 0xe0 && lead <= 0xef) {
    const low = lead === 0xe0 ? 0xa0 : 0x80
    const high = lead === 0xed ? 0x9f : 0xbf
    return second >= low && second <= high && isTail(bytes[at + 2]) ? 3 : 0
  }
  if (lead >= 0xf0 && lead <= 0xf4) {
    const low = lead === 0xf0 ? 0x90 : 0x80
    const high = lead === 0xf4 ? 0x8f : 0xbf
    const fits = second >= low && second <= high
    return fits && isTail(bytes[at + 2]) && isTail(bytes[at + 3]) ? 4 : 0
  }
  return 0
}

function isTail(byte: number | undefined): boolean {
  return byte !== undefined && byte >= 0x80 && byte <= 0xbf
}

function codePoint(bytes: Uint8Array, at: number, length: number): number {
  let point = (bytes[at] ?? 0) & (0xff >> (length + 1))
  for (let index = 1; index < length; index += 1) {
    point = (point << 6) | ((bytes[at + index] ?? 0) & 0x3f)
  }
  return point
}

function pushCodePoint(units: number[], point: number): void {
  if (point < 0x10000) units.push(point)
  else units.push(0xd7c0 + (point >> 10), 0xdc00 + (point & 0x3ff))
}

function lineAt(bytes: Uint8Array, end: number): number {
  let line = 1
  for (let at = 0; at < end; at += 1) if (bytes[at] === 0x0a) line += 1
  return line
}
