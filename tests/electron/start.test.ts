import { execFile } from 'node:child_process'
import { chmod, mkdir, mkdtemp, readFile, rm, utimes, writeFile } from 'node:fs/promises'
import { createServer, type RequestListener, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { delimiter, join } from 'node:path'
import { promisify } from 'node:util'
import { afterEach, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest'
import { fetchElectron } from '../../electron/binary.mjs'
import { buildIfStale, isStale } from '../../electron/build.mjs'
import { type Started, start } from './starting.ts'

// Each test starts whole programs, on a machine that may be busy with other tests.
vi.setConfig({ testTimeout: 30_000, hookTimeout: 60_000 })

const startFile = join(import.meta.dirname, '..', '..', 'electron', 'start.mjs')
let folder: string
let server: Server | undefined
beforeAll(() => buildIfStale(join(import.meta.dirname, '..', '..')))
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'lagwright-start-'))
})
afterEach(async () => {
  server?.closeAllConnections()
  server?.close()
  server = undefined
  await rm(folder, { recursive: true, force: true, maxRetries: 10, retryDelay: 100 })
})

/** The window answers at the address, and the program ends cleanly; what it had written to stderr. */
async function useAndStop(started: Started): Promise<string> {
  const url = await started.url()
  expect(url).toMatch(/^http:\/\/127\.0\.0\.1:\d+\/#token=[\w-]{43}$/)
  const page = await fetch(url)
  expect(await page.text()).toContain('<title>Lagwright')
  started.stop()
  const { code, complaints } = await started.ended()
  expect(code).toBe(0)
  return complaints
}

const fallback = (why: string): string =>
  `The desktop shell cannot run here (${why}), so Lagwright runs in the browser.\n`

/** A server in place of the one that Electron comes from; its address. */
async function mirror(answer: RequestListener): Promise<string> {
  server = createServer(answer)
  await new Promise<void>((resolve) => server?.listen(0, '127.0.0.1', resolve))
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}/`
}

/** With a display, and as if Electron had never been downloaded here. */
const withDisplay = (electronMirror: string) => ({
  DISPLAY: ':99',
  ELECTRON_OVERRIDE_DIST_PATH: join(folder, 'no-electron-here'),
  ELECTRON_MIRROR: electronMirror,
  electron_config_cache: join(folder, 'cache'),
})

async function writeScript(name: string, script: string): Promise<void> {
  const file = join(folder, name)
  await writeFile(file, `#!/bin/sh\n${script}\n`)
  await chmod(file, 0o755)
}

/** An Electron that is a shell script; its folder. */
async function fakeElectron(script: string): Promise<string> {
  await writeScript('electron', script)
  return folder
}

describe('start', () => {
  test('without a display runs in the browser at once, and says so in one line', async () => {
    expect(await useAndStop(start(folder, {}))).toBe(fallback('there is no display'))
  })

  test('asked for the browser, says nothing of the desktop shell', async () => {
    expect(await useAndStop(start(folder, { DISPLAY: ':99' }, ['--browser', '--no-open']))).toBe('')
  })

  test.runIf(process.platform === 'linux')('opens a browser where there is a display', async () => {
    const opened = join(folder, 'opened')
    await writeScript('xdg-open', `echo "$1" > ${opened}.part && mv ${opened}.part ${opened}`)
    const env = { DISPLAY: ':99', PATH: `${folder}${delimiter}${process.env.PATH}` }
    const started = start(folder, env, ['--browser'])
    const url = await started.url()
    await expect.poll(() => readFile(opened, 'utf8').catch(() => '')).toBe(`${url}\n`)
    started.stop()
    expect((await started.ended()).code).toBe(0)
  })

  test('without a network falls back at once', async () => {
    const address = await mirror(() => {})
    server?.close()
    const complaints = await useAndStop(start(folder, withDisplay(address)))
    expect(complaints).toBe(fallback('its download failed: ECONNREFUSED'))
  })

  test('gives a server that never answers five seconds', async () => {
    const address = await mirror(() => {})
    const began = Date.now()
    const complaints = await useAndStop(start(folder, withDisplay(address)))
    expect(complaints).toBe(fallback('its download failed: nothing arrived for 5 s'))
    expect(Date.now() - began).toBeLessThan(12_000)
  })

  test('falls back where the server has no Electron', async () => {
    const address = await mirror((_request, response) => response.writeHead(404).end())
    const complaints = await useAndStop(start(folder, withDisplay(address)))
    expect(complaints).toMatch(
      /^The desktop shell cannot run here \(its download failed: .*404.*\n$/,
    )
  })

  test('runs Electron where it is, and ends as it ends', async () => {
    const own = await fakeElectron('exit 0')
    const started = start(folder, { DISPLAY: ':99', ELECTRON_OVERRIDE_DIST_PATH: own })
    expect(await started.ended()).toEqual({ code: 0, complaints: '' })
  })

  test('falls back where Electron ends at once with an error', async () => {
    const own = await fakeElectron('exit 127')
    const started = start(folder, { DISPLAY: ':99', ELECTRON_OVERRIDE_DIST_PATH: own })
    expect(await useAndStop(started)).toBe(fallback('it ended at once with code 127'))
  })

  test('says in one line that a port is taken', async () => {
    const { port } = new URL(await mirror(() => {}))
    const { code, complaints } = await start(folder, { LAGWRIGHT_PORT: port }, [
      '--browser',
    ]).ended()
    expect(code).toBe(1)
    expect(complaints).toMatch(new RegExp(`^Lagwright cannot listen on port ${port} .*\\n$`))
  })

  test('asked for help, prints what can be asked and starts nothing', async () => {
    const ended = promisify(execFile)(process.execPath, [startFile, '--help'])
    const { stdout, stderr } = await ended
    expect(stdout).toContain('--browser  the browser at once')
    expect(stderr).toBe('')
  })

  test('refuses an option that it does not know', async () => {
    const { code, complaints } = await start(folder, {}, ['--brwser', '--no-open']).ended()
    expect(complaints).toBe('Unknown: --brwser. Known are --browser, --no-open and --help.\n')
    expect(code).toBe(2)
  })

  test('asks an old Node for a newer one, in one line', async () => {
    const old = "Object.defineProperty(process, 'versions', { value: { node: '20.20.2' } })"
    const { code, complaints } = await start(folder, {
      NODE_OPTIONS: `--import=data:text/javascript,${encodeURIComponent(old)}`,
    }).ended()
    expect(code).toBe(1)
    expect(complaints).toMatch(
      /^Lagwright needs Node 22\.18 or later; this is Node 20\.20\.2\..*\n$/,
    )
  })
})

describe('fetchElectron', () => {
  test('gives up on a server that drips without end', async () => {
    const address = await mirror((_request, response) => {
      response.writeHead(200, { 'content-length': '100000000' })
      const drip = setInterval(() => response.write('x'), 50)
      response.once('close', () => clearInterval(drip))
    })
    const before = { ...process.env }
    Object.assign(process.env, withDisplay(address))
    const work = fetchElectron({ silenceMs: 400, wholeMs: 1200 })
    await expect(work).rejects.toThrow('not done after 1.2 s')
    process.env = before
  })
})

describe('isStale', () => {
  test('tells a build older than its sources', async () => {
    const files = [
      'src/ui/App.svelte',
      'electron/main.ts',
      'vite.config.ts',
      'package.json',
      'dist/ui/index.html',
      'dist/preload/preload.cjs',
      'dist/main/main.cjs',
      'dist/host/host.js',
    ]
    expect(isStale(folder)).toBe(true)
    const touch = async (path: string, seconds: number) =>
      utimes(join(folder, path), seconds, seconds)
    for (const file of files) {
      await mkdir(join(folder, file, '..'), { recursive: true })
      await writeFile(join(folder, file), '')
      await touch(file, file.startsWith('dist/') ? 2000 : 1000)
    }
    for (const path of ['src', 'src/ui', 'electron']) await touch(path, 1000)
    expect(isStale(folder)).toBe(false)
    await touch('src/ui/App.svelte', 3000)
    expect(isStale(folder)).toBe(true)
    await touch('src/ui/App.svelte', 1000)
    await rm(join(folder, 'dist/main/main.cjs'))
    expect(isStale(folder)).toBe(true)
  })
})
