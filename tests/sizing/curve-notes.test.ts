/** What lies beyond a conductivity curve is told once for each layer: by name, at its worst. */
import { expect, test } from 'vitest'
import { sized, steamRun } from './catalogue.ts'

const told = (values: Parameters<typeof sized>[0]): string[] =>
  sized(values).notes.flatMap(({ code, text }) =>
    code === 'conductivity-extrapolated' ? [text] : [],
  )

// Two conditions: the medium of the loss and the hottest one.
const foam = { ...steamRun, material: 'elastomeric_foam_epdm', thicknessM: 0.025 }

test('once, with the hotter of two conditions', () => {
  const [loss, hot] = [told({ ...foam, mediumC: 110 }), told({ ...foam, mediumC: 120 })]
  const both = told({ ...foam, mediumC: 110, mediumMaxC: 120 })
  expect(both).toHaveLength(1)
  expect(both).toEqual(hot)
  expect(both).not.toEqual(loss)
  expect(both[0]).toMatch(
    /^Flexible elastomeric foam[^:]*: its mean temperature is up to \d+ K above the conductivity curve, which holds from −?\d+ to \d+ °C\.$/,
  )
})

test('not at all within it', () => {
  expect(told({ ...foam, mediumC: 60 })).toEqual([])
  expect(told({ ...foam, mediumC: 110, conductivityWPerMK: 0.04 })).toEqual([])
})
