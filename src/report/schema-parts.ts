/** What the schemas of all commands share. */
import '#model/zod-settings.ts'
import { z } from 'zod'

export const finite = (description: string) => z.number().describe(description)
export const orNull = (description: string) => z.number().nullable().describe(description)
export const text = (description: string) => z.string().describe(description)

export const caution = z.strictObject({
  code: text('Name of the caution, stable over versions'),
  text: text('The caution'),
  deferTo: text('Who decides in doubt'),
})

type Plain<T> = T extends readonly unknown[] | object
  ? { -readonly [K in keyof T]: Plain<T[K]> }
  : T

/** True where a schema gives just what a type says: the proof beside a schema fails to compile where they part. */
export type IsSame<A, B> =
  (<T>() => T extends Plain<A> ? 1 : 2) extends <T>() => T extends Plain<B> ? 1 : 2 ? true : false
