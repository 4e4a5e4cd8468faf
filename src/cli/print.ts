/** Standard output and standard error. A reader that went away, as `| head` does, is no failure. */

/** Enough for one write to be worth its while. */
const chunkLength = 1 << 18

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
  let waiting = ''
  for (const text of texts) {
    waiting += text
    if (waiting.length < chunkLength) continue
    if (!(await write(stream, waiting))) return
    waiting = ''
  }
  if (waiting !== '') await write(stream, waiting)
}

/** Whether somebody still reads. */
function write(stream: NodeJS.WriteStream, text: string): Promise<boolean> {
  return new Promise((resolve) => {
    stream.write(text, (error) => resolve(!error))
  })
}
