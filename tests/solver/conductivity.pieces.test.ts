/** A mean series whose mean temperature lies within one piece, worked by hand. */
import { expect, test } from 'vitest'
import { layerDifferenceK } from '#solver/conductivity.ts'

// From 0 to 100 °C λ rises by 1e-4 a kelvin, above by twice that. Mean 75 °C: 0.0375 W/(m·K) over 150 K carries
// 5.625 W/m; mean 150 °C: 0.05 over 300 K carries 15; mean 25 °C from 100 °C down: 0.0325 over −150 K.
test.each([
  [5.625, 0, 150],
  [15, 0, 300],
  [-4.875, 100, -150],
  [-5, 200, -100],
  [-6, -100, -200],
])('a flow of %d W/m from %d °C takes %d K', (flow, outerC, expected) => {
  const λ = {
    kind: 'curve',
    basis: 'mean',
    pointsC: [0, 100, 200],
    valuesWPerMK: [0.03, 0.04, 0.06],
  } as const
  expect(layerDifferenceK(λ, outerC, flow)).toBeCloseTo(expected, 9)
})
