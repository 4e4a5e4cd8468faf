import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs'
import { homedir } from 'node:os'
import { join, relative } from 'node:path'
import { describe, expect, onTestFinished, test } from 'vitest'
import { type Backend, type BackendOptions, makeHandlers } from '#backend/handlers.ts'
import { AppError } from '#contract/failures.ts'
import { hostCalls, type OpenJob } from '#contract/host.ts'
import { serve } from '#contract/wire.ts'
import { dbFolder } from './program-folder.ts'
import { sampleRun } from './sample-job.ts'
import { temporaryFolder } from './temporary-folder.ts'

function started(dataFolder: string, options: Partial<BackendOptions> = {}): Backend {
  const backend = makeHandlers({
    dataFolder,
    dbFolder,
    dialogs: null,
    kind: 'loopback',
    ...options,
  })
  onTestFinished(() => backend.close())
  return backend
}

const drafts = (dataFolder: string) =>
  readdirSync(join(dataFolder, 'drafts')).filter((name) => name.endsWith('.lagjob'))

async function codeOf(act: () => unknown): Promise<string> {
  try {
    await act()
  } catch (error) {
    if (error instanceof AppError) return error.failure.code
    throw error
  }
  return 'no failure'
}

const edit = (revision: number) => ({ revision, putRuns: [sampleRun(1)], removeRuns: [] })

describe('the open job', () => {
  test('is the demo on first start, and what was left of it after that', async () => {
    const folder = temporaryFolder()
    const first = started(folder)
    const demo = await first.handlers['job.current']({})
    expect(demo).toMatchObject({ path: null, fileName: null, revision: 0 })
    expect(demo.job.name).toBe('Harrowmere Creamery')
    expect(demo.job.runs.length).toBeGreaterThan(10)
    expect(await first.handlers['job.current']({})).toEqual(demo)
    await first.handlers['job.commit'](edit(0))
    first.close()

    const again = await started(folder).handlers['job.current']({})
    expect(again.revision).toBe(1)
    expect(again.job.runs.at(-1)).toEqual(sampleRun(1))
    expect(again.notice).toBeUndefined()
  })

  test('a new job is empty and on the disk at once', async () => {
    const folder = temporaryFolder()
    const { handlers } = started(folder)
    const fresh = await handlers['job.new']({})
    expect(fresh).toEqual({
      job: { name: 'New job', site: '', defaults: {}, runs: [] },
      path: null,
      fileName: null,
      revision: 0,
      opening: expect.any(String),
    })
    expect(drafts(folder)).toHaveLength(1)
  })

  test('drafts that were worked on are kept, untouched ones go', async () => {
    const folder = temporaryFolder()
    const { handlers } = started(folder)
    await handlers['job.new']({})
    await handlers['job.commit'](edit(0))
    await handlers['job.new']({})
    await handlers['job.demo']({})
    await handlers['job.demo']({})
    expect(drafts(folder)).toHaveLength(2)
  })

  test('drafts that were left are listed, the last saved first, and can be opened again', async () => {
    const folder = temporaryFolder()
    const { handlers } = started(folder)
    expect(await handlers['job.drafts']({})).toEqual([])
    await handlers['job.new']({})
    await handlers['job.commit']({ ...edit(0), name: 'First' })
    await handlers['job.new']({})
    await handlers['job.commit']({ revision: 0, putRuns: [], removeRuns: [], name: 'Second' })
    await handlers['job.new']({})
    writeFileSync(join(folder, 'drafts', 'torn.lagjob'), 'no job')
    const [second, first] = await handlers['job.drafts']({})
    expect(second).toMatchObject({ name: 'Second', runs: 0, savedAt: expect.any(String) })
    expect(first).toMatchObject({ name: 'First', runs: 1 })
    const again = await handlers['job.open']({ path: first?.path ?? '' })
    expect(again).toMatchObject({ path: null, revision: 1, job: { runs: [sampleRun(1)] } })
    expect((await handlers['job.drafts']({})).map(({ name }) => name)).toEqual(['Second'])
  })

  test('a last job that is gone, damaged or open elsewhere gives way to a new one, and says so', async () => {
    const folder = temporaryFolder()
    const path = join(folder, 'mine.lagjob')
    const first = started(folder)
    await first.handlers['job.new']({})
    await first.handlers['job.saveAs']({ path, overwrite: false })

    const second = await started(folder).handlers['job.current']({})
    expect(second.notice).toBe(
      `${path} is open in another Lagwright window. Close it there first. A new job was started instead.`,
    )
    expect(second).toMatchObject({ path: null, revision: 0 })
    first.close()
    // It is still the one that the next start opens.
    const after = started(folder)
    expect(await after.handlers['job.current']({})).toMatchObject({ path })
    after.close()

    const bytes = readFileSync(path)
    writeFileSync(path, bytes.subarray(0, 5000))
    const third = await started(folder).handlers['job.current']({})
    expect(third.notice).toContain('is damaged')
    expect(third.job.runs).toEqual([])
    expect(readFileSync(path)).toHaveLength(5000)
  })

  test.each(['', '{', '[]', '{"lastJob":5}', 'null'])(
    'a spoilt session file (%s) starts with the demo',
    async (text) => {
      const folder = temporaryFolder()
      writeFileSync(join(folder, 'session.json'), text)
      const current = await started(folder).handlers['job.current']({})
      expect(current.job.name).toBe('Harrowmere Creamery')
    },
  )
})

describe('two pages on one host', () => {
  test('a page whose job is no longer the open one neither writes into the other nor saves it as its own', async () => {
    const folder = temporaryFolder()
    const { handlers } = started(folder)
    const { opening } = await handlers['job.new']({})
    const other = await handlers['job.demo']({})
    const path = join(folder, 'mine.lagjob')
    expect(await codeOf(() => handlers['job.commit']({ ...edit(0), opening }))).toBe('job/left')
    const saveAs = { path, overwrite: false, opening }
    expect(await codeOf(() => handlers['job.saveAs'](saveAs))).toBe('job/left')
    expect(existsSync(path)).toBe(false)
    expect(await handlers['job.current']({})).toEqual(other)
    expect(await handlers['job.commit']({ ...edit(0), opening: other.opening })).toMatchObject({
      revision: 1,
    })
  })

  test('both may show the same job', async () => {
    const { handlers } = started(temporaryFolder())
    const { opening } = await handlers['job.new']({})
    expect((await handlers['job.current']({})).opening).toBe(opening)
  })
})

describe('opening and saving', () => {
  test('a draft moves to the name it is given', async () => {
    const folder = temporaryFolder()
    const { handlers } = started(folder)
    await handlers['job.new']({})
    await handlers['job.commit'](edit(0))
    const path = join(folder, 'mine.lagjob')
    const saved = await handlers['job.saveAs']({ path, overwrite: false })
    expect(saved).toMatchObject({ path, fileName: 'mine.lagjob', revision: 1 })
    expect(drafts(folder)).toEqual([])
    expect(await handlers['job.commit'](edit(1))).toMatchObject({ revision: 2 })
    expect(await handlers['job.saveAs']({ path, overwrite: false })).toMatchObject({ revision: 2 })
  })

  test('a path typed without an ending gets one', async () => {
    const folder = temporaryFolder()
    const { handlers } = started(folder)
    await handlers['job.new']({})
    const save = async (name: string, overwrite = false) =>
      (await handlers['job.saveAs']({ path: join(folder, name), overwrite }))?.fileName
    expect(await save('mine')).toBe('mine.lagjob')
    expect(await save('Hall 2.1')).toBe('Hall 2.1.lagjob')
    expect(await codeOf(() => save('mine'))).toBe('job/exists')
    expect(await save('mine', true)).toBe('mine.lagjob')
    expect(await codeOf(() => save('mine.db'))).toBe('job/wrong-ending')
  })

  test('a failure on the way leaves the open job open', async () => {
    const folder = temporaryFolder()
    const { handlers } = started(folder)
    await handlers['job.new']({})
    await handlers['job.commit'](edit(0))
    writeFileSync(join(folder, 'note.lagjob'), 'a note')
    const attempts = {
      'job/not-found': () => handlers['job.open']({ path: join(folder, 'none.lagjob') }),
      'job/not-a-job': () => handlers['job.open']({ path: join(folder, 'note.lagjob') }),
      'job/wrong-ending': () => handlers['job.open']({ path: join(folder, 'note.txt') }),
      'job/exists': () =>
        handlers['job.saveAs']({ path: join(folder, 'note.lagjob'), overwrite: false }),
      'job/not-writable': () =>
        handlers['job.saveAs']({ path: join(folder, 'no', 'a.lagjob'), overwrite: false }),
      'job/stale': () => handlers['job.commit'](edit(0)),
      'request/invalid': () => handlers['job.open']({}),
    }
    for (const [code, attempt] of Object.entries(attempts)) expect(await codeOf(attempt)).toBe(code)
    expect(await handlers['job.commit'](edit(1))).toMatchObject({ revision: 2 })
  })

  test('opening the job that is open gives it as it is', async () => {
    const folder = temporaryFolder()
    const { handlers } = started(folder)
    await handlers['job.new']({})
    const path = join(folder, 'mine.lagjob')
    await handlers['job.saveAs']({ path, overwrite: false })
    await handlers['job.commit'](edit(0))
    expect(await handlers['job.open']({ path })).toMatchObject({ path, revision: 1 })
  })

  test('paths are taken from the home folder on', async () => {
    const { handlers } = started(temporaryFolder())
    for (const path of ['no-such-folder/a.lagjob', '~/no-such-folder/a.lagjob'])
      await expect(async () => handlers['job.open']({ path })).rejects.toThrow(
        join(homedir(), 'no-such-folder', 'a.lagjob'),
      )
    const folder = temporaryFolder()
    const path = relative(homedir(), join(folder, 'mine.lagjob'))
    await handlers['job.new']({})
    await handlers['job.saveAs']({ path, overwrite: false })
    expect(existsSync(join(folder, 'mine.lagjob'))).toBe(true)
  })

  test('without an open job nothing can be committed', async () => {
    const { handlers } = started(temporaryFolder())
    expect(await codeOf(() => handlers['job.commit'](edit(0)))).toBe('request/invalid')
  })
})

describe('dialogs', () => {
  const answering = (answer: string | null, asked: string[] = []) => ({
    askOpen: async () => answer,
    askSave: async (name: string) => {
      asked.push(name)
      return answer
    },
  })

  test('turning back changes nothing', async () => {
    const dialogs = answering(null)
    const { handlers } = started(temporaryFolder(), { dialogs, kind: 'desktop' })
    await handlers['job.new']({})
    expect(await handlers['job.open']({})).toBeNull()
    expect(await handlers['job.saveAs']({ overwrite: false })).toBeNull()
    expect(await handlers['job.commit'](edit(0))).toMatchObject({ revision: 1 })
  })

  test('the name of the job is suggested, without what file systems refuse', async () => {
    const asked: string[] = []
    const dialogs = answering(null, asked)
    const { handlers } = started(temporaryFolder(), { dialogs, kind: 'desktop' })
    await handlers['job.new']({})
    for (const [revision, name] of ['Dairy: east/west?', '  ..  ', 'Harrowmere'].entries()) {
      await handlers['job.commit']({ revision, name, putRuns: [], removeRuns: [] })
      await handlers['job.saveAs']({ overwrite: false })
    }
    expect(asked).toEqual(['Dairy east west.lagjob', 'New job.lagjob', 'Harrowmere.lagjob'])
  })

  test('a name without an ending gets one; what the dialog confirmed is replaced', async () => {
    const folder = temporaryFolder()
    const files = join(folder, 'files')
    mkdirSync(files)
    const save = async (chosen: string) => {
      const { handlers, close } = started(folder, {
        dialogs: answering(join(files, chosen)),
        kind: 'desktop',
      })
      await handlers['job.new']({})
      const saved = (await handlers['job.saveAs']({ overwrite: false })) as OpenJob
      close()
      return saved.fileName
    }
    expect(await save('mine')).toBe('mine.lagjob')
    expect(await codeOf(() => save('mine'))).toBe('job/exists')
    expect(await save('mine.lagjob')).toBe('mine.lagjob')
    expect(await codeOf(() => save('mine.txt'))).toBe('job/wrong-ending')
  })
})

describe('a data folder that takes no files', () => {
  /** A folder below a file: no system makes it. */
  const nowhere = () => {
    const file = join(temporaryFolder(), 'file')
    writeFileSync(file, '')
    return join(file, 'data')
  }

  test('still gives the catalogue, and jobs that have a place of their own', async () => {
    const path = join(temporaryFolder(), 'mine.lagjob')
    const elsewhere = started(temporaryFolder())
    await elsewhere.handlers['job.new']({})
    await elsewhere.handlers['job.saveAs']({ path, overwrite: false })
    elsewhere.close()

    const { handlers } = started(nowhere())
    expect((await handlers['catalogue.read']({})).materials).toHaveLength(30)
    expect(await handlers['job.open']({ path })).toMatchObject({ path, revision: 0 })
    expect(await handlers['job.commit'](edit(0))).toMatchObject({ revision: 1 })
  })

  test('says so where something has to be kept there', async () => {
    const { handlers } = started(nowhere())
    expect(await codeOf(() => handlers['job.new']({}))).toBe('job/not-writable')
    const preferences = { theme: 'dark', units: 'si', density: 'compact' } as const
    expect(await codeOf(() => handlers['preferences.write'](preferences))).toBe(
      'preferences/not-kept',
    )
    expect(await handlers['preferences.read']({})).toMatchObject({ theme: 'system' })
  })
})

describe('everything else', () => {
  test('preferences are kept, and a spoilt file falls back to the defaults', async () => {
    const folder = temporaryFolder()
    const { handlers } = started(folder)
    const defaults = { theme: 'system', units: 'si', density: 'comfortable' } as const
    expect(await handlers['preferences.read']({})).toEqual(defaults)
    await handlers['preferences.write']({ theme: 'dark', units: 'us', density: 'compact' })
    expect(await handlers['preferences.read']({})).toEqual({
      theme: 'dark',
      units: 'us',
      density: 'compact',
    })
    const file = join(folder, 'preferences.json')
    for (const text of ['', '{', 'null', '[1]', '{"theme":"pink"}']) {
      writeFileSync(file, text)
      expect(await handlers['preferences.read']({}), text).toEqual(defaults)
    }
    writeFileSync(file, '{"theme":"pink","units":"us","colour":1,"__proto__":{"density":"x"}}')
    expect(await handlers['preferences.read']({})).toEqual({ ...defaults, units: 'us' })
  })

  test('every answer passes the contract', async () => {
    const folder = temporaryFolder()
    const bugs: unknown[] = []
    const answer = serve(started(folder).handlers, (...bug) => bugs.push(bug))
    const calls: [string, unknown][] = [
      ['job.current', {}],
      ['catalogue.read', {}],
      ['job.new', {}],
      ['job.commit', edit(0)],
      ['job.saveAs', { path: join(folder, 'a.lagjob'), overwrite: false }],
      ['job.demo', {}],
      ['job.drafts', {}],
      ['job.open', { path: join(folder, 'a.lagjob') }],
      ['preferences.read', {}],
      ['preferences.write', { theme: 'dark', units: 'us', density: 'compact' }],
      ['host.about', {}],
    ]
    expect(calls.map(([name]) => name).sort()).toEqual(Object.keys(hostCalls).sort())
    for (const [name, input] of calls) {
      const reply = await answer(name, input)
      expect(reply.ok, `${name} ${JSON.stringify(reply).slice(0, 300)}`).toBe(true)
    }
    expect(bugs).toEqual([])
  })

  test('the host says what it is', async () => {
    const { version } = JSON.parse(readFileSync(join(dbFolder, '..', 'package.json'), 'utf8'))
    const about = await started(temporaryFolder()).handlers['host.about']({})
    expect(about).toMatchObject({ kind: 'loopback', dialogs: false, version })
    expect(existsSync(about.folder)).toBe(true)
  })
})
