/** All that the window may ask of its host, Electron or the loopback host. One line per call. */
import '#model/zod-settings.ts'
import { z } from 'zod'
import type { Catalogue } from '#catalogue/types.ts'
import { type Job, jobSchema, maxRuns, runSchema, runValuesSchema } from '#model/job.ts'

const call = <I extends z.ZodType, O extends z.ZodType>(input: I, output: O) => ({ input, output })

/** The open job and where it lives. */
export interface OpenJob {
  readonly job: Job
  /** Full path of the file; null for a job that has not been given a name yet. */
  readonly path: string | null
  /** File name to show; "Not saved yet" is the window's own word for null. */
  readonly fileName: string | null
  /** Counts the commits written; a commit must name the revision it builds on. */
  readonly revision: number
  /** Tells this opening of the job from any other: two pages of one host may each have opened a job. */
  readonly opening: string
  /** What the user should know about how this job came to be open, in a sentence; absent where there is nothing. */
  readonly notice?: string
}
const openingSchema = z.string().max(64)
const openJobSchema = z.strictObject({
  job: jobSchema,
  path: z.string().nullable(),
  fileName: z.string().nullable(),
  revision: z.int().min(0),
  opening: openingSchema,
  notice: z.string().optional(),
}) as z.ZodType<OpenJob>

/** A job without a file of its own that was left for another one. */
export interface Draft {
  readonly path: string
  readonly name: string
  readonly runs: number
  /** ISO 8601, UTC. */
  readonly savedAt: string
}
const draftsSchema = z.array(
  z.strictObject({ path: z.string(), name: z.string(), runs: z.int().min(0), savedAt: z.string() }),
) as z.ZodType<readonly Draft[]>

/** Only what changed: each committed edit is written at once, in one transaction. */
export const jobChangeSchema = z.strictObject({
  /** The opening that is meant; absent for whichever job is open. */
  opening: openingSchema.optional(),
  revision: z.int().min(0),
  name: z.string().max(200).optional(),
  site: z.string().max(200).optional(),
  defaults: runValuesSchema.optional(),
  putRuns: z.array(runSchema).max(maxRuns),
  removeRuns: z.array(z.string().max(64)).max(maxRuns),
  /** Ids of all runs in their new order; absent where the order did not change. */
  order: z.array(z.string().max(64)).max(maxRuns).optional(),
})
export type JobChange = z.output<typeof jobChangeSchema>

export const preferencesSchema = z.strictObject({
  theme: z.enum(['system', 'light', 'dark']),
  units: z.enum(['si', 'us']),
  density: z.enum(['comfortable', 'compact']),
})
export type Preferences = z.output<typeof preferencesSchema>

const pathSchema = z.string().min(1).max(4096)

export const hostCalls = {
  'catalogue.read': call(
    z.strictObject({}),
    z.custom<Catalogue>((value) => typeof value === 'object' && value !== null),
  ),
  /** The job last open, or the demo on first start. */
  'job.current': call(z.strictObject({}), openJobSchema),
  'job.new': call(z.strictObject({}), openJobSchema),
  'job.demo': call(z.strictObject({}), openJobSchema),
  /** Without a path the desktop shell shows its dialog; null when the user turned back. */
  'job.open': call(z.strictObject({ path: pathSchema.optional() }), openJobSchema.nullable()),
  /** Jobs without a file of their own, but for the open one. */
  'job.drafts': call(z.strictObject({}), draftsSchema),
  'job.saveAs': call(
    z.strictObject({
      path: pathSchema.optional(),
      overwrite: z.boolean(),
      opening: openingSchema.optional(),
    }),
    openJobSchema.nullable(),
  ),
  'job.commit': call(jobChangeSchema, z.strictObject({ revision: z.int(), savedAt: z.string() })),
  'preferences.read': call(z.strictObject({}), preferencesSchema),
  'preferences.write': call(preferencesSchema, z.strictObject({})),
  /** What this host can do: `dialogs` is false on the loopback host, where the window asks for a path itself. */
  'host.about': call(
    z.strictObject({}),
    z.strictObject({
      kind: z.enum(['desktop', 'loopback']),
      dialogs: z.boolean(),
      folder: z.string(),
      version: z.string(),
    }),
  ),
} as const

export type CallName = keyof typeof hostCalls
export type Input<N extends CallName> = z.input<(typeof hostCalls)[N]['input']>
export type Output<N extends CallName> = z.output<(typeof hostCalls)[N]['output']>
export type Handlers = {
  readonly [N in CallName]: (
    input: z.output<(typeof hostCalls)[N]['input']>,
  ) => Output<N> | Promise<Output<N>>
}
export type Host = { readonly [N in CallName]: (input: Input<N>) => Promise<Output<N>> }
