import { describe, expect, it } from 'vitest'
import { briefOf } from '#model/run-brief.ts'
import { sizedDemo } from './demo-runs.ts'

const runs = sizedDemo()
const of = (tag: string) => runs.find(({ result }) => result.tag === tag)?.result

describe('the demo job', () => {
  it('tells a varied story', () => {
    const governing = new Set(runs.map(({ result }) => result.governing))
    for (const word of ['money', 'touch', 'loss', 'damp', 'smallest', 'fixed', 'bare', 'unmet']) {
      expect(governing).toContain(word)
    }
  })

  it('has one bare run that burns, one that cannot meet its limit, and a few that need a look', () => {
    const states = runs.map(({ result }) => briefOf({ ok: true, result }).state)
    expect(states.filter((state) => state === 'fails')).toHaveLength(2)
    expect(states.filter((state) => state === 'heed').length).toBeLessThanOrEqual(4)
    expect(of('GL-322')).toMatchObject({ chosen: null, governing: 'unmet' })
    expect(of('ST-110')).toMatchObject({ governing: 'bare', chosen: { pass: false } })
  })

  it('has groups, places and services for every run', () => {
    for (const { values } of runs) {
      expect(values).toMatchObject({
        description: expect.any(String),
        place: expect.any(String),
        service: expect.any(String),
        group: expect.any(String),
      })
    }
  })

  it('shows what a bright jacket costs where damp decides', () => {
    const flow = of('CHW-301')
    expect(flow?.governing).toBe('damp')
    expect(flow?.mattThicknessM).toBeLessThan(flow?.chosen?.thicknessM ?? 0)
  })
})
