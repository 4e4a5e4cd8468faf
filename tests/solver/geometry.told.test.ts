/** What a wall says of itself: its unit, its sides, and the lengths that its films take. */
import { describe, expect, test } from 'vitest'
import { wallOf } from '#solver/geometry.ts'
import type { Shape } from '#solver/types.ts'

const layer = {
  thicknessM: 0.1,
  conductivity: { kind: 'constant', conductivityWPerMK: 0.04 },
} as const

const vessel = (orientation: 'horizontal' | 'vertical', heads: 'flat' | 'domed'): Shape => ({
  kind: 'vessel',
  outerDiameterM: 1.8,
  shellLengthM: 3,
  orientation,
  heads,
})

// Each under 0.1 m. A round thing is 0.2 m wider then, to free convection and to wind; an upright one is as high as it rises.
const rows: [
  string,
  Shape,
  string,
  number | null,
  (readonly [string, string, number, number])[],
][] = [
  [
    'a lying pipe',
    { kind: 'pipe', outerDiameterM: 0.3, orientation: 'horizontal' },
    'm',
    0.5,
    [['all round', 'horizontal-cylinder', 0.5, 0.5]],
  ],
  [
    'an inclined pipe',
    { kind: 'pipe', outerDiameterM: 0.3, orientation: 'inclined', riseM: 4 },
    'm',
    0.5,
    [['all round', 'inclined-cylinder', 4, 0.5]],
  ],
  [
    'a buried pipe',
    { kind: 'buried-pipe', outerDiameterM: 0.3, depthM: 1, soilWPerMK: 1.5 },
    'm',
    0.5,
    [['all round', 'ground', 0.5, 0.5]],
  ],
  [
    'a flat surface',
    { kind: 'flat', facing: 'up', characteristicLengthM: 2 },
    'm2',
    null,
    [['all round', 'up', 2, 2]],
  ],
  [
    'a sphere',
    { kind: 'sphere', outerDiameterM: 0.8 },
    'piece',
    1,
    [['all round', 'sphere', 1, 1]],
  ],
  [
    'a lying vessel with flat heads',
    vessel('horizontal', 'flat'),
    'piece',
    2,
    [
      ['shell', 'horizontal-cylinder', 2, 2],
      ['heads', 'vertical-plate', 2, 2],
    ],
  ],
  [
    'an upright vessel with flat heads',
    vessel('vertical', 'flat'),
    'piece',
    2,
    [
      ['shell', 'vertical-cylinder', 3, 2],
      ['top head', 'up', 0.5, 2],
      ['bottom head', 'down', 0.5, 2],
    ],
  ],
  [
    'an upright vessel with domed heads',
    vessel('vertical', 'domed'),
    'piece',
    2,
    [
      ['shell', 'vertical-cylinder', 3, 2],
      ['heads', 'sphere', 2, 2],
    ],
  ],
]

describe.each(rows)('%s', (_, shape, unit, outerDiameterM, faces) => {
  const wall = wallOf(shape, [layer])

  test('has its unit and its size', () => {
    expect(wall.unit).toBe(unit)
    if (outerDiameterM === null) expect(wall.outerDiameterM).toBeNull()
    else expect(wall.outerDiameterM).toBeCloseTo(outerDiameterM, 12)
  })

  test('has its sides, each with its flow and its lengths', () => {
    expect(wall.faces.map(({ side, flow }) => [side, flow])).toEqual(
      faces.map(([side, flow]) => [side, flow]),
    )
    for (const [index, [side, , freeM, windM]] of faces.entries()) {
      expect(wall.faces[index]?.freeLengthM, side).toBeCloseTo(freeM, 12)
      expect(wall.faces[index]?.windLengthM, side).toBeCloseTo(windM, 12)
    }
  })
})
