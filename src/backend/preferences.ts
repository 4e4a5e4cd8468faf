import { readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { type Preferences, preferencesSchema } from '#contract/host.ts'
import { replaceFile } from './replace-file.ts'

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
  replaceFile(fileIn(dataFolder), (temporary) =>
    writeFileSync(temporary, `${JSON.stringify(preferences, null, 2)}\n`),
  )
}

/** Null where the file is missing or no JSON. */
export function readJson(path: string): unknown {
  try {
    return JSON.parse(readFileSync(path, 'utf8'))
  } catch {
    return null
  }
}
