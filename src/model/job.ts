/** The job as the window and the command line hold it: immutable values; SQLite keeps one row per run. */
import './zod-settings.ts'
import { z } from 'zod'
import { type FieldKey, fields, type RunValues } from './fields.ts'

function valueSchema(field: (typeof fields)[number]): z.ZodType {
  switch (field.kind) {
    case 'number':
      return z.number().min(field.min).max(field.max)
    case 'flag':
      return z.boolean()
    case 'choice':
      return z.enum(field.choices)
    case 'text':
      return z.string().max(field.maxLength)
  }
}

export const runValuesSchema = z
  .strictObject(
    Object.fromEntries(fields.map((field) => [field.key, valueSchema(field).optional()])),
  )
  .transform((values) => values as RunValues)

/** One line of the schedule. */
export interface Run {
  readonly id: string
  readonly values: RunValues
  /** What was typed or pasted into a cell and is not a valid value of it: kept as typed until it is mended. */
  readonly drafts: Readonly<Partial<Record<FieldKey, string>>>
}

/** Values every run of the job takes unless it has its own. */
export type JobDefaults = RunValues

export interface Job {
  readonly name: string
  readonly site: string
  readonly defaults: JobDefaults
  readonly runs: readonly Run[]
}

/** More than any list of runs; what a file holds must be readable in one piece. */
export const maxRuns = 100_000

const idSchema = z.string().min(1).max(64)
const fieldKeys: ReadonlySet<string> = new Set(fields.map((field) => field.key))
const draftsSchema = z
  .record(
    z.string().refine((key) => fieldKeys.has(key)),
    z.string().max(2000),
  )
  .transform((drafts) => drafts as Run['drafts'])

export const runSchema = z.strictObject({
  id: idSchema,
  values: runValuesSchema,
  drafts: draftsSchema,
}) as z.ZodType<Run>

export const jobSchema = z.strictObject({
  name: z.string().max(200),
  site: z.string().max(200),
  defaults: runValuesSchema,
  runs: z.array(runSchema).max(maxRuns),
}) as z.ZodType<Job>
