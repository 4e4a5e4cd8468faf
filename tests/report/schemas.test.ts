import { describe, expect, it } from 'vitest'
import loss from '#report/loss.schema.json' with { type: 'json' }
import { lossJsonSchema } from '#report/loss-schema.ts'
import working from '#report/working.schema.json' with { type: 'json' }
import { workingJsonSchema } from '#report/working-schema.ts'

describe.each([
  { name: 'loss', committed: loss, made: lossJsonSchema() },
  { name: 'working', committed: working, made: workingJsonSchema() },
])('the schema of $name', ({ committed, made }) => {
  it('is committed as it stands: after a change, npm run -s schema -- NAME > src/report/NAME.schema.json', () => {
    expect(committed).toEqual(JSON.parse(JSON.stringify(made)))
  })
})
