/** The loopback host: serves the window and its calls to one browser on this machine, and to nobody else. */
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http'
import { readPageFile } from '#backend/page/files.ts'
import { securityHeaders } from '#backend/page/headers.ts'
import type { Handlers } from '#contract/host.ts'
import { decode, encode, type Report, serve } from '#contract/wire.ts'
import { readBody } from './body.ts'
import { newToken } from './token.ts'

interface Options {
  readonly handlers: Handlers
  readonly report: Report
  /** Folder of the built window. */
  readonly pageFolder: string
  /** 0 lets the system choose a free one. */
  readonly port: number
}

export interface LoopbackHost {
  readonly origin: string
  /** Carries the token in its fragment, which a browser never sends nor logs. */
  readonly url: string
  close(): Promise<void>
}

export async function startHost(options: Options): Promise<LoopbackHost> {
  const token = newToken()
  const answer = serve(options.handlers, options.report)
  let authority = ''

  const server = createServer((request, response) => {
    respond(request, response).catch((error: unknown) => {
      // A sender that broke off is gone, and no bug.
      if (!request.complete) return response.destroy()
      options.report('host', request.url ?? '', error)
      if (response.headersSent) return response.destroy()
      return refuse(response, 500, 'The host failed to answer.')
    })
  })

  async function respond(request: IncomingMessage, response: ServerResponse): Promise<void> {
    // Another name for 127.0.0.1 is another site's page that had its name rebound to this machine.
    if (request.headers.host !== authority) return refuse(response, 421, 'Wrong host.')
    const path = pathOf(request.url ?? '')
    if (path === null) return refuse(response, 400, 'Bad address.')
    if (path === '/call') return respondToCall(request, response)
    if (request.method !== 'GET' && request.method !== 'HEAD')
      return refuse(response, 405, 'Only GET.', { allow: 'GET, HEAD' })
    const file = await readPageFile(options.pageFolder, path)
    if (!file) return refuse(response, 404, 'Not found.')
    response.writeHead(200, { ...file.headers, 'content-length': file.body.length })
    response.end(request.method === 'HEAD' ? undefined : file.body)
  }

  async function respondToCall(request: IncomingMessage, response: ServerResponse): Promise<void> {
    const { headers, method } = request
    if (method !== 'POST') return refuse(response, 405, 'Only POST.', { allow: 'POST' })
    if (headers.origin !== `http://${authority}`) return refuse(response, 403, 'Wrong origin.')
    if (!token.matches(headers.authorization)) return refuse(response, 403, 'Wrong token.')
    if (headers['content-type'] !== 'application/json')
      return refuse(response, 415, 'Only application/json.')
    const body = await readBody(request)
    if (body === null) return refuse(response, 413, 'Too large.')
    const call = callIn(body)
    if (!call) return refuse(response, 400, 'Not a call.')
    const reply = await answer(...call)
    response.writeHead(200, { ...securityHeaders, 'content-type': 'application/json' })
    response.end(encode(reply))
  }

  await new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen(options.port, '127.0.0.1', resolve)
  })
  const address = server.address()
  if (address === null || typeof address === 'string') throw new Error('The host has no port.')
  authority = `127.0.0.1:${address.port}`

  return {
    origin: `http://${authority}`,
    url: `http://${authority}/#token=${token.text}`,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve())
        server.closeIdleConnections()
        setTimeout(() => server.closeAllConnections(), CLOSE_MS).unref()
      }),
  }
}

/** How long a call under way may take to finish once the host is told to stop. */
const CLOSE_MS = 2000

function refuse(
  response: ServerResponse,
  status: number,
  text: string,
  headers: Readonly<Record<string, string>> = {},
): void {
  // The rest of a refused request is not worth reading, so its connection is not kept.
  const close = { connection: 'close', 'content-type': 'text/plain; charset=utf-8' }
  response.writeHead(status, { ...securityHeaders, ...close, ...headers }).end(text)
}

/** The path as it was sent: `new URL` would resolve `..` before anyone could refuse it. */
function pathOf(target: string): string | null {
  return /^(\/[^?#]*)(\?.*)?$/.exec(target)?.[1] ?? null
}

function callIn(body: string): [name: unknown, input: unknown] | null {
  try {
    const call = decode(body)
    return Array.isArray(call) && call.length === 2 ? [call[0], call[1]] : null
  } catch {
    return null
  }
}
