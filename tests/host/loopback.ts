/** A loopback host for a test, and requests that say exactly what they are told: `fetch` forbids most lies. */
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises'
import { request } from 'node:http'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Handlers } from '#contract/host.ts'
import { encode } from '#contract/wire.ts'
import { type LoopbackHost, startHost } from '#host/server.ts'

export interface Answer {
  readonly status: number
  readonly headers: Readonly<Record<string, string | string[] | undefined>>
  readonly body: string
}

export interface TestHost {
  readonly host: LoopbackHost
  readonly authority: string
  readonly token: string
  /** What the host reported as bugs. */
  readonly reports: readonly string[]
  /** Sends a request line and headers as they are, without any tidying. */
  send(options: Sent): Promise<Answer>
  /** A call as the window makes it, but for what is said otherwise. */
  call(options?: Sent): Promise<Answer>
  stop(): Promise<void>
}

interface Sent {
  readonly method?: string
  readonly path?: string
  readonly headers?: Readonly<Record<string, string>>
  readonly body?: string | Iterable<Buffer>
}

export async function startTestHost(handlers: Handlers): Promise<TestHost> {
  const folder = await mkdtemp(join(tmpdir(), 'lagwright-host-'))
  const pageFolder = await writePage(folder)
  const reports: string[] = []
  const report = (_reference: string, name: string, error: unknown) => {
    reports.push(`${name}: ${error}`)
  }
  const host = await startHost({ handlers, report, pageFolder, port: 0 })
  const { host: authority, hash } = new URL(host.url)
  const token = new URLSearchParams(hash.slice(1)).get('token') ?? ''
  const send = (options: Sent) => sendTo(authority, options)
  return {
    host,
    authority,
    token,
    reports,
    send,
    call: (options = {}) =>
      send({
        method: 'POST',
        path: '/call',
        body: encode(['preferences.read', {}]),
        ...options,
        headers: {
          origin: host.origin,
          authorization: `Bearer ${token}`,
          'content-type': 'application/json',
          ...options.headers,
        },
      }),
    async stop() {
      await host.close()
      await rm(folder, { recursive: true })
    },
  }
}

/** A page, and beside it what must never be served. */
async function writePage(folder: string): Promise<string> {
  const page = join(folder, 'ui')
  await mkdir(join(page, 'assets'), { recursive: true })
  await writeFile(join(page, 'index.html'), '<!doctype html><title>Page</title>')
  await writeFile(join(page, 'assets', 'main.js'), 'export {}')
  await writeFile(join(page, 'assets', 'main.js.map'), '{}')
  await writeFile(join(page, '.html'), 'hidden')
  await writeFile(join(folder, 'secret.html'), 'secret')
  await mkdir(join(folder, 'ui-not'))
  await writeFile(join(folder, 'ui-not', 'secret.html'), 'secret')
  return page
}

function sendTo(authority: string, { method = 'GET', path = '/', headers, body }: Sent) {
  const { hostname, port } = new URL(`http://${authority}`)
  return new Promise<Answer>((resolve, reject) => {
    const outgoing = request(
      { hostname, port, method, path, headers: { host: authority, ...headers }, agent: false },
      async (incoming) => {
        const chunks: Buffer[] = []
        for await (const chunk of incoming) chunks.push(chunk as Buffer)
        const text = Buffer.concat(chunks).toString('utf8')
        resolve({ status: incoming.statusCode ?? 0, headers: incoming.headers, body: text })
      },
    )
    outgoing.once('error', reject)
    if (typeof body === 'string') outgoing.end(body)
    else {
      for (const chunk of body ?? []) outgoing.write(chunk)
      outgoing.end()
    }
  })
}
