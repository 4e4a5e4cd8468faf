import { mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { AppError } from '#contract/failures.ts'
import { type Preferences, preferencesSchema } from '#contract/host.ts'
import { replaceFile } from './replace-file.ts'
import { noPlaceWords } from './storage-failure.ts'

const defaults: Preferences = { theme: 'system', units: 'si', density: 'comfortable' }

const fileIn = (dataFolder: string) => join(dataFolder, 'preferences.json')

/** What is not there or not valid takes its default: a spoilt settings file must not keep anyone from working. */
export function readPreferences(dataFolder: string): Preferences {
  const stored = readJson(fileIn(dataFolder))
  if (typeof stored !== 'object' || stored === null) return defaults
  const shape = preferencesSchema.shape
  const kept = Object.entries(stored).filter(
    ([key, value]) =>
      Object.hasOwn(shape, key) && shape[key as keyof typeof shape].safeParse(value).success,
  )
  return preferencesSchema.parse({ ...defaults, ...Object.fromEntries(kept) })
}

export function writePreferences(dataFolder: string, preferences: Preferences): void {
  const path = fileIn(dataFolder)
  try {
    mkdirSync(dataFolder, { recursive: true })
    replaceFile(path, (temporary) =>
      writeFileSync(temporary, `${JSON.stringify(preferences, null, 2)}\n`),
    )
  } catch (error) {
    const why = noPlaceWords(error)
    throw why === null ? error : new AppError({ code: 'preferences/not-kept', path, why })
  }
}

/** Null where the file is missing or no JSON. */
export function readJson(path: string): unknown {
  try {
    return JSON.parse(readFileSync(path, 'utf8'))
  } catch {
    return null
  }
}
