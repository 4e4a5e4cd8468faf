/** Values as Electron's IPC carries them: what structuredClone takes, and nothing else. */
import { parse, stringify } from 'devalue'

export const pack = (value: unknown): string => stringify(structuredClone(value))
export const unpack = (text: string): unknown => parse(text)
