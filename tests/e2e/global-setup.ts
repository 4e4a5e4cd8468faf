import { join } from 'node:path'
import { buildIfStale } from '../../electron/build.mjs'

/** Whoever runs these tests by themselves tests the sources as they are now. */
export default function setup(): Promise<void> {
  return buildIfStale(join(import.meta.dirname, '..', '..'))
}
