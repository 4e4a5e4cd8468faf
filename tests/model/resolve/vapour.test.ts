/** Cold work: what is open to vapour, and where the barrier stands. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { barrierPermeance, stillAirM } from '#model/resolve/vapour.ts'
import { published } from '../../published.ts'
import { coldRun, noteCodes, steamRun } from '../../sizing/catalogue.ts'
import { problemOf } from './problem.ts'

const { material: _material, finish: _finish, ...unlagged } = coldRun

const vapourNotes = (values: RunValues): string[] =>
  noteCodes(problemOf(values)).filter(
    (code) => code.startsWith('vapour-') && code !== 'vapour-stops',
  )
const noteOf = (values: RunValues, code: string): string | undefined =>
  problemOf(values).notes.find((note) => note.code === code)?.text

describe('the permeance of the barrier, by the temperature of the plant', () => {
  // Printed in g/(s·MN), air of 10 °C.
  published<{ plantC: number }>(
    ({ plantC }) => barrierPermeance(plantC) * 1e9,
    [
      [0, '0.010'],
      [-5, '0.004'],
      [-10, '0.002'],
      [-15, '0.0015'],
      [-20, '0.001'],
      [-40, '0.001'],
    ].map(([plantC, printed]) => ({
      from: 'TIASA Thermal Insulation Handbook, guide to permeance of vapour barriers',
      given: { plantC: Number(plantC) },
      printed: String(printed),
    })),
  )

  test('between the temperatures that of the colder one, above them that of the warmest', () => {
    expect(barrierPermeance(-1)).toBe(barrierPermeance(-5))
    expect(barrierPermeance(-14.9)).toBe(barrierPermeance(-15))
    expect(barrierPermeance(6)).toBe(barrierPermeance(0))
  })

  test('as still air: the permeability of air over the permeance', () => {
    expect(stillAirM(0.01e-9)).toBeCloseTo(19.5, 9)
  })
})

describe('open to vapour', () => {
  const fibre = { ...unlagged, material: 'stone_wool_pipe_section' }

  test('fibre under cloth, or under nothing', () => {
    expect(vapourNotes({ ...fibre, finish: 'canvas_glasscloth' })).toEqual(['vapour-open'])
    expect(vapourNotes(fibre)).toEqual(['vapour-open'])
    expect(noteOf(fibre, 'vapour-open')).toContain('put a vapour barrier of at most 0.01 g/(s·MN)')
  })

  test('fibre under sheet, unless its laps are sealed', () => {
    const sheeted = { ...fibre, finish: 'al_plain' }
    expect(vapourNotes(sheeted)).toEqual(['vapour-open'])
    expect(noteOf(sheeted, 'vapour-open')).toContain('seal every lap and end of the finish')
  })

  test('layers are listed, each material once', () => {
    const layers =
      'stone_wool_pipe_section:30;glass_wool_pipe_section:30;stone_wool_pipe_section:30'
    expect(noteOf({ ...unlagged, layers }, 'vapour-open')).toMatch(
      /: Stone [^,]+ pipe section and [^,]+ pipe section let vapour through to /,
    )
    expect(noteOf(fibre, 'vapour-open')).toContain(' pipe section lets vapour through to ')
  })

  test('the colder the work, the tighter the barrier', () => {
    expect(noteOf({ ...fibre, mediumC: -22 }, 'vapour-open')).toContain('0.001 g/(s·MN)')
  })

  test('not under a finish that is tight by itself, nor with a lagging that is', () => {
    expect(vapourNotes({ ...fibre, finish: 'grp_uv' })).toEqual([])
    expect(
      vapourNotes({
        ...unlagged,
        material: 'cellular_glass',
        finish: 'al_plain',
        thicknessM: 0.05,
      }),
    ).toEqual([])
    expect(
      vapourNotes({ ...unlagged, material: 'elastomeric_foam_nbr', thicknessM: 0.019 }),
    ).toEqual([])
  })

  test('a closed-cell lagging that is fixed too thin', () => {
    // 7000 × 2 mm is 14 m of still air; 19.5 m are asked for at 5 °C, 2.8 mm of it.
    const thin = { ...unlagged, material: 'elastomeric_foam_nbr', thicknessM: 0.002 }
    expect(vapourNotes(thin)).toEqual(['vapour-open'])
  })

  test('one that is sized: from which thickness on it is enough', () => {
    // At −22 °C 195 m are asked for: 27.9 mm at 7000.
    const sized = { ...unlagged, mediumC: -22, material: 'elastomeric_foam_nbr' }
    expect(vapourNotes(sized)).toEqual(['vapour-thin'])
    expect(noteOf(sized, 'vapour-thin')).toContain('from 27.9 mm on')
  })

  test('one of which nothing is held', () => {
    expect(vapourNotes({ ...unlagged, conductivityWPerMK: 0.03, thicknessM: 0.05 })).toEqual([
      'vapour-unknown',
    ])
  })
})

describe('the barrier on the wrong side', () => {
  const layered = (layers: string): RunValues => ({
    ...unlagged,
    mediumC: -20,
    layers,
    finish: 'al_plain',
  })

  test('foam under fibre catches what comes through the fibre', () => {
    expect(vapourNotes(layered('pir_pipe_section:40;stone_wool_pipe_section:30'))).toContain(
      'vapour-wrong-side',
    )
    // A tight glass within is closed in itself; the fibre outside it still gets wet.
    expect(vapourNotes(layered('cellular_glass:50;stone_wool_pipe_section:30'))).toEqual([
      'vapour-wrong-side',
    ])
  })

  test('fibre under foam does not, nor fibre under fibre', () => {
    for (const layers of [
      'stone_wool_pipe_section:40;cellular_glass:50',
      'stone_wool_pipe_section:40;glass_wool_pipe_section:30',
      'pir_pipe_section:50;pir_pipe_section:30',
    ]) {
      expect(vapourNotes(layered(layers))).not.toContain('vapour-wrong-side')
    }
  })

  test('a tight finish puts it right', () => {
    const values = { ...layered('cellular_glass:50;stone_wool_pipe_section:30'), finish: 'grp_uv' }
    expect(vapourNotes(values)).toEqual([])
  })

  test('of a sized layer only what holds for every thickness', () => {
    // 20 mm of PIR are 1 m of still air, and no thickness of fibre is more than a fraction of that.
    expect(vapourNotes(layered('pir_pipe_section:?;stone_wool_pipe_section:30'))).toContain(
      'vapour-wrong-side',
    )
    // 1 m of PIR within, 50 factor; outside elastomeric foam from 6 mm on: 42 m and more.
    expect(vapourNotes(layered('pir_pipe_section:40;elastomeric_foam_nbr:?'))).not.toContain(
      'vapour-wrong-side',
    )
  })
})

test('nothing is said of warm work, of bare work, nor where the pipe stays above the dew point', () => {
  expect(vapourNotes(steamRun)).toEqual([])
  expect(vapourNotes({ ...unlagged, thicknessM: 0 })).toEqual([])
  // 27 °C and 70 %: the dew point is 21 °C.
  const cool = { ...unlagged, material: 'stone_wool_pipe_section', mediumC: 23 }
  expect(vapourNotes(cool)).toEqual([])
  const { humidity: _, ...unknownAir } = cool
  expect(vapourNotes(unknownAir)).toEqual(['vapour-open'])
})
