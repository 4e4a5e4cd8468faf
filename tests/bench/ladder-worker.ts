/** One thread's share of the runs: sized once to warm up, then again at each call. */
import { parentPort, workerData } from 'node:worker_threads'
import type { RunValues } from '#model/fields.ts'
import { sizeLadders } from './ladders.ts'
import { shippedCatalogue } from './runs.ts'

const runs = workerData as readonly RunValues[]
const index = shippedCatalogue()

function sizeAll(): void {
  sizeLadders(runs, index)
  parentPort?.postMessage('done')
}

parentPort?.on('message', sizeAll)
sizeAll()
