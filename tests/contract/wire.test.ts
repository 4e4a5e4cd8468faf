import fc from 'fast-check'
import { describe, expect, test, vi } from 'vitest'
import { AppError } from '#contract/failures.ts'
import { hostCalls } from '#contract/host.ts'
import { connect, decode, encode, type Reply, serve } from '#contract/wire.ts'
import { handlersWith } from './handlers.ts'

const preferences = { theme: 'light', units: 'si', density: 'comfortable' } as const
const noBug = (_reference: string, name: string, error: unknown) => {
  throw new Error(`${name} was reported as a bug: ${error}`)
}

describe('serve', () => {
  test('hands the checked input on and packs the value', async () => {
    const write = vi.fn(() => ({}))
    const answer = serve(handlersWith({ 'preferences.write': write }), noBug)
    expect(await answer('preferences.write', preferences)).toEqual({ ok: true, value: {} })
    expect(write).toHaveBeenCalledWith(preferences)
  })

  test.each([
    'toString',
    '__proto__',
    'constructor',
    'hasOwnProperty',
    'preferences',
    '',
    'preferences.read ',
  ])('does not know "%s"', async (name) => {
    const answer = serve(handlersWith({}), noBug)
    expect(await answer(name, {})).toEqual({
      ok: false,
      failure: { code: 'request/unknown', name },
    })
  })

  test('says what is wrong with an input, and at most five things', async () => {
    const answer = serve(handlersWith({}), noBug)
    const reply = await answer('job.commit', {
      revision: 0,
      putRuns: [],
      removeRuns: Array.from({ length: 30 }, () => 7),
    })
    if (reply.ok || reply.failure.code !== 'request/invalid') throw new Error('It was accepted.')
    expect(reply.failure.issues).toContain('removeRuns[0]')
    expect(reply.failure.issues).toContain('and 25 more')
    expect(reply.failure.issues.split('\n').length).toBeLessThan(15)
  })

  test('passes a foreseen failure on as data', async () => {
    const failure = { code: 'job/not-found', path: '/a.lagjob' } as const
    const fail = () => {
      throw new AppError(failure)
    }
    const answer = serve(handlersWith({ 'job.open': fail }), noBug)
    expect(await answer('job.open', {})).toEqual({ ok: false, failure })
  })

  test('reports a bug under the reference that the user sees, and keeps its text to itself', async () => {
    const report = vi.fn()
    const bug = new Error('secret path /home/someone')
    const answer = serve(handlersWith({ 'preferences.read': () => Promise.reject(bug) }), report)
    const reply = await answer('preferences.read', {})
    if (reply.ok || reply.failure.code !== 'internal') throw new Error('It is no bug.')
    expect(reply.failure.reference).toMatch(/^[2-9A-HJKMNP-Z]{6}$/)
    expect(report).toHaveBeenCalledExactlyOnceWith(reply.failure.reference, 'preferences.read', bug)
    expect(JSON.stringify(reply)).not.toContain('secret')
  })

  test('does not let out an answer that breaks the contract', async () => {
    const report = vi.fn()
    const wrong = { ...preferences, theme: 'purple' } as unknown as typeof preferences
    const answer = serve(handlersWith({ 'preferences.read': () => wrong }), report)
    const reply = await answer('preferences.read', {})
    expect(reply).toMatchObject({ ok: false, failure: { code: 'internal' } })
    expect(report).toHaveBeenCalledOnce()
  })

  test('answers whatever comes, and never throws', async () => {
    const report = vi.fn()
    const answer = serve(handlersWith({}), report)
    const names = fc.oneof(
      fc.constantFrom(...Object.keys(hostCalls)),
      fc.string(),
      fc.anything({ withBigInt: true, withDate: true, withMap: true, withNullPrototype: true }),
    )
    const inputs = fc.anything({
      withBigInt: true,
      withDate: true,
      withMap: true,
      withSet: true,
      withNullPrototype: true,
      withTypedArray: true,
      withSparseArray: true,
      maxDepth: 4,
    })
    await fc.assert(
      fc.asyncProperty(names, inputs, async (name, input) => {
        const reply = await answer(name, input)
        expect(typeof reply.ok).toBe('boolean')
        if (!reply.ok) expect(new AppError(reply.failure).message).not.toBe('')
      }),
      { numRuns: 2000 },
    )
  })

  test('refuses an input whose every look is a trap', async () => {
    const trap = new Proxy(
      {},
      {
        get() {
          throw new Error('trap')
        },
        ownKeys() {
          throw new Error('trap')
        },
      },
    )
    const reply = await serve(handlersWith({}), () => {})('job.commit', trap)
    expect(reply.ok).toBe(false)
  })
})

describe('connect', () => {
  test('offers every call of the contract, and no other', () => {
    const host = connect(async () => ({ ok: true, value: null }))
    expect(Object.keys(host).sort()).toEqual(Object.keys(hostCalls).sort())
  })

  test('gives the value, and throws the failure as the AppError it was', async () => {
    const failure = { code: 'job/exists', path: '/b.lagjob' } as const
    const replies: Record<string, Reply> = {
      'preferences.read': { ok: true, value: preferences },
      'job.saveAs': { ok: false, failure },
    }
    const host = connect(async (name) => replies[name] ?? { ok: true, value: null })
    expect(await host['preferences.read']({})).toEqual(preferences)
    const caught = await host['job.saveAs']({ overwrite: false }).catch((error) => error)
    expect(caught).toBeInstanceOf(AppError)
    expect(caught.failure).toEqual(failure)
  })

  test('joined to serve over the text of HTTP, both ends understand each other', async () => {
    const handlers = handlersWith({
      'job.open': ({ path }) => {
        throw new AppError({ code: 'job/not-found', path: path ?? 'undefined' })
      },
    })
    const answer = serve(handlers, noBug)
    const host = connect(async (name, input) => {
      const [gotName, gotInput] = decode(encode([name, input])) as [unknown, unknown]
      return decode(encode(await answer(gotName, gotInput))) as Reply
    })
    await expect(host['job.open']({})).rejects.toThrow('no file at undefined')
  })
})

describe('the text of HTTP', () => {
  test('carries what structured clone carries', () => {
    const values = [
      undefined,
      null,
      -0,
      Number.NaN,
      Infinity,
      new Date(0),
      new Map([[1, { a: [2] }]]),
    ]
    expect(decode(encode(values))).toEqual(values)
  })

  test('is read or refused, whatever it is, and pollutes nothing', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.json()), (text) => {
        try {
          decode(text)
        } catch (error) {
          expect(error).toBeInstanceOf(Error)
        }
      }),
      { numRuns: 2000 },
    )
    expect(() => decode('[{"__proto__":1},{"polluted":2},true]')).toThrow()
    expect(({} as { polluted?: boolean }).polluted).toBeUndefined()
  })
})
