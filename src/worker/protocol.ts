/** What the window and its worker say to each other. All of it is plain data. */
import type { Catalogue } from '#catalogue/types.ts'
import type { RunValues } from '#model/fields.ts'
import type { RunBrief } from '#model/run-brief.ts'
import type { RunDetail, RunOutcome } from '#sizing/result.ts'

export interface RunToSize {
  readonly id: string
  readonly values: RunValues
}

export type Request =
  | { readonly kind: 'catalogue'; readonly catalogue: Catalogue }
  | {
      readonly kind: 'size'
      readonly ticket: number
      readonly defaults: RunValues
      readonly runs: readonly RunToSize[]
    }
  | {
      readonly kind: 'sheet'
      readonly ticket: number
      readonly defaults: RunValues
      readonly values: RunValues
    }

export type Answer =
  | {
      readonly kind: 'sized'
      readonly ticket: number
      readonly briefs: readonly (readonly [id: string, brief: RunBrief])[]
    }
  | { readonly kind: 'sheet'; readonly ticket: number; readonly sheet: Sheet }

/** All about one run, for the run sheet. */
export interface Sheet {
  readonly outcome: RunOutcome
  readonly detail: RunDetail | null
}
