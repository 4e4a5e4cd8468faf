/** Random systems over the whole of what a run may hold, ends and awkward values included. */
import fc from 'fast-check'
import { type FieldKey, fieldOf } from '#model/fields.ts'
import type { Conductivity, FilmChoice, Layer, Shape, Surroundings, System } from '#solver/types.ts'

// The same cases every time, so that what passed once passes again. To hunt further, try other seeds.
fc.configureGlobal({ seed: 1 })

/** A number in the range of a field; the ends come up often. */
export function ofField(key: FieldKey): fc.Arbitrary<number> {
  const field = fieldOf(key)
  if (field.kind !== 'number') throw new Error(`${key} is not a number`)
  return within(field.min, field.max)
}

/** Evenly between 0 and 1; `fc.double` would be even over the bit patterns, which lie thickest at 0. */
const even = fc.noBias(fc.integer({ min: 0, max: 2 ** 30 })).map((n) => n / 2 ** 30)

export const within = (min: number, max: number): fc.Arbitrary<number> =>
  fc.oneof(
    { weight: 8, arbitrary: even.map((x) => min + x * (max - min)) },
    { weight: 1, arbitrary: fc.constantFrom(min, max) },
  )

/** Evenly spread over the powers of ten, for what may be a millimetre or twenty metres. */
export const spread = (min: number, max: number): fc.Arbitrary<number> =>
  within(Math.log(min), Math.log(max)).map((x) => Math.min(max, Math.max(min, Math.exp(x))))

export const constantConductivity: fc.Arbitrary<Conductivity> = spread(0.001, 5).map(
  (conductivityWPerMK) => ({ kind: 'constant', conductivityWPerMK }),
)

const pointsC = fc
  .uniqueArray(fc.integer({ min: -200, max: 1000 }), { minLength: 1, maxLength: 6 })
  .map((temps) => temps.sort((a, b) => a - b))

/** λ(T) itself: rising, falling or jagged, a single point included. */
export const pointCurve: fc.Arbitrary<Conductivity> = pointsC.chain((temps) =>
  fc
    .array(spread(0.005, 1), { minLength: temps.length, maxLength: temps.length })
    .map((valuesWPerMK) => ({ kind: 'curve', basis: 'point', pointsC: temps, valuesWPerMK })),
)

/**
 * A series against mean temperature, rising or gently falling. Gently, since a flow through a layer belongs to one
 * temperature difference only while λ changes by less than itself over half that difference.
 */
export const meanCurve: fc.Arbitrary<Conductivity> = fc
  .record({
    temps: pointsC,
    at200BelowWPerMK: spread(0.01, 0.5),
    slope: within(-0.3, 0.5),
    bend: within(0, 0.3),
  })
  .map(({ temps, at200BelowWPerMK, slope, bend }) => ({
    kind: 'curve',
    basis: 'mean',
    pointsC: temps,
    valuesWPerMK: temps.map((temp) => {
      const x = (temp + 200) / 1200
      return at200BelowWPerMK * (1 + slope * x + bend * x * x)
    }),
  }))

export const conductivity = fc.oneof(constantConductivity, pointCurve, meanCurve)

export const layersOf = (
  of: fc.Arbitrary<Conductivity>,
  least = 0,
  most = 4,
): fc.Arbitrary<Layer[]> =>
  fc.array(fc.record({ thicknessM: spread(1e-4, 1), conductivity: of }), {
    minLength: least,
    maxLength: most,
  })

const pipe = fc.record({
  kind: fc.constant('pipe' as const),
  outerDiameterM: spread(0.001, 20),
  orientation: fc.constant('horizontal' as const),
})

/** Pipes that stand or lean. */
export const rising = fc.record({
  kind: fc.constant('pipe' as const),
  outerDiameterM: spread(0.001, 20),
  orientation: fc.constantFrom('vertical' as const, 'inclined' as const),
  riseM: spread(0.05, 500),
})

/** In the soil when bare; thick layers may bring it out. */
export const buried = fc
  .record({
    kind: fc.constant('buried-pipe' as const),
    outerDiameterM: spread(0.001, 20),
    coverM: spread(0.001, 40),
    soilWPerMK: ofField('soilWPerMK'),
  })
  .map(({ coverM, ...rest }) => ({ ...rest, depthM: rest.outerDiameterM / 2 + coverM }))

const duct = fc.record({
  kind: fc.constant('rect-duct' as const),
  widthM: spread(0.01, 50),
  heightM: spread(0.01, 50),
  riseM: fc.oneof(fc.constant(null), spread(0.05, 500)),
})

const flat = fc.record({
  kind: fc.constant('flat' as const),
  facing: fc.constantFrom('vertical' as const, 'up' as const, 'down' as const),
  characteristicLengthM: spread(0.01, 50),
})

const sphere = fc.record({
  kind: fc.constant('sphere' as const),
  outerDiameterM: spread(0.001, 20),
})

const vessel = fc.record({
  kind: fc.constant('vessel' as const),
  outerDiameterM: spread(0.05, 20),
  shellLengthM: spread(0.01, 100),
  orientation: fc.constantFrom('horizontal' as const, 'vertical' as const),
  heads: fc.constantFrom('flat' as const, 'domed' as const),
})

export const shape: fc.Arbitrary<Shape> = fc.oneof(pipe, rising, buried, duct, flat, sphere, vessel)

/** Shapes whose detailed film has no step anywhere: a hotter surface always gives off more. */
export const unfacing: fc.Arbitrary<Shape> = fc.oneof(
  pipe,
  flat.map((given) => ({ ...given, facing: 'vertical' as const })),
  sphere,
  buried,
)

export const film: fc.Arbitrary<FilmChoice> = fc.oneof(
  { weight: 4, arbitrary: fc.constant('detailed' as const) },
  { weight: 2, arbitrary: fc.constant('simplified' as const) },
  {
    weight: 1,
    arbitrary: spread(0.1, 1000).map((fixedWPerM2K) => ({ fixedWPerM2K })),
  },
)

export const around: fc.Arbitrary<Surroundings> = fc
  .record({
    airC: ofField('airC'),
    surroundingsC: ofField('surroundingsC'),
    isSame: fc.boolean(),
    windMPerS: fc.oneof(fc.constant(0), spread(0.001, 60)),
    altitudeM: ofField('altitudeM'),
  })
  .map(({ isSame, ...rest }) => (isSame ? { ...rest, surroundingsC: rest.airC } : rest))

export const systemOf = (layers: fc.Arbitrary<Layer[]>): fc.Arbitrary<System> =>
  fc.record({
    shape,
    layers,
    emissivity: ofField('emissivity'),
    mediumC: ofField('mediumC'),
    insideFilmWPerM2K: fc.oneof(fc.constant(null), spread(0.5, 1e4)),
    around,
    sunAbsorbedWPerM2: fc.oneof(fc.constant(0), ofField('solarWPerM2')),
    film,
    inclinedFilm: fc.constantFrom('lower' as const, 'higher' as const),
  })

export const anySystem = systemOf(layersOf(conductivity))

/** Under the film whose formulas are those of the handbooks. */
export const detailedSystem = anySystem.map((system) => ({ ...system, film: 'detailed' as const }))
