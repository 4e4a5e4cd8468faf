import { once } from 'node:events'
import { createConnection } from 'node:net'
import { setTimeout } from 'node:timers/promises'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { decode, encode, maxCallBytes } from '#contract/wire.ts'
import { handlersWith } from '../contract/handlers.ts'
import { startTestHost, type TestHost } from './loopback.ts'

const preferences = { theme: 'dark', units: 'us', density: 'compact' } as const
let its: TestHost
beforeAll(async () => {
  its = await startTestHost(
    handlersWith({
      'preferences.read': () => preferences,
      'job.commit': ({ revision }) => ({ revision: revision + 1, savedAt: '2026-12-01T00:00:00Z' }),
    }),
  )
})
afterAll(() => its.stop())

describe('a call', () => {
  test('is answered when everything about it is right', async () => {
    const answer = await its.call()
    expect(answer.status).toBe(200)
    expect(decode(answer.body)).toEqual({ ok: true, value: preferences })
    expect(answer.headers['content-type']).toBe('application/json')
    expect(answer.headers['cache-control']).toBe('no-store')
  })

  const evil = 'http://example.org'
  test.each([
    ['another site for its origin', { headers: { origin: evil } }, 403],
    ['no origin', { headers: { origin: '' } }, 403],
    ['an opaque origin', { headers: { origin: 'null' } }, 403],
    ['the host by its name', { headers: { host: 'localhost' } }, 421],
    ['a rebound name', { headers: { host: 'example.org' } }, 421],
    ['the address without its port', { headers: { host: '127.0.0.1' } }, 421],
    ['no token', { headers: { authorization: '' } }, 403],
    [
      'a token of the right length',
      { headers: { authorization: `Bearer ${'A'.repeat(43)}` } },
      403,
    ],
    ['a short token', { headers: { authorization: 'Bearer A' } }, 403],
    ['another scheme', { headers: { authorization: `Basic ${'A'.repeat(43)}` } }, 403],
    ['a form', { headers: { 'content-type': 'text/plain' } }, 415],
    ['a form that looks like JSON', { headers: { 'content-type': 'text/plain;json' } }, 415],
    ['GET', { method: 'GET', body: '' }, 405],
    ['PUT', { method: 'PUT' }, 405],
    ['OPTIONS', { method: 'OPTIONS', body: '' }, 405],
    ['no body', { body: '' }, 400],
    ['plain JSON that is no call', { body: '{"name":"preferences.read"}' }, 400],
    ['half a call', { body: encode(['preferences.read']) }, 400],
    ['a body that is no text', { body: [Buffer.from([0xff, 0xfe, 0x00])] }, 400],
    ['a reference to nowhere', { body: '[[99,1],"x"]' }, 400],
  ])('is refused with %s', async (_what, options, status) => {
    const answer = await its.call(options)
    expect(answer.status).toBe(status)
    expect(answer.body).not.toContain('theme')
  })

  test('is refused with a token that differs in its last letter only', async () => {
    const last = its.token.endsWith('A') ? 'E' : 'A'
    const authorization = `Bearer ${its.token.slice(0, -1)}${last}`
    expect((await its.call({ headers: { authorization } })).status).toBe(403)
  })

  test('that nobody knows is a failure, not an error of HTTP', async () => {
    const answer = await its.call({ body: encode(['__proto__', {}]) })
    expect(decode(answer.body)).toEqual({
      ok: false,
      failure: { code: 'request/unknown', name: '__proto__' },
    })
  })

  test('is refused unread when it says that it is too large', async () => {
    const headers = { 'content-length': String(maxCallBytes + 1) }
    const answer = await its.call({ headers, body: [] })
    expect(answer.status).toBe(413)
  })

  test('is refused when it turns out too large without having said so', async () => {
    const chunk = Buffer.alloc(1024 * 1024, 'x')
    const body = Array.from({ length: maxCallBytes / chunk.length + 1 }, () => chunk)
    const answer = await its.call({ headers: { 'transfer-encoding': 'chunked' }, body })
    expect(answer.status).toBe(413)
  })

  test('of 10 000 runs with long texts fits', async () => {
    const long = 'x'.repeat(200)
    const run = (index: number) => ({
      id: `run-${index}`,
      values: { tag: `T-${index}`, description: long, reachReason: long, layers: `${long}${long}` },
    })
    const putRuns = Array.from({ length: 10_000 }, (_, index) => run(index))
    const body = encode(['job.commit', { revision: 1, putRuns, removeRuns: [] }])
    expect(body.length).toBeLessThan(maxCallBytes / 3)
    const answer = await its.call({ body })
    expect(answer.status).toBe(200)
  })

  test('that breaks off harms nobody and is no bug', async () => {
    const { hostname, port } = new URL(its.host.origin)
    const socket = createConnection({ host: hostname, port: Number(port) })
    await once(socket, 'connect')
    const head = [
      'POST /call HTTP/1.1',
      `host: ${its.authority}`,
      `origin: ${its.host.origin}`,
      `authorization: Bearer ${its.token}`,
      'content-type: application/json',
      'content-length: 100',
    ]
    socket.write(`${head.join('\r\n')}\r\n\r\n[`)
    await setTimeout(50)
    socket.destroy()
    await setTimeout(50)
    expect((await its.call()).status).toBe(200)
  })
})

describe('the page', () => {
  test('is served with every header that guards it', async () => {
    const answer = await its.send({ path: '/' })
    expect(answer.status).toBe(200)
    expect(answer.body).toContain('<title>Page</title>')
    expect(answer.headers).toMatchObject({
      'content-type': 'text/html; charset=utf-8',
      'x-content-type-options': 'nosniff',
      'referrer-policy': 'no-referrer',
      'cross-origin-opener-policy': 'same-origin',
      'cross-origin-resource-policy': 'same-origin',
    })
    const policy = answer.headers['content-security-policy']
    for (const part of [
      "default-src 'none'",
      "script-src 'self'",
      "font-src 'self'",
      "frame-ancestors 'none'",
      "require-trusted-types-for 'script'",
    ])
      expect(policy).toContain(part)
    expect(policy).not.toContain('unsafe')
  })

  test('is served with a query, and by its head alone', async () => {
    expect((await its.send({ path: '/assets/main.js?v=1' })).body).toBe('export {}')
    const head = await its.send({ method: 'HEAD', path: '/assets/main.js' })
    expect([head.status, head.body]).toEqual([200, ''])
  })

  test.each([
    '/../secret.html',
    '/assets/../../secret.html',
    '/%2e%2e/secret.html',
    '/%2e%2e%2fsecret.html',
    '/..%2fsecret.html',
    '/..%5csecret.html',
    '/%252e%252e/secret.html',
    '/../ui-not/secret.html',
    '//secret.html',
    '/index.html%00.png',
    '/%',
    '/%c0%ae%c0%ae/secret.html',
    '/assets',
    '/assets/',
    '/assets/main.js.map',
    '/assets/main.js/',
    '/.html',
    '/no-such-file.html',
    '/package.json',
  ])('serves nothing for %s', async (path) => {
    const answer = await its.send({ path })
    expect(answer.status).toBe(404)
    expect(answer.body).not.toMatch(/secret|hidden|main/)
  })

  test.each(['*', 'secret.html', 'http://example.org/', '?'])(
    'refuses the request target "%s"',
    async (path) => {
      const answer = await its.send({ path })
      expect([400, 404]).toContain(answer.status)
    },
  )

  test.each(['POST', 'PUT', 'DELETE', 'OPTIONS', 'TRACE'])(
    'is not there for %s',
    async (method) => {
      const answer = await its.send({ method, path: '/' })
      expect([answer.status, answer.headers.allow]).toEqual([405, 'GET, HEAD'])
    },
  )

  test('is not there under another name of this machine', async () => {
    for (const host of ['localhost', 'example.org', '[::1]'])
      expect((await its.send({ headers: { host } })).status).toBe(421)
  })
})

test('none of this was a bug to the host', () => {
  expect(its.reports).toEqual([])
})

test('two hosts never share a token', async () => {
  const other = await startTestHost(handlersWith({}))
  expect(other.token).not.toBe(its.token)
  expect(Buffer.from(other.token, 'base64url')).toHaveLength(32)
  await other.stop()
})
