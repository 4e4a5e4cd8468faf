/** Entry of the loopback host, as a bundle in dist/host: prints its address and runs until it is stopped. */
import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { dataFolder } from '#backend/data-folder.ts'
import { makeHandlers } from '#backend/handlers.ts'
import { startHost } from './server.ts'

const program = join(import.meta.dirname, '..', '..')
const folder = dataFolder()
mkdirSync(folder, { recursive: true })

const backend = makeHandlers({
  dataFolder: folder,
  dbFolder: join(program, 'db'),
  dialogs: null,
  kind: 'loopback',
})
const port = Number(process.env.LAGWRIGHT_PORT || 0)
const host = await startHost({
  handlers: backend.handlers,
  report: (reference, name, error) => console.error(`[${reference}] ${name}:`, error),
  pageFolder: join(program, 'dist', 'ui'),
  port,
}).catch((error: unknown) => {
  console.error(
    `Lagwright cannot listen on port ${port} (${error}). Set LAGWRIGHT_PORT to a free one.`,
  )
  process.exit(1)
})

/** Where the window is; `start` opens it in a browser. */
export const url = host.url
console.log(`Lagwright is running at ${url}`)

let stopping = false
async function stop(): Promise<void> {
  if (stopping) return
  stopping = true
  await host.close()
  backend.close()
  process.exit(0)
}
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
  process.on(signal, () => void stop())
}
