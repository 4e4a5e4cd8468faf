/** What a host answers, be it the desktop shell or the loopback host. */
import { existsSync } from 'node:fs'
import { homedir } from 'node:os'
import { dirname, extname, join, resolve } from 'node:path'
import { z } from 'zod'
import type { Catalogue } from '#catalogue/types.ts'
import { AppError } from '#contract/failures.ts'
import type { Handlers } from '#contract/host.ts'
import { openCatalogue, readCatalogue } from './catalogue-db.ts'
import { demoJob } from './demo.ts'
import { jobEnding } from './job-file.ts'
import { OpenJobs } from './open-jobs.ts'
import { readJson, readPreferences, writePreferences } from './preferences.ts'

/** The system's dialogs; null when the user turned back. */
export interface Dialogs {
  askOpen(): Promise<string | null>
  askSave(suggestedName: string): Promise<string | null>
}

export interface BackendOptions {
  /** Where catalogue, preferences and drafts live. */
  readonly dataFolder: string
  /** The `db` folder of the program. */
  readonly dbFolder: string
  /** Null on the loopback host, where the window asks for a path itself. */
  readonly dialogs: Dialogs | null
  readonly kind: 'desktop' | 'loopback'
}

export interface Backend {
  readonly handlers: Handlers
  /** Closes the files; to be called before the program ends. */
  close(): void
}

export function makeHandlers(options: BackendOptions): Backend {
  const { dataFolder, dbFolder, dialogs, kind } = options
  const jobs = new OpenJobs({ dataFolder, dbFolder })
  const catalogue = once(() => catalogueIn(dataFolder, dbFolder))
  const version = once(() => versionOf(dbFolder))

  const handlers: Handlers = {
    'catalogue.read': () => catalogue(),
    'job.current': () => jobs.current() ?? jobs.start(demoJob(dbFolder)),
    'job.new': () => jobs.startEmpty(),
    'job.demo': () => jobs.start(demoJob(dbFolder)),
    'job.open': async ({ path }) => {
      const chosen = path === undefined ? await ask(dialogs).askOpen() : fullPath(path)
      return chosen === null ? null : jobs.open(chosen)
    },
    'job.saveAs': async ({ path, overwrite, opening }) => {
      jobs.requireOpening(opening)
      if (path !== undefined) return jobs.saveAs(withEnding(fullPath(path)), overwrite)
      const chosen = await ask(dialogs).askSave(`${fileNameFor(jobs.name)}${jobEnding}`)
      if (chosen === null) return null
      // The dialog has asked about replacing the very name it returns, but not about one we complete.
      const named = withEnding(chosen)
      return jobs.saveAs(named, named === chosen || overwrite)
    },
    'job.drafts': () => [...jobs.drafts()],
    'job.commit': (change) => jobs.commit(change),
    'preferences.read': () => readPreferences(dataFolder),
    'preferences.write': (preferences) => {
      writePreferences(dataFolder, preferences)
      return {}
    },
    'host.about': () => ({
      kind,
      dialogs: dialogs !== null,
      folder: documentsFolder(),
      version: version(),
    }),
  }
  return { handlers, close: () => jobs.close() }
}

function once<T extends NonNullable<unknown>>(make: () => T): () => T {
  let made: T | undefined
  return () => {
    made ??= make()
    return made
  }
}

function catalogueIn(dataFolder: string, dbFolder: string): Catalogue {
  const db = openCatalogue(dataFolder, dbFolder)
  try {
    return readCatalogue(db)
  } finally {
    db.close()
  }
}

function ask(dialogs: Dialogs | null): Dialogs {
  if (dialogs) return dialogs
  throw new AppError({ code: 'request/invalid', issues: 'Say the path of the file.' })
}

/** What a person types for a path: from the home folder on, unless it is a full path. */
function fullPath(path: string): string {
  const trimmed = path.trim()
  const fromHome = /^~(?=$|[\\/])/.test(trimmed) ? `.${trimmed.slice(1)}` : trimmed
  return resolve(homedir(), fromHome)
}

/** A name without an ending gets that of a job; what stands after the dot of "Hall 2.1" is none. */
function withEnding(path: string): string {
  return /^\.[a-z]+$/i.test(extname(path)) ? path : `${path}${jobEnding}`
}

/** The name of the job without what file systems refuse. */
function fileNameFor(name: string): string {
  const plain = name
    .replaceAll(/[\\/:*?"<>|\p{Cc}]/gu, ' ')
    .replaceAll(/\s+/g, ' ')
    .replace(/^[\s.]+|[\s.]+$/g, '')
    .slice(0, 100)
    .trim()
  return plain === '' ? 'New job' : plain
}

/** Where a new job is likely to be kept. */
function documentsFolder(): string {
  const documents = join(homedir(), 'Documents')
  return existsSync(documents) ? documents : homedir()
}

const packageSchema = z.object({ version: z.string() })

function versionOf(dbFolder: string): string {
  const read = packageSchema.safeParse(readJson(join(dirname(resolve(dbFolder)), 'package.json')))
  return read.success ? read.data.version : 'unknown'
}
