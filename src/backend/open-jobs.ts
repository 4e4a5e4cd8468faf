/**
 * The job that is open in this host. A job without a name of its own is a draft: a file in the data folder like any
 * other, so that every edit of it is on the disk at once.
 */
import { randomUUID } from 'node:crypto'
import { mkdirSync, rmSync, writeFileSync } from 'node:fs'
import { basename, dirname, join, resolve } from 'node:path'
import { z } from 'zod'
import { AppError } from '#contract/failures.ts'
import type { Draft, JobChange, OpenJob } from '#contract/host.ts'
import type { Job } from '#model/job.ts'
import { listDrafts } from './drafts.ts'
import { type Committed, JobFile } from './job-file.ts'
import { readJson } from './preferences.ts'
import { replaceFile } from './replace-file.ts'
import { noPlaceWords, writeFailure } from './storage-failure.ts'

const emptyJob: Job = { name: 'New job', site: '', defaults: {}, runs: [] }
const sessionSchema = z.object({ lastJob: z.string().min(1) })

interface Place {
  readonly dataFolder: string
  readonly dbFolder: string
}

export class OpenJobs {
  readonly #place: Place
  #file: JobFile | null = null
  #opening = ''

  constructor(place: Place) {
    this.#place = place
  }

  /** The open job, else the one last open; null where there never was one. */
  current(): OpenJob | null {
    if (this.#file) return this.#shown(this.#file)
    const session = sessionSchema.safeParse(readJson(this.#sessionFile))
    if (!session.success) return null
    const { lastJob } = session.data
    try {
      return this.#take(JobFile.open(lastJob, this.#place.dbFolder))
    } catch (error) {
      if (!(error instanceof AppError)) throw error
      // Another window works on it just now: it is still the one to open next time.
      const isRemembered = error.failure.code !== 'job/in-use'
      const notice = `${error.message} A new job was started instead.`
      return { ...this.start(emptyJob, isRemembered), notice }
    }
  }

  startEmpty(): OpenJob {
    return this.start(emptyJob)
  }

  /** A draft with this job in it. */
  start(job: Job, isRemembered = true): OpenJob {
    const name = `${new Date().toISOString().slice(0, 10)}-${randomUUID()}.lagjob`
    const path = join(this.#drafts, name)
    try {
      mkdirSync(this.#drafts, { recursive: true })
    } catch (error) {
      throw writeFailure(path, error)
    }
    return this.#take(JobFile.create(path, job, this.#place.dbFolder), isRemembered)
  }

  open(path: string): OpenJob {
    if (this.#file && resolve(path) === resolve(this.#file.path)) return this.#shown(this.#file)
    return this.#take(JobFile.open(path, this.#place.dbFolder))
  }

  saveAs(path: string, overwrite: boolean): OpenJob {
    const file = this.#opened()
    if (resolve(path) === resolve(file.path)) return this.#shown(file)
    const copy = file.saveAs(path, overwrite)
    // The draft lives on under its name.
    const isDraft = this.#isDraft(file)
    const shown = this.#take(copy)
    if (isDraft) removeJob(file.path)
    return shown
  }

  /** The drafts that were left for another job. */
  drafts(): readonly Draft[] {
    return listDrafts(this.#drafts, this.#file?.path ?? null)
  }

  commit(change: JobChange): Committed {
    this.requireOpening(change.opening)
    return this.#opened().commit(change)
  }

  /** Revisions of two jobs may be equal, so only this keeps a page from writing its runs into another's job. */
  requireOpening(opening: string | undefined): void {
    if (opening !== undefined && opening !== this.#opening) throw new AppError({ code: 'job/left' })
  }

  /** The name of the open job. */
  get name(): string {
    return this.#opened().read().job.name
  }

  close(): void {
    this.#file?.close()
    this.#file = null
  }

  #opened(): JobFile {
    if (!this.#file) throw new AppError({ code: 'request/invalid', issues: 'No job is open.' })
    return this.#file
  }

  /** The new one is open before the old one is let go: a failure leaves everything as it was. */
  #take(file: JobFile, isRemembered = true): OpenJob {
    const opening = randomUUID()
    const shown = { ...this.#shown(file), opening }
    const old = this.#file
    this.#file = file
    this.#opening = opening
    if (old) {
      const isUntouched = this.#isDraft(old) && old.revision === 0
      old.close()
      if (isUntouched) removeJob(old.path)
    }
    if (isRemembered) this.#remember(file.path)
    return shown
  }

  #shown(file: JobFile): OpenJob {
    const isDraft = this.#isDraft(file)
    return {
      ...file.read(),
      path: isDraft ? null : file.path,
      fileName: isDraft ? null : basename(file.path),
      opening: this.#opening,
    }
  }

  #isDraft(file: JobFile): boolean {
    return resolve(dirname(file.path)) === resolve(this.#drafts)
  }

  /** Which job to open next time. Not being able to note that down must not cost anyone the job. */
  #remember(path: string): void {
    try {
      replaceFile(this.#sessionFile, (temporary) =>
        writeFileSync(temporary, `${JSON.stringify({ lastJob: resolve(path) })}\n`),
      )
    } catch (error) {
      if (noPlaceWords(error) === null) throw error
    }
  }

  get #drafts(): string {
    return join(this.#place.dataFolder, 'drafts')
  }
  get #sessionFile(): string {
    return join(this.#place.dataFolder, 'session.json')
  }
}

function removeJob(path: string): void {
  rmSync(path, { force: true })
  rmSync(`${path}-journal`, { force: true })
}
