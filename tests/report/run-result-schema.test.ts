import { describe, expect, it } from 'vitest'
import { cautions } from '#report/cautions.ts'
import committed from '#report/run-result.schema.json' with { type: 'json' }
import { runResultSchema, sizedJsonSchema, sizedSchema } from '#report/run-result-schema.ts'
import { sizedDemo } from './demo-runs.ts'

const runs = sizedDemo().map(({ result }) => result)

describe('the schema of results', () => {
  it('is committed as it stands: after a change, npm run schema > src/report/run-result.schema.json', () => {
    expect(committed).toEqual(JSON.parse(JSON.stringify(sizedJsonSchema())))
  })

  it('takes every result of the demo after a trip through JSON', () => {
    const sized = JSON.parse(JSON.stringify({ runs, cautions }))
    expect(sizedSchema.parse(sized)).toEqual(sized)
    expect(sized).toEqual({ runs, cautions })
  })

  it('refuses what is more, less or not finite', () => {
    const [run] = runs
    expect(runResultSchema.safeParse(run).success).toBe(true)
    expect(runResultSchema.safeParse({ ...run, more: 1 }).success).toBe(false)
    expect(runResultSchema.safeParse({ ...run, notes: undefined }).success).toBe(false)
    expect(
      runResultSchema.safeParse({ ...run, bare: { ...run?.bare, surfaceTempC: Number.NaN } })
        .success,
    ).toBe(false)
  })

  it('says the unit of every number', () => {
    const numbers = numbersWithoutUnit(sizedJsonSchema())
    expect(numbers).toEqual([])
  })
})

/** Descriptions of numbers that name no unit in brackets. */
function numbersWithoutUnit(schema: unknown): readonly string[] {
  if (typeof schema !== 'object' || schema === null) return []
  const inside = Object.values(schema).flatMap(numbersWithoutUnit)
  if (!('type' in schema) || ![schema.type].flat().includes('number')) return inside
  const description = 'description' in schema ? String(schema.description) : 'nothing'
  return /\[.+\]|in `unit`/.test(description) ? inside : [...inside, description]
}
