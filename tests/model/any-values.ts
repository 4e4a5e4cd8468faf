/** Any values a run can carry, read off the list of fields: sensible, at the ends of the ranges, and nonsense. */
import fc from 'fast-check'
import { type Field, fields, type RunValues } from '#model/fields.ts'
import { catalogue } from '../sizing/catalogue.ts'

const names: Readonly<Partial<Record<string, readonly string[]>>> = {
  size: [
    'DN 15',
    'DN 50',
    'DN 600',
    'NPS 2',
    'NPS 12 sch 80',
    'CU 28',
    'D 250',
    '600 x 400',
    '99999 x 1',
  ],
  pipeMaterial: catalogue.wallMaterials.map(({ id }) => id),
  material: catalogue.materials.map(({ id }) => id),
  finish: catalogue.finishes.map(({ id }) => id),
  fuel: catalogue.fuels.map(({ id }) => id),
  codeTable: catalogue.codeTables.map(({ id }) => id),
  monthlyAirC: ['-2;0;4;9;14;17;19;18;14;9;4;0', '20;20;20;20;20;20;20;20;20;20;20;20'],
  layers: [
    'calcium_silicate:40;stone_wool_pipe_section:?',
    'elastomeric_foam_nbr:?',
    'pir_pipe_section:30;pir_pipe_section:40',
    'microporous:10;stone_wool_slab:50;calcium_silicate:?',
    'nothing of the kind:30',
    'stone_wool_slab:?;stone_wool_slab:?',
    ';;',
  ],
}

/** Even over a range; a plain `fc.double` is even over its bits, and so nearly always next to nothing. */
export const evenly = (min: number, max: number): fc.Arbitrary<number> =>
  fc.integer({ min: 0, max: 1_000_000 }).map((part) => min + ((max - min) * part) / 1_000_000)

function numberIn(field: Extract<Field, { kind: 'number' }>): fc.Arbitrary<number> {
  const { min, max } = field
  if (field.whole) return fc.integer({ min, max })
  const within = (value: number): number => Math.min(max, Math.max(min, value))
  return fc.oneof(
    { weight: 5, arbitrary: evenly(min, max) },
    // Most of a range that spans decades is found on its logarithm.
    { weight: 4, arbitrary: evenly(-4, 4).map((exponent) => within(10 ** exponent)) },
    { weight: 1, arbitrary: evenly(min, max).map((value) => within(Math.round(value))) },
    { weight: 1, arbitrary: fc.constantFrom(min, max, within(0)) },
    { weight: 1, arbitrary: fc.double({ min, max, noNaN: true }) },
  )
}

function anyOf(field: Field): fc.Arbitrary<unknown> {
  switch (field.kind) {
    case 'number':
      return numberIn(field)
    case 'flag':
      return fc.boolean()
    case 'choice':
      return fc.constantFrom(...field.choices)
    case 'text': {
      const known = names[field.key]
      const any = fc.string({ maxLength: field.maxLength, unit: 'binary' })
      return known
        ? fc.oneof(
            { weight: 15, arbitrary: fc.constantFrom(...known) },
            { weight: 1, arbitrary: any },
          )
        : any
    }
  }
}

type Weights = Readonly<Record<string, number>>

function record(percent: (field: Field) => number): fc.Arbitrary<RunValues> {
  const entries = fields.map((field) =>
    fc.oneof(
      { weight: 100 - percent(field), arbitrary: fc.constant(null) },
      {
        weight: percent(field),
        arbitrary: anyOf(field).map((value): [string, unknown] => [field.key, value]),
      },
    ),
  )
  return fc
    .tuple(...entries)
    .map((found) => Object.fromEntries(found.filter((entry) => entry !== null)) as RunValues)
}

/** Every field there or not by chance. */
export const anyValues: fc.Arbitrary<RunValues> = fc.oneof(
  record(() => 30),
  record(() => 80),
)

/** Fields that clash with others are seldom there, so that most of these runs are sized. */
const seldom: Weights = {
  layers: 0,
  conductivityWPerMK: 10,
  pressureGaugePa: 0,
  mediumMaxC: 0,
  mediumMinC: 0,
  outerDiameterM: 0,
  orientation: 0,
  reach: 10,
  thicknessM: 20,
  steps: 10,
  size: 0,
  maxLossWPerM: 10,
  maxOuterDiameterM: 10,
  buryDepthM: 10,
  money: 10,
  // Each asks for others to be given with it: they come together, from `asked`.
  medium: 0,
  wallM: 0,
  monthlyAirC: 10,
  frostHours: 0,
  maxDropK: 0,
  codeTable: 0,
  codeFactor: 0,
}

/** Limits that need more than their own field. */
const asked: fc.Arbitrary<RunValues> = fc.oneof(
  { weight: 2, arbitrary: fc.constant({}) },
  {
    weight: 1,
    arbitrary: fc.record({
      medium: fc.constant('water' as const),
      frostHours: evenly(-2, 3).map((exponent) => 10 ** exponent),
      frostAirC: evenly(-70, 20),
      frostStartC: evenly(0.001, 100),
      frostFraction: evenly(0, 1),
    }),
  },
  {
    weight: 1,
    arbitrary: fc.record({
      medium: fc.constantFrom('water', 'steam', 'air', 'other'),
      maxDropK: evenly(-2, 2).map((exponent) => 10 ** exponent),
      flowKgPerS: evenly(-5, 4).map((exponent) => 10 ** exponent),
      heatCapacityJPerKgK: evenly(500, 5000),
      lengthM: evenly(0.1, 500),
    }),
  },
  {
    weight: 1,
    arbitrary: fc.record({
      codeTable: fc.constantFrom(...(names.codeTable ?? [])),
      codeFactor: evenly(0.05, 10),
    }),
  },
)

/** Frost is for pipes, a drop for lines, a wall for what is round; a code table is for pipes or for ducts. */
function suited(run: RunValues): RunValues {
  const { frostHours, maxDropK, codeTable, ...rest } = run
  const { shape, outerDiameterM } = run
  const isForPipes = codeTable?.includes('duct') === false
  return {
    ...rest,
    ...(frostHours !== undefined && shape === 'pipe' && { frostHours }),
    ...(codeTable !== undefined && isForPipes === (shape === 'pipe') && { codeTable }),
    ...(maxDropK !== undefined && shape !== 'flat' && { maxDropK }),
    ...(outerDiameterM !== undefined && {
      wallM: Math.min(0.5, Math.max(1e-4, 0.05 * outerDiameterM)),
    }),
  }
}

const shapeAndSize = fc.oneof(
  fc.record({
    shape: fc.constant('pipe' as const),
    size: fc.constantFrom('DN 15', 'DN 50', 'DN 600', 'NPS 2', 'CU 28'),
    orientation: fc.constantFrom('horizontal' as const, 'vertical' as const),
    lengthM: evenly(0.1, 500),
  }),
  fc.record({
    shape: fc.constantFrom('pipe' as const, 'round-duct' as const),
    outerDiameterM: evenly(-3, 1.3).map((exponent) => 10 ** exponent),
  }),
  fc.record({
    shape: fc.constant('rect-duct' as const),
    widthM: evenly(0.01, 50),
    heightM: evenly(0.01, 50),
  }),
  fc.record({
    shape: fc.constant('flat' as const),
    widthM: evenly(0.01, 50),
    heightM: evenly(0.01, 50),
    orientation: fc.constantFrom('up' as const, 'down' as const, 'vertical' as const),
  }),
)

/** Runs of which most can be sized, from one end of every range to the other. */
export const usualValues: fc.Arbitrary<RunValues> = fc
  .tuple(
    record((field) => seldom[field.key] ?? 50),
    shapeAndSize,
    fc.record({
      tag: fc.constant('A'),
      mediumC: evenly(-200, 1000),
      airC: evenly(-70, 200),
      material: fc.constantFrom(...(names.material ?? [])),
    }),
    fc.tuple(evenly(0, 200), evenly(0, 200)),
    asked,
  )
  .map(([extra, size, needed, [hotterK, colderK], limit]) =>
    suited({
      ...extra,
      ...needed,
      ...limit,
      ...size,
      ...(hotterK > 100 ? { mediumMaxC: Math.min(1000, needed.mediumC + hotterK - 100) } : {}),
      ...(colderK > 100 ? { mediumMinC: Math.max(-200, needed.mediumC - colderK + 100) } : {}),
    }),
  )
