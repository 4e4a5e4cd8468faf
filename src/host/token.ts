import { randomBytes, timingSafeEqual } from 'node:crypto'

interface Token {
  readonly text: string
  /** Whether an Authorization header carries it; takes the same time wherever it differs. */
  matches(authorization: string | undefined): boolean
}

/** 256 random bits that only the browser opened by this host knows. */
export function newToken(): Token {
  const token = randomBytes(32)
  return {
    text: token.toString('base64url'),
    matches(authorization) {
      const text = /^Bearer ([\w-]{43})$/.exec(authorization ?? '')?.[1] ?? ''
      const given = Buffer.from(text, 'base64url')
      return given.length === token.length && timingSafeEqual(given, token)
    },
  }
}
