import type { IncomingMessage } from 'node:http'
import { maxCallBytes } from '#contract/wire.ts'

/** The whole body of a request as text, or null where it is larger than any call can be. */
export function readBody(request: IncomingMessage): Promise<string | null> {
  return new Promise((resolve, reject) => {
    if (Number(request.headers['content-length'] ?? 0) > maxCallBytes) return resolve(null)
    const chunks: Buffer[] = []
    let bytes = 0
    request.on('data', (chunk: Buffer) => {
      bytes += chunk.length
      // Reading goes on, so that the sender is able to hear the answer; nothing is kept any more.
      if (bytes > maxCallBytes) {
        chunks.length = 0
        resolve(null)
      } else chunks.push(chunk)
    })
    request.once('end', () => resolve(Buffer.concat(chunks).toString('utf8')))
    request.once('error', reject)
    request.once('close', () => reject(new Error('The request was broken off.')))
  })
}
