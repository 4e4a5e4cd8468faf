/** A workspace on a host and a worker that live in the test itself. */
import { inject } from 'vitest'
import { AppError } from '#contract/failures.ts'
import type { Draft, Host, JobChange, OpenJob } from '#contract/host.ts'
import { applyDifference } from '#model/difference.ts'
import type { RunValues } from '#model/fields.ts'
import type { Job } from '#model/job.ts'
import { Workspace } from '#ui/state/workspace.svelte.ts'
import { answerer } from '#worker/answer.ts'
import type { WorkerLike } from '#worker/client.ts'
import type { Answer, Request } from '#worker/protocol.ts'

/** A file that commits go to, and that may be made to refuse. */
export class TestFile {
  job: Job
  revision = 0
  commits: JobChange[] = []
  isFull = false
  notice: string | null = null
  drafts: Draft[] = []

  constructor(job: Job) {
    this.job = job
  }

  get open(): OpenJob {
    const place = { path: '/jobs/a.lagjob', fileName: 'a.lagjob', opening: 'first' }
    const notice = this.notice === null ? {} : { notice: this.notice }
    return { job: this.job, revision: this.revision, ...place, ...notice }
  }

  commit(change: JobChange): { revision: number; savedAt: string } {
    if (this.isFull) {
      throw new AppError({
        code: 'job/not-writable',
        path: '/jobs/a.lagjob',
        why: 'the disk is full',
      })
    }
    if (change.opening !== 'first') throw new AppError({ code: 'job/left' })
    if (change.revision !== this.revision) {
      throw new AppError({ code: 'job/stale', found: change.revision, expected: this.revision })
    }
    this.commits.push(change)
    this.job = applyDifference(this.job, change as Parameters<typeof applyDifference>[1])
    return { revision: ++this.revision, savedAt: '2026-03-01T12:04:00.000Z' }
  }
}

export function jobOf(runs: readonly RunValues[]): Job {
  return {
    name: 'Test job',
    site: '',
    defaults: { airC: 20 },
    runs: runs.map((values, index) => ({ id: `run-${index}`, values, drafts: {} })),
  }
}

export async function startWorkspace(file: TestFile): Promise<Workspace> {
  const later = async <T>(value: () => T): Promise<T> => {
    await new Promise((resolve) => setTimeout(resolve, 1))
    return value()
  }
  const host: Host = {
    'catalogue.read': () => later(() => inject('demoCatalogue')),
    'job.current': () => later(() => file.open),
    'job.new': () => later(() => ({ ...file.open, job: jobOf([]) })),
    'job.demo': () => later(() => file.open),
    'job.drafts': () => later(() => file.drafts),
    'job.open': () => later(() => file.open),
    'job.saveAs': () => later(() => file.open),
    // Through the clone, as every call goes.
    'job.commit': (change) => later(() => file.commit(structuredClone(change) as JobChange)),
    'preferences.read': () =>
      later(() => ({ theme: 'light', units: 'si', density: 'comfortable' })),
    'preferences.write': () => later(() => ({})),
    'host.about': () =>
      later(() => ({ kind: 'loopback', dialogs: false, folder: '/jobs', version: '0' })),
  }
  return Workspace.start(host, inlineWorker)
}

function inlineWorker(): WorkerLike {
  const answer = answerer()
  const listeners: ((event: { data: Answer }) => void)[] = []
  return {
    postMessage(request: Request) {
      const asked = structuredClone(request)
      setTimeout(() => {
        const data = answer(asked)
        if (data) for (const listener of listeners) listener({ data })
      })
    },
    addEventListener(type: string, listener: (event: { data: Answer }) => void) {
      if (type === 'message') listeners.push(listener)
    },
    terminate() {
      listeners.length = 0
    },
  }
}
