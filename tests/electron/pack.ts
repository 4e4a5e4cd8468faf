/**
 * Packs the program for Linux around a stand-in for Electron's binaries: a few bytes with the mark that the fuses are
 * set behind. That needs no download, and finds a wrong electron-builder.yml.
 */
import { execFile } from 'node:child_process'
import { chmod, mkdir, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { promisify } from 'node:util'

const program = join(import.meta.dirname, '..', '..')
const FUSE_SENTINEL = 'dL7pKGdnNz796PbbjQWNKmHXBZaB9tsX'

/** The packed app.asar, somewhere in the folder. */
export async function packInto(folder: string): Promise<string> {
  const electron = await fakeElectron(join(folder, 'electron'))
  const output = join(folder, 'release')
  await promisify(execFile)(
    process.execPath,
    [
      join(program, 'node_modules', 'electron-builder', 'cli.js'),
      '--dir',
      '--linux',
      '--x64',
      `-c.electronDist=${electron}`,
      `-c.directories.output=${output}`,
    ],
    { cwd: program },
  )
  return join(output, 'linux-unpacked', 'resources', 'app.asar')
}

async function fakeElectron(folder: string): Promise<string> {
  await mkdir(join(folder, 'locales'), { recursive: true })
  for (const name of ['LICENSE', 'LICENSES.chromium.html', 'resources.pak', 'version'])
    await writeFile(join(folder, name), '')
  await writeFile(join(folder, 'locales', 'en-US.pak'), '')
  // The version of the fuses, their number, and each of them "on".
  const fuses = Buffer.from([1, 9, ...Buffer.from('1'.repeat(9))])
  const text = Buffer.from(`#!/bin/sh\nexit 0\n#${FUSE_SENTINEL}`)
  const binary = join(folder, 'electron')
  await writeFile(binary, Buffer.concat([text, fuses, Buffer.from('\n')]))
  await chmod(binary, 0o755)
  return folder
}
