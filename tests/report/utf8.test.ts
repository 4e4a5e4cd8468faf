import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { decodeUtf8 } from '#report/utf8.ts'

/** The platform's own strict decoder. */
function reference(bytes: Uint8Array): string | null {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes)
  } catch {
    return null
  }
}

describe('decodeUtf8', () => {
  it('agrees with the platform on any bytes', () => {
    const nearly = fc.array(
      fc.oneof(
        fc.constantFrom(
          0x7f,
          0x80,
          0xbf,
          0xc1,
          0xc2,
          0xdf,
          0xe0,
          0xa0,
          0xed,
          0x9f,
          0xef,
          0xf0,
          0x90,
          0xf4,
          0x8f,
          0xf5,
        ),
        fc.nat(255),
      ),
      { maxLength: 12 },
    )
    fc.assert(
      fc.property(nearly.map(Uint8Array.from.bind(Uint8Array)), (bytes) => {
        const decoded = decodeUtf8(bytes)
        expect(decoded.ok ? decoded.text : null).toBe(reference(bytes))
      }),
      { numRuns: 20_000 },
    )
  })

  it('agrees with the platform on any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 200 }), (text) => {
        expect(decodeUtf8(new TextEncoder().encode(text))).toEqual({
          ok: true,
          text: text.replace(/^\ufeff/, ''),
        })
      }),
      { numRuns: 2000 },
    )
  })

  it('reads long texts and names the line of a wrong byte', () => {
    const long = `${'é€😀\n'.repeat(20_000)}`
    expect(decodeUtf8(new TextEncoder().encode(long))).toEqual({ ok: true, text: long })
    expect(decodeUtf8(Uint8Array.of(0x61, 0x0a, 0x0a, 0xff))).toEqual({
      ok: false,
      line: 3,
      byte: 0xff,
    })
  })
})
