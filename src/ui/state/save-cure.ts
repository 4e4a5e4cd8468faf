/** What helps where the last changes could not be written: only what can work is offered. */
import type { Failure } from '#contract/failures.ts'

export type SaveAct = 'copy' | 'reopen' | 'try' | 'save as'

export interface SaveCure {
  /** Follows the sentence of the failure. */
  readonly sentence: string
  readonly acts: readonly SaveAct[]
}

/** `hasFile`: the job has a file of its own, so that it can be asked for. */
export function cureOf(code: Failure['code'] | null, hasFile: boolean): SaveCure {
  switch (code) {
    // A host that is started again has another address and another key: this page never reaches it.
    case 'host/gone':
    case 'host/no-key':
      return {
        sentence:
          'Your last changes are only in this window. Copy the changed runs here, open the new address that Lagwright prints then, and paste them there.',
        acts: ['copy'],
      }
    case 'job/left':
      if (!hasFile)
        return {
          sentence:
            'Your last changes are only in this window: copy the changed runs, open this job under Job, Earlier drafts, and paste them there.',
          acts: ['copy'],
        }
      return reopening
    case 'job/stale':
      return reopening
    // Its own sentence says where the work is.
    case 'job/not-writable':
      return { sentence: '', acts: ['try', 'save as'] }
    default:
      return { sentence: 'Your last changes are kept in this window.', acts: ['try', 'save as'] }
  }
}

const reopening: SaveCure = {
  sentence:
    'Your last changes are only in this window and go when the job is opened again: copy the changed runs first, and paste them there.',
  acts: ['copy', 'reopen'],
}
