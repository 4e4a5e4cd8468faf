/** Both ends of the contract: `serve` answers calls in a host, `connect` makes them from the window. */
import { parse, stringify } from 'devalue'
import { z } from 'zod'
import { AppError, type Failure } from './failures.ts'
import { type CallName, type Handlers, type Host, hostCalls } from './host.ts'

/** What crosses the border: an error thrown in a handler would not arrive as the same error. */
export type Reply =
  | { readonly ok: true; readonly value: unknown }
  | { readonly ok: false; readonly failure: Failure }

/** Carries one call to the host and its reply back. */
export type Transport = (name: string, input: unknown) => Promise<Reply>

/** Told of every bug, with the short reference that the user can quote. */
export type Report = (reference: string, name: string, error: unknown) => void

type Answer = (name: unknown, input: unknown) => Promise<Reply>

/** Answers calls that come from outside: checks name, input and output, and never throws. */
export function serve(handlers: Handlers, report: Report): Answer {
  return async (name, input) => {
    if (!isCallName(name)) return fail({ code: 'request/unknown', name: shown(name) })
    const { input: inputSchema, output: outputSchema } = hostCalls[name]
    try {
      const asked = inputSchema.safeParse(input)
      if (!asked.success) return fail({ code: 'request/invalid', issues: issuesOf(asked.error) })
      // The table pairs each name with its own schemas, which a union of names cannot express.
      const handler = handlers[name] as (input: unknown) => unknown
      return { ok: true, value: outputSchema.parse(await handler(asked.data)) }
    } catch (error) {
      if (error instanceof AppError) return fail(error.failure)
      const reference = newReference()
      report(reference, name, error)
      return fail({ code: 'internal', reference })
    }
  }
}

/** The typed host behind a transport; a failure arrives as the AppError it was. */
export function connect(transport: Transport): Host {
  const entries = Object.keys(hostCalls).map((name) => [
    name,
    async (input: unknown) => {
      const reply = await transport(name, input)
      if (!reply.ok) throw new AppError(reply.failure)
      return reply.value
    },
  ])
  return Object.fromEntries(entries) as Host
}

/** The largest call over HTTP; a paste of 10 000 runs with long texts stays below a third of it. */
export const maxCallBytes = 32 * 1024 * 1024

/** Text for HTTP that carries what structured clone carries too: undefined, dates, maps, -0. */
export const encode = (value: unknown): string => stringify(value)
export const decode = (text: string): unknown => parse(text)

const fail = (failure: Failure): Reply => ({ ok: false, failure })

const isCallName = (name: unknown): name is CallName =>
  typeof name === 'string' && Object.hasOwn(hostCalls, name)

const shown = (name: unknown): string =>
  typeof name === 'string' ? name.slice(0, 80) : `of type ${typeof name}`

/** Enough issues to act on: a wrong list of 10 000 runs should not answer with 10 000 lines. */
function issuesOf(error: z.ZodError): string {
  const shownIssues = error.issues.slice(0, 5)
  const rest = error.issues.length - shownIssues.length
  const text = z.prettifyError(new z.ZodError(shownIssues))
  return rest > 0 ? `${text}\n… and ${rest} more` : text
}

/** Six letters and digits without look-alikes, so that a person can read them out. */
function newReference(): string {
  const letters = '23456789ABCDEFGHJKMNPQRSTUVWXYZ'
  const pick = () => letters[Math.floor(Math.random() * letters.length)]
  return Array.from({ length: 6 }, pick).join('')
}
