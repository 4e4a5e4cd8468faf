import { once } from 'node:events'
import { existsSync } from 'node:fs'
import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { forkApp, launchApp } from '../standin/launch.ts'
import { expect, test } from './fixture.ts'

const mainFile = join(import.meta.dirname, '..', '..', 'dist', 'main', 'main.cjs')

test('the page has one door to the program, and no other', async ({ app }) => {
  const seen = await app.page.evaluate(() => ({
    shell: Object.keys(window.shell ?? {}),
    globals: ['require', 'process', 'module', 'Buffer', 'ipcRenderer'].filter(
      (name) => name in window,
    ),
  }))
  expect(seen).toEqual({ shell: ['call'], globals: [] })
})

test('the program calls itself the desktop shell', async ({ app }) => {
  const reply = await app.page.evaluate(() => window.shell?.call('host.about', {}))
  expect(reply).toMatchObject({ ok: true, value: { kind: 'desktop', dialogs: true } })
})

test('a call that nobody knows, or with a wrong input, is a failure', async ({ app }) => {
  const replies = await app.page.evaluate(async () => [
    await window.shell?.call('no.such', {}),
    await window.shell?.call('job.open', { path: 7 }),
  ])
  expect(replies).toMatchObject([
    { ok: false, failure: { code: 'request/unknown' } },
    { ok: false, failure: { code: 'request/invalid' } },
  ])
})

test('a call from a frame of another origin is refused', async ({ app }) => {
  const answers = await app.main(async ({ invokeFrom }) => {
    const ask = (url: string) => invokeFrom(url, 'call', 'host.about', {}).catch(String)
    const urls = ['https://example.org/', 'app://other/index.html', 'app://lagwright.example.org/']
    return { refused: await Promise.all(urls.map(ask)), own: await ask('app://lagwright/x') }
  }, null)
  expect(answers.refused).toEqual(Array(3).fill('Error: Refused: unknown sender.'))
  expect(answers.own).toMatchObject({ ok: true })
})

test('open without a path shows the dialog; turning back changes nothing', async ({ app }) => {
  const reply = await app.page.evaluate(() => window.shell?.call('job.open', {}))
  expect(reply).toEqual({ ok: true, value: null })
})

test('save as goes where the dialog says', async ({ app, dataFolder }) => {
  const file = join(dataFolder, 'Boiler house.lagjob')
  await app.main(({ dialog }, filePath) => {
    dialog.showSaveDialog = async () => ({ canceled: false, filePath })
  }, file)
  await app.page.evaluate(() => window.shell?.call('job.current', {}))
  const reply = await app.page.evaluate(() =>
    window.shell?.call('job.saveAs', { overwrite: false }),
  )
  expect(reply).toMatchObject({ ok: true, value: { path: file, fileName: 'Boiler house.lagjob' } })
  expect(existsSync(file)).toBe(true)
})

test('the window comes back where it was left', async ({ dataFolder }) => {
  const bounds = { x: 40, y: 50, width: 1000, height: 700 }
  const first = await launchApp(dataFolder)
  await first.main(
    ({ BrowserWindow }, its) => BrowserWindow.getAllWindows()[0]?.setBounds(its),
    bounds,
  )
  expect(await first.close()).toBe(0)
  expect(JSON.parse(await readFile(join(dataFolder, 'window.json'), 'utf8'))).toEqual(bounds)
  const second = await launchApp(dataFolder)
  const now = await second.main(
    ({ BrowserWindow }) => BrowserWindow.getAllWindows()[0]?.getNormalBounds(),
    null,
  )
  await second.close()
  expect(now).toEqual(bounds)
})

test('a second start ends at once, and the first one comes forward', async ({
  app,
  dataFolder,
}) => {
  const second = forkApp(join(dataFolder, 'second'), mainFile, { STANDIN_SECOND_INSTANCE: '1' })
  const [code] = await once(second, 'exit')
  expect(code).toBe(0)
  const focused = await app.main(({ app: its, BrowserWindow }) => {
    its.emit('second-instance')
    return BrowserWindow.getAllWindows()[0]?.focused
  }, null)
  expect(focused).toBe(1)
})
