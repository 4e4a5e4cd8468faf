/** The worker's entry: all computing of the window happens here. */
import { answerer } from './answer.ts'
import type { Request } from './protocol.ts'

const answer = answerer()

addEventListener('message', ({ data }: MessageEvent<Request>) => {
  const reply = answer(data)
  if (reply) postMessage(reply)
})
