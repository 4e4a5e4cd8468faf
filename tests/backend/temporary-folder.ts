import { existsSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { onTestFinished } from 'vitest'

/** An empty folder that goes when the test ends. */
export function temporaryFolder(): string {
  return folderIn(tmpdir())
}

/** The same in memory, where the system has such a place: for tests of many commits that are not about syncing. */
export function quickFolder(): string {
  return folderIn(existsSync('/dev/shm') ? '/dev/shm' : tmpdir())
}

function folderIn(parent: string): string {
  const folder = mkdtempSync(join(parent, 'lagwright-test-'))
  onTestFinished(() => rmSync(folder, { recursive: true, force: true, maxRetries: 3 }))
  return folder
}
