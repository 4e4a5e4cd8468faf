/** Every failure the program foresees, with what it carries and the one sentence a person reads. */

export type Failure =
  | { readonly code: 'job/not-found'; readonly path: string }
  | { readonly code: 'job/not-a-job'; readonly path: string; readonly why: string }
  | {
      readonly code: 'job/too-new'
      readonly path: string
      readonly found: number
      readonly known: number
    }
  | { readonly code: 'job/damaged'; readonly path: string; readonly why: string }
  | { readonly code: 'job/exists'; readonly path: string }
  | { readonly code: 'job/not-writable'; readonly path: string; readonly why: string }
  | { readonly code: 'job/unreadable'; readonly path: string; readonly why: string }
  | { readonly code: 'job/in-use'; readonly path: string }
  | { readonly code: 'job/stale'; readonly found: number; readonly expected: number }
  | { readonly code: 'job/left' }
  | { readonly code: 'job/too-many-runs'; readonly max: number }
  | { readonly code: 'job/wrong-ending'; readonly path: string }
  | {
      readonly code: 'catalogue/too-new'
      readonly path: string
      readonly found: number
      readonly known: number
    }
  | { readonly code: 'preferences/not-kept'; readonly path: string; readonly why: string }
  | { readonly code: 'request/unknown'; readonly name: string }
  | { readonly code: 'request/invalid'; readonly issues: string }
  | { readonly code: 'request/too-large'; readonly maxBytes: number }
  | { readonly code: 'host/gone' }
  | { readonly code: 'host/no-key' }
  | { readonly code: 'internal'; readonly reference: string }

const sentences: { [F in Failure as F['code']]: (failure: F) => string } = {
  'job/not-found': ({ path }) =>
    `There is no file at ${path}. Check the path, or create a new job.`,
  'job/not-a-job': ({ path, why }) =>
    `${path} is not a Lagwright job (${why}). It was not changed. Choose a job that Lagwright has saved.`,
  'job/too-new': ({ path, found, known }) =>
    `${path} was written by a newer Lagwright (version ${found} of the file, this program knows ${known}). It was not changed. Update Lagwright to open it.`,
  'job/damaged': ({ path, why }) =>
    `${path} is damaged (${why}). It was not changed. Open a backup copy, or the file on another machine.`,
  'job/exists': ({ path }) =>
    `${path} is already there. Choose another name, or say that it may be replaced.`,
  'job/not-writable': ({ path, why }) =>
    `${path} cannot be written (${why}). Your work is kept here; save it under another name or in another folder.`,
  'job/unreadable': ({ path, why }) =>
    `${path} cannot be read (${why}). Check that the drive is there and that you may read the file.`,
  'job/in-use': ({ path }) => `${path} is open in another Lagwright window. Close it there first.`,
  'job/stale': ({ found, expected }) =>
    `This window is behind its file (change ${found}, the file is at ${expected}): another window wrote to it. Reopen the job to go on.`,
  'job/left': () =>
    'Another window of this Lagwright has opened another job, so nothing is written to this one any more. Open this job again to go on.',
  'job/too-many-runs': ({ max }) =>
    `A job holds at most ${max} runs. Take back what was added last, and put it in a job of its own.`,
  'job/wrong-ending': ({ path }) =>
    `${path} does not end in .lagjob. Give the file a name that does.`,
  'catalogue/too-new': ({ path, found, known }) =>
    `The catalogue ${path} was written by a newer Lagwright (version ${found}, this program knows ${known}). It was not changed. Update Lagwright, or start it with another data folder.`,
  'preferences/not-kept': ({ path, why }) =>
    `Your settings could not be written to ${path} (${why}). They hold until the window is closed.`,
  'request/unknown': ({ name }) => `The program does not know the request ${name}.`,
  'request/invalid': ({ issues }) => `The request was not understood: ${issues}`,
  'request/too-large': ({ maxBytes }) =>
    `This is more than Lagwright takes at once (${Math.round(maxBytes / 1024 / 1024)} MiB). Do it in smaller parts.`,
  'host/no-key': () =>
    'This page has no key to Lagwright. Open the whole address that Lagwright printed when it started, with what follows the #.',
  'host/gone': () =>
    'Lagwright is no longer running behind this page. Start it again; what you saved is safe.',
  internal: ({ reference }) =>
    `Something went wrong inside Lagwright (reference ${reference}). Your saved work is safe.`,
}

/** The sentence of a failure. */
export function explain(failure: Failure): string {
  return (sentences[failure.code] as (failure: Failure) => string)(failure)
}

/** A foreseen failure on its way up; anything else that is thrown is a bug. */
export class AppError extends Error {
  override readonly name = 'AppError'
  readonly failure: Failure
  constructor(failure: Failure, options?: ErrorOptions) {
    super(explain(failure), options)
    this.failure = failure
  }
}
