/** Columns of the schedule: what can be typed, and what comes out. */
import { type FieldKey, fieldOf } from '#model/fields.ts'
import { unitOf } from '#ui/state/cell-text.ts'
import { unitLabel } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'

export type ResultName = 'lagging' | 'loss' | 'surface' | 'governed'

export interface Column {
  readonly id: string
  readonly label: string
  readonly unit: string
  readonly widthPx: number
  readonly isNumber: boolean
  /** What typing into the column sets; null where nothing can be typed. */
  readonly key: FieldKey | null
  readonly result: ResultName | null
}

/** Two ways to look at the runs: what was decided, and what it was decided from. */
export type ColumnSet = 'sized' | 'take-off'

interface Placed {
  readonly key: FieldKey | ResultName
  readonly widthPx: number
  /** Left out of a window narrower than this. */
  readonly fromPx?: number
}

const sets: { readonly [S in ColumnSet]: readonly Placed[] } = {
  // Each from where the description still keeps some 110 px; below all of them it gets narrower.
  sized: [
    { key: 'tag', widthPx: 86 },
    { key: 'description', widthPx: 70 },
    { key: 'size', widthPx: 106 },
    { key: 'lengthM', widthPx: 64, fromPx: 780 },
    { key: 'mediumC', widthPx: 80, fromPx: 564 },
    { key: 'place', widthPx: 104, fromPx: 884 },
    { key: 'lagging', widthPx: 78 },
    { key: 'loss', widthPx: 84, fromPx: 632 },
    { key: 'surface', widthPx: 68, fromPx: 716 },
    { key: 'governed', widthPx: 104 },
  ],
  'take-off': [
    { key: 'tag', widthPx: 92 },
    { key: 'description', widthPx: 180 },
    { key: 'shape', widthPx: 128 },
    { key: 'size', widthPx: 108 },
    { key: 'outerDiameterM', widthPx: 146 },
    { key: 'orientation', widthPx: 104 },
    { key: 'lengthM', widthPx: 76 },
    { key: 'areaM2', widthPx: 72 },
    { key: 'valves', widthPx: 72 },
    { key: 'flanges', widthPx: 104 },
    { key: 'supports', widthPx: 84 },
    { key: 'service', widthPx: 160 },
    { key: 'medium', widthPx: 84 },
    { key: 'mediumC', widthPx: 84 },
    { key: 'pressureGaugePa', widthPx: 112 },
    { key: 'flowKgPerS', widthPx: 84 },
    { key: 'place', widthPx: 130 },
    { key: 'airC', widthPx: 76 },
    { key: 'humidity', widthPx: 84 },
    { key: 'windMPerS', widthPx: 72 },
    { key: 'material', widthPx: 190 },
    { key: 'finish', widthPx: 190 },
    { key: 'maxSurfaceC', widthPx: 120 },
    { key: 'maxLossWPerM', widthPx: 104 },
    { key: 'codeTable', widthPx: 230 },
    { key: 'frostHours', widthPx: 148 },
    { key: 'maxDropK', widthPx: 112 },
    { key: 'measuredSurfaceC', widthPx: 150 },
    { key: 'fuel', widthPx: 150 },
    { key: 'hoursPerYear', widthPx: 98 },
    { key: 'lagging', widthPx: 82 },
    { key: 'governed', widthPx: 112 },
  ],
}

export function columnsOf(set: ColumnSet, widthPx: number, system: UnitSystem): readonly Column[] {
  return sets[set]
    .filter(({ fromPx = 0 }) => widthPx >= fromPx)
    .map(({ key, widthPx: width }) => column(key, width, system))
}

function column(key: FieldKey | ResultName, widthPx: number, system: UnitSystem): Column {
  switch (key) {
    // Typing a thickness fixes it.
    case 'lagging':
      return result(key, 'Thickness', unitLabel('thickness', system), widthPx, 'thicknessM')
    case 'loss':
      // Pieces and surfaces say their own unit, which is longer there.
      return result(
        key,
        'Loss',
        unitLabel('heatLossPerLength', system),
        widthPx + (system === 'us' ? 12 : 0),
      )
    case 'surface':
      return result(key, 'Surface', unitLabel('temperature', system), widthPx)
    case 'governed':
      return { ...result(key, 'Governed by', '', widthPx), isNumber: false }
    default: {
      const field = fieldOf(key)
      const unit = unitOf(field, system)
      return {
        id: key,
        label: field.label,
        unit,
        widthPx,
        isNumber: field.kind === 'number',
        key,
        result: null,
      }
    }
  }
}

function result(
  name: ResultName,
  label: string,
  unit: string,
  widthPx: number,
  key: FieldKey | null = null,
): Column {
  return { id: name, label, unit, widthPx, isNumber: true, key, result: name }
}
