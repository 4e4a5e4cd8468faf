/** Starts the built desktop shell for a test, on the stand-in. */
import { type ChildProcess, fork } from 'node:child_process'
import { once } from 'node:events'
import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { chromium, type Page } from 'playwright-core'
import type { StandIn } from './electron.ts'

export interface LaunchedApp {
  readonly page: Page
  /** Runs a function in the main process, with the module `electron`. */
  main<T, A>(run: (electron: StandIn, arg: A) => T | Promise<T>, arg: A): Promise<T>
  /** Quits as the user would; the exit code. */
  close(): Promise<number | null>
  /** Ends it at once, as a power cut would. */
  kill(): Promise<void>
}

interface Message {
  readonly id: number
  readonly isDone: boolean
  readonly value: unknown
}

const program = join(import.meta.dirname, '..', '..')

/** `mainFile` is the main bundle to run: the built one, or one out of a package. */
export async function launchApp(
  dataFolder: string,
  mainFile: string = join(program, 'dist', 'main', 'main.cjs'),
): Promise<LaunchedApp> {
  const child = forkApp(dataFolder, mainFile)
  const gone = once(child, 'exit') as Promise<[number | null]>
  const orders = sendOrders(child)
  const browser = await chromium.connectOverCDP((await orders.first) as string)
  const context = browser.contexts()[0]
  if (!context) throw new Error('The stand-in has no browser context.')
  const page = context.pages()[0] ?? (await context.waitForEvent('page'))
  await page.waitForURL(/\.app\.localhost/, { waitUntil: 'load' })
  return {
    page,
    main: (run, arg) => orders.send(run.toString(), arg) as Promise<never>,
    async close() {
      // Its answer may be lost: the process ends while it is on its way.
      orders.send('({ app }) => app.quit()', null).catch(() => {})
      const [code] = await gone
      await browser.close()
      return code
    },
    async kill() {
      child.kill('SIGKILL')
      await gone
      await browser.close()
    },
  }
}

export function forkApp(
  dataFolder: string,
  mainFile: string,
  env: Readonly<Record<string, string>> = {},
): ChildProcess {
  const browserFolder = join(dataFolder, 'standin')
  mkdirSync(browserFolder, { recursive: true })
  return fork(join(import.meta.dirname, 'run.mjs'), [mainFile], {
    env: { ...process.env, LAGWRIGHT_DATA: dataFolder, STANDIN_FOLDER: browserFolder, ...env },
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
    serialization: 'advanced',
  })
}

function sendOrders(child: ChildProcess) {
  const waiting = new Map<number, PromiseWithResolvers<unknown>>()
  const expect = (id: number): Promise<unknown> => {
    const answer = Promise.withResolvers<unknown>()
    waiting.set(id, answer)
    return answer.promise
  }
  child.on('message', ({ id, isDone, value }: Message) => {
    const answer = waiting.get(id)
    waiting.delete(id)
    if (isDone) answer?.resolve(value)
    else answer?.reject(new Error(String(value)))
  })
  child.once('exit', (code) => {
    for (const answer of waiting.values()) answer.reject(new Error(`Main ended with ${code}.`))
  })
  let last = 0
  return {
    /** The stand-in's first message: where its browser can be reached. */
    first: expect(0),
    send(code: string, arg: unknown): Promise<unknown> {
      last += 1
      child.send({ id: last, code, arg })
      return expect(last)
    },
  }
}
