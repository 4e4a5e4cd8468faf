/** What is given: the run, its layers, its sizes. */
import type { Shape } from '#solver/types.ts'
import { type Settled, solverLayers } from '../build-up.ts'
import type { Problem } from '../problem.ts'
import { geometrySteps } from './geometry.ts'
import { Ledger } from './ledger.ts'
import type { Section } from './types.ts'

export function runSection(problem: Problem, settled: Settled): Section {
  const ledger = new Ledger('The run and its sizes', null)
  ledger.say(`${shapeWords(problem.shape)}, ${layerWords(problem, settled)}.`)
  ledger.say(
    'A form is what conduction makes of a layer’s shape: flux on the outer area times form over conductivity is the drop of temperature across the layer.',
  )
  settled.layers.forEach(({ material, thicknessM }, index) => {
    ledger.given(
      `Thickness of layer ${index + 1}, ${material.name}`,
      `s_${index + 1}`,
      thicknessM ?? 0,
      'm',
    )
  })
  geometrySteps(ledger, problem.shape, solverLayers(settled))
  return ledger.section()
}

function layerWords({ finish }: Problem, { layers }: Settled): string {
  if (layers.length === 0) return 'bare'
  const names = layers.map(({ material }) => material.name).join(', then ')
  return `lagged with ${names}${finish ? `, finished with ${finish.name}` : ', without a finish'}`
}

export function shapeWords(shape: Shape): string {
  switch (shape.kind) {
    case 'pipe':
      return `Pipe, ${shape.orientation}`
    case 'buried-pipe':
      return 'Pipe laid in soil'
    case 'rect-duct':
      return shape.riseM === null ? 'Rectangular duct that lies' : 'Rectangular duct that rises'
    case 'flat':
      return shape.facing === 'vertical'
        ? 'Upright flat surface'
        : `Flat surface facing ${shape.facing}`
    case 'sphere':
      return 'Sphere'
    case 'vessel':
      return `Vessel, ${shape.orientation}, ${shape.heads} heads`
  }
}
