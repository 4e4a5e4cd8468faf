/** Enough for one write to be worth its while. */
const chunkLength = 1 << 18

/** The same text in fewer, larger pieces. */
export function* inChunks(texts: Iterable<string>): Iterable<string> {
  let waiting = ''
  for (const text of texts) {
    waiting += text
    if (waiting.length < chunkLength) continue
    yield waiting
    waiting = ''
  }
  if (waiting !== '') yield waiting
}
