import { spawn } from 'node:child_process'
import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { expect, test } from 'vitest'
import { JobFile } from '#backend/job-file.ts'
import { dbFolder } from './program-folder.ts'
import { sampleJob } from './sample-job.ts'
import { temporaryFolder } from './temporary-folder.ts'

const program = join(import.meta.dirname, 'commit-for-ever.ts')

/** Kills the program after some commits and gives the number of the last one it reported. */
async function killedAfter(path: string, milliseconds: number): Promise<number> {
  const child = spawn(process.execPath, [program, path, dbFolder], {
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  let out = ''
  let errors = ''
  child.stderr.on('data', (chunk) => {
    errors += chunk
  })
  const ended = new Promise((resolve) => child.on('close', resolve))
  await new Promise<void>((resolve, reject) => {
    child.stdout.on('data', (chunk) => {
      out += chunk
      resolve()
    })
    child.on('close', () => reject(new Error(`The program ended by itself: ${errors}`)))
  })
  await wait(milliseconds)
  child.kill('SIGKILL')
  await ended
  return Number(out.trim().split('\n').at(-1))
}

/** Whether a journal waits to be rolled back: it begins with the mark that https://sqlite.org/fileformat.html names. */
function isHot(journal: string): boolean {
  return readFileSync(journal).subarray(0, 8).toString('hex') === 'd9d505f920a163d7'
}

test('kill -9 in the middle of commits loses nothing that was committed', {
  timeout: 120_000,
}, async () => {
  const path = join(temporaryFolder(), 'a.lagjob')
  JobFile.create(path, sampleJob(400), dbFolder).close()
  let interrupted = 0
  // Ten rounds, and more until one has died between the first write and the commit.
  for (let round = 0; round < 10 || (interrupted === 0 && round < 50); round += 1) {
    const reported = await killedAfter(path, 7 + 13 * (round % 10))
    if (isHot(`${path}-journal`)) interrupted += 1
    const file = JobFile.open(path, dbFolder)
    const { job, revision } = file.read()
    file.close()
    // The one on its way may be in the file without having been reported.
    expect([reported, reported + 1]).toContain(revision)
    const marks = new Set([job.name, ...job.runs.map((run) => run.values.description)])
    expect([...marks]).toEqual([`commit ${revision}`])
    expect(job.runs).toHaveLength(400)
  }
  expect(interrupted).toBeGreaterThan(0)
})
