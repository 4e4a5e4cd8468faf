/** Standard output and standard error. A reader that went away, as `| head` does, is no failure. */

import { inChunks } from './chunks.ts'

for (const stream of [process.stdout, process.stderr]) {
  stream.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code !== 'EPIPE') throw error
  })
}

export async function print(texts: Iterable<string>): Promise<void> {
  await writeAll(process.stdout, texts)
}

/** One problem a line. */
export async function printProblems(problems: readonly string[]): Promise<void> {
  await writeAll(
    process.stderr,
    problems.map((problem) => `${problem}\n`),
  )
}

async function writeAll(stream: NodeJS.WriteStream, texts: Iterable<string>): Promise<void> {
  for (const chunk of inChunks(texts)) {
    if (!(await write(stream, chunk))) return
  }
}

/** Whether somebody still reads. */
function write(stream: NodeJS.WriteStream, text: string): Promise<boolean> {
  return new Promise((resolve) => {
    stream.write(text, (error) => resolve(!error))
  })
}
