import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { ended, program, slow } from './command.ts'

const schema = (...words: readonly string[]) =>
  ended(process.execPath, [join(program, 'src/cli/print-schema.ts'), ...words], {
    cwd: program,
    env: process.env,
  })

describe('the printed schema', slow, () => {
  it.each([
    { words: [], title: 'Lagwright: sized runs' },
    { words: ['size'], title: 'Lagwright: sized runs' },
    { words: ['loss'], title: 'Lagwright: losses of runs' },
    { words: ['working'], title: 'Lagwright: working of a run' },
  ])('of $words is $title', async ({ words, title }) => {
    const { code, out, err } = await schema(...words)
    expect(JSON.parse(out)).toMatchObject({ title })
    expect(err).toEqual([])
    expect(code).toBe(0)
  })

  it('of an unknown command is refused', async () => {
    const { code, out, err } = await schema('frob')
    expect(err).toEqual(['found "frob"; allowed: size, loss, working'])
    expect(out).toBe('')
    expect(code).toBe(2)
  })
})
