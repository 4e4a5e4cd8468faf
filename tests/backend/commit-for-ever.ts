/** A program that commits until it is killed: writes the number of each commit that is done to standard output. */
import { writeSync } from 'node:fs'
import { JobFile } from '#backend/job-file.ts'

const [path = '', dbFolder = ''] = process.argv.slice(2)
const file = JobFile.open(path, dbFolder)
const { job, revision: start } = file.read()

for (let revision = start; ; revision += 1) {
  const putRuns = job.runs.map((run) => ({
    ...run,
    values: { ...run.values, description: `commit ${revision + 1}` },
  }))
  file.commit({ revision, name: `commit ${revision + 1}`, putRuns, removeRuns: [] })
  writeSync(1, `${revision + 1}\n`)
}
