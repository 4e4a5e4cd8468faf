import { describe, expect, it } from 'vitest'
import { briefOf } from '#model/run-brief.ts'
import { sizedDemo } from './demo-runs.ts'

const runs = sizedDemo()
const of = (tag: string) => runs.find(({ result }) => result.tag === tag)?.result

describe('the demo job', () => {
  it('tells a varied story', () => {
    const governing = new Set(runs.map(({ result }) => result.governing))
    const words = ['money', 'touch', 'loss', 'damp', 'frost', 'arrival', 'code']
    for (const word of [...words, 'smallest', 'fixed', 'bare', 'unmet']) {
      expect(governing).toContain(word)
    }
  })

  it('shows a vessel, a buried run, fittings, condensate, months, and what a measured surface says', () => {
    expect(of('MS-611')?.chosen).toMatchObject({ heatLossWPerM: null, fittingsLossW: 0 })
    expect(of('LH-414')?.notes.map(({ code }) => code)).toContain('buried')
    expect(of('ST-101')?.chosen?.fittingsLossW).toBeGreaterThan(0)
    expect(of('ST-101')?.chosen?.condensateKgPerS).toBeGreaterThan(0)
    const bridge = of('CR-204')?.chosen
    expect(bridge?.yearlyMeanLossW).not.toBe(bridge?.heatLossW)
    const survey = of('ST-106')?.survey
    expect(survey?.effectiveWPerMK?.value).toBeGreaterThan(survey?.soundWPerMK ?? 0)
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
