/** What a reader should know of a solved system. Worked out apart, since only results that are shown need it. */
import { cornerExcess } from './corner.ts'
import { short } from './correlation.ts'
import { isSimplified } from './film.ts'
import { capital, filmNotes, stepNotes } from './film-notes.ts'
import { wallOf } from './geometry.ts'
import { weatherOf } from './solve.ts'
import type { Conductivity, Face, Layer, Note, Solution, System } from './types.ts'

export function notesOf(system: System, solution: Solution): Note[] {
  const weather = weatherOf(system)
  const shapes = wallOf(system.shape, system.layers).faces
  const notes: Note[] = []
  solution.faces.forEach((face, index) => {
    const shape = shapes[index]
    if (!shape) return
    const excessK = face.surfaceTempC - system.around.airC
    notes.push(...filmNotes(shape, weather, system.film, excessK), ...closureNotes(face))
    if (face.closure === 'closed') notes.push(...stepNotes(shape, weather, system.film, excessK))
  })
  // Soil stands in place of a film.
  if (system.film === 'simplified' && system.shape.kind !== 'buried-pipe') {
    const all = shapes.every(({ flow }) => isSimplified(flow))
    notes.push({
      code: 'film-method',
      text: `The film follows the simplified equations, which are recalled and not read: verify them against your own copy of ISO 12241.${all ? '' : ' They have none for surfaces that lie or for spheres: there the detailed film stands.'}`,
    })
  }
  notes.push(...cornerNotes(system), ...headNotes(system), ...soilNotes(system, solution))
  notes.push(...conductivityNotes(system.layers, solution.faces))
  return withoutRepeats(notes)
}

function closureNotes({ closure, side }: Face): Note[] {
  switch (closure) {
    case 'closed':
      return []
    case 'steep':
      return [
        {
          code: 'conductivity-steep',
          text: 'The conductivity falls so steeply with temperature that more than one state would fit: do not rely on this result.',
        },
      ]
    case 'on-jump':
      return [
        {
          code: 'film-jump',
          text: `${capital(side)}: the balance falls on the jump between two ranges of the film formula; the coefficient that closes it lies between the two.`,
        },
      ]
  }
}

/** From this difference on the two forms of a duct's corners are worth a word. */
const CORNERS_DIFFER = 0.05

function cornerNotes({ shape, layers }: System): Note[] {
  if (shape.kind !== 'rect-duct' || layers.length === 0) return []
  const excess = cornerExcess({
    innerPerimeterM: 2 * (shape.widthM + shape.heightM),
    thicknessM: layers.reduce((sumM, { thicknessM }) => sumM + thicknessM, 0),
  })
  if (excess <= CORNERS_DIFFER) return []
  return [
    {
      code: 'duct-corners',
      text: `The layers are reckoned by the mean perimeter; with the corners as two-dimensional conduction (shape factor 0.54 each) they would let through ${(100 * (1 - 1 / (1 + excess))).toFixed(0)} % less.`,
    },
  ]
}

function headNotes({ shape }: System): Note[] {
  if (shape.kind !== 'vessel') return []
  const text =
    shape.heads === 'domed'
      ? 'The domed heads are reckoned as half ellipsoids half as high as wide: they conduct as the half sphere of their area and are cooled as a sphere.'
      : 'The flat heads are reckoned as discs over their outer area; the edge where shell and head meet is not reckoned apart.'
  return [{ code: 'vessel-heads', text }]
}

function soilNotes({ shape }: System, { outerDiameterM }: Solution): Note[] {
  if (shape.kind !== 'buried-pipe' || 2 * shape.depthM >= (outerDiameterM ?? 0)) return []
  return [
    {
      code: 'soil-shallow',
      text: 'Pipe and layers reach up out of the soil, which was taken as no resistance at all: the loss is overstated, the surface stands at the temperature of the ground.',
    },
  ]
}

/** A layer read beyond the ends of its curve, judged at the layer's mean temperature. */
function conductivityNotes(layers: readonly Layer[], faces: readonly Face[]): Note[] {
  const notes: Note[] = []
  layers.forEach(({ conductivity }, index) => {
    for (const { interfaceTempsC } of faces) {
      const beyondK = beyondCurveK(
        conductivity,
        ((interfaceTempsC[index] ?? 0) + (interfaceTempsC[index + 1] ?? 0)) / 2,
      )
      if (beyondK === 0 || conductivity.kind === 'constant') continue
      const [first, last] = curveEndsC(conductivity)
      notes.push({
        code: 'conductivity-extrapolated',
        text: `Layer ${index + 1}: its mean temperature is ${Math.max(1, Math.abs(beyondK)).toFixed(0)} K ${beyondK > 0 ? 'above' : 'below'} the conductivity curve, which holds from ${short(first)} to ${short(last)} °C.`,
      })
      return
    }
  })
  return notes
}

/** How far a layer's mean temperature lies beyond its curve [K]: positive above, negative below, 0 within. */
export function beyondCurveK(conductivity: Conductivity, meanC: number): number {
  if (conductivity.kind === 'constant') return 0
  const [first, last] = curveEndsC(conductivity)
  return meanC > last ? meanC - last : meanC < first ? meanC - first : 0
}

function curveEndsC({ pointsC }: Extract<Conductivity, { kind: 'curve' }>): [number, number] {
  return [pointsC[0] ?? 0, pointsC[pointsC.length - 1] ?? 0]
}

function withoutRepeats(notes: readonly Note[]): Note[] {
  return notes.filter((note, index) => notes.findIndex(({ text }) => text === note.text) === index)
}
