/** What has to hold for each shape by itself: direction, limits, scaling, continuity, and the cost of a solve. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { notesOf } from '#solver/notes.ts'
import { solve } from '#solver/solve.ts'
import type { Layer, Shape, System } from '#solver/types.ts'
import { anySystem, pointCurve, shape, spread, within } from './arbitraries.ts'
import { constant } from './systems.ts'

type Kind = Shape['kind']

const kinds = [
  'pipe',
  'buried-pipe',
  'rect-duct',
  'flat',
  'sphere',
  'vessel',
] as const satisfies readonly Kind[]

/** Any system of one shape. */
const systemsOf = (kind: Kind): fc.Arbitrary<System> =>
  fc
    .tuple(
      anySystem,
      shape.filter((thing) => thing.kind === kind),
    )
    .map(([system, thing]) => ({ ...system, shape: thing }))

/** With one even coefficient outside, so that what changes is geometry and layers alone. */
const fixedSystemsOf = (kind: Kind): fc.Arbitrary<System> =>
  fc
    .tuple(systemsOf(kind), spread(0.5, 200))
    .map(([system, fixedWPerM2K]) => ({ ...system, film: { fixedWPerM2K } }))

const slack = (flux: number): number => 1e-9 * Math.abs(flux) + 1e-9

describe.each(kinds)('any %s', (kind) => {
  test('loses no less to a hotter medium and no more to warmer air, at one coefficient', () => {
    fc.assert(
      fc.property(fixedSystemsOf(kind), within(0.1, 100), (system, moreK) => {
        const { heatFlowWPerUnit: flow } = solve(system)
        const hotter = solve({ ...system, mediumC: system.mediumC + moreK })
        const around = { ...system.around, airC: system.around.airC + moreK }
        expect(hotter.heatFlowWPerUnit).toBeGreaterThanOrEqual(flow - slack(flow))
        expect(solve({ ...system, around }).heatFlowWPerUnit).toBeLessThanOrEqual(
          flow + slack(flow),
        )
      }),
      { numRuns: 150 },
    )
  })

  test('under a layer of next to no thickness is as good as bare', () => {
    fc.assert(
      fc.property(fixedSystemsOf(kind), (given) => {
        const system = { ...given, sunAbsorbedWPerM2: 0 }
        const bare = solve({ ...system, layers: [] }).heatFlowWPerUnit
        const thin = solve({ ...system, layers: [constant(1e-10, 1)] }).heatFlowWPerUnit
        expect(Math.abs(thin - bare)).toBeLessThanOrEqual(1e-6 * Math.abs(bare) + 1e-6)
      }),
      { numRuns: 100 },
    )
  })

  test('with next to no emissivity gives off by convection alone', () => {
    fc.assert(
      fc.property(systemsOf(kind), (given) => {
        const system: System = { ...given, emissivity: 1e-12 }
        for (const face of solve(system).faces) {
          const convection = face.convectionWPerM2K * (face.surfaceTempC - system.around.airC)
          const off = face.heatFluxWPerM2 - convection + system.sunAbsorbedWPerM2
          expect(Math.abs(off)).toBeLessThanOrEqual(1e-6 * Math.abs(convection) + 1e-5)
        }
      }),
      { numRuns: 100 },
    )
  })

  // Fourier's law knows no length of its own: everything k times as large, behind coefficients k times as small, has
  // the same temperatures, and flows that go with area over length.
  test('keeps its temperatures when all lengths grow and all coefficients shrink alike', () => {
    fc.assert(
      fc.property(
        fixedSystemsOf(kind),
        fc.array(fc.tuple(spread(1e-3, 0.3), pointCurve), { maxLength: 3 }),
        spread(0.1, 10),
        (given, curves, factor) => {
          const layers = curves.map(([thicknessM, conductivity]) => ({ thicknessM, conductivity }))
          const system = { ...given, layers, sunAbsorbedWPerM2: 0 }
          fc.pre(staysInSoil(system.shape, layers, factor))
          const before = solve(system)
          const after = solve(scaled(system, factor))
          const spanK = Math.max(1, Math.abs(system.mediumC - system.around.airC))
          before.interfaceTempsC.forEach((tempC, index) => {
            expect(Math.abs((after.interfaceTempsC[index] ?? 0) - tempC)).toBeLessThan(1e-7 * spanK)
          })
          const flows = { m: 1, m2: 1 / factor, piece: factor }[before.unit]
          expect(Math.abs(after.heatFlowWPerUnit - flows * before.heatFlowWPerUnit)).toBeLessThan(
            1e-7 * Math.abs(flows * before.heatFlowWPerUnit) + 1e-9,
          )
        },
      ),
      { numRuns: 100 },
    )
  })

  // A search that halves a bracket of 1200 K down to the last bit takes 60 looks; the bound is where the search gives up, at 300.
  test('is solved in at most 303 looks at the film of a face, in the middle 8, and 25 for 99 of 100', () => {
    const looks: number[] = []
    fc.assert(
      fc.property(systemsOf(kind), (system) => {
        const { filmEvaluations, faces } = solve(system)
        looks.push(filmEvaluations / faces.length)
        expect(filmEvaluations).toBeLessThanOrEqual(303 * faces.length)
      }),
      { numRuns: 1000 },
    )
    looks.sort((one, two) => one - two)
    expect(looks[Math.floor(0.5 * looks.length)]).toBeLessThanOrEqual(8)
    expect(looks[Math.floor(0.99 * looks.length)]).toBeLessThanOrEqual(25)
  })
})

/**
 * Above the soil there is none to scale, and a wire close below its surface meets the bound of what soil may conduct;
 * other shapes know no soil.
 */
const staysInSoil = (thing: Shape, layers: readonly Layer[], factor: number): boolean => {
  if (thing.kind !== 'buried-pipe') return true
  const outerM = layers.reduce((sum, { thicknessM }) => sum + thicknessM, thing.outerDiameterM / 2)
  return thing.depthM > 1.1 * outerM && Math.min(1, factor) * outerM > 0.003
}

/** All lengths times a factor, all coefficients by it; soil and materials as they are. */
function scaled({ shape: thing, layers, film, ...rest }: System, factor: number): System {
  const lengths = Object.entries(thing).map(([key, value]) => [
    key,
    key.endsWith('M') && typeof value === 'number' ? value * factor : value,
  ])
  return {
    ...rest,
    shape: Object.fromEntries(lengths) as Shape,
    layers: layers.map((layer) => ({ ...layer, thicknessM: layer.thicknessM * factor })),
    film: typeof film === 'object' ? { fixedWPerM2K: film.fixedWPerM2K / factor } : film,
    insideFilmWPerM2K: rest.insideFilmWPerM2K === null ? null : rest.insideFilmWPerM2K / factor,
  }
}

describe('more thickness never loses more', () => {
  const λs = spread(0.01, 0.5)
  /** True where a layer of up to `mostM` can only resist more by growing, from d/dd of the resistances. */
  const isBeyondCritical = (system: System, λ: number, h: number, mostM: number): boolean => {
    const { shape: thing } = system
    switch (thing.kind) {
      case 'flat':
        return true
      case 'rect-duct':
        return 2 * (thing.widthM + thing.heightM) > (8 * λ) / h
      case 'pipe':
        return thing.outerDiameterM / 2 > λ / h
      case 'sphere':
        return thing.outerDiameterM / 2 > (2 * λ) / h
      // A flat head counts by its outer area, which grows with the layer: (D + 2d)² over d/λ + 1/h + 1/h_i.
      // A domed one is a sphere of 0.415 D.
      case 'vessel': {
        const filmsM = λ / h + (system.insideFilmWPerM2K ? λ / system.insideFilmWPerM2K : 0)
        return thing.outerDiameterM > (thing.heads === 'flat' ? 2 * mostM : 0) + 5 * filmsM
      }
      // The soil gives way to the layer: d/dr of arcosh(H/r)/λ_E is −H/(r·√(H² − r²))/λ_E.
      case 'buried-pipe': {
        const outerM = thing.outerDiameterM / 2 + mostM
        return (
          thing.depthM > outerM &&
          Math.sqrt(1 - (outerM / thing.depthM) ** 2) * thing.soilWPerMK > λ
        )
      }
    }
  }

  test.each(kinds)('on a %s beyond its critical size', (kind) => {
    fc.assert(
      fc.property(
        fixedSystemsOf(kind),
        λs,
        spread(1e-4, 0.3),
        spread(1e-4, 0.3),
        (given, λ, thicknessM, moreM) => {
          const system = { ...given, sunAbsorbedWPerM2: 0 }
          const h = typeof system.film === 'object' ? system.film.fixedWPerM2K : 0
          fc.pre(isBeyondCritical(system, λ, h, thicknessM + moreM))
          const at = (layers: Layer[]) => Math.abs(solve({ ...system, layers }).heatFlowWPerUnit)
          const thin = at([constant(thicknessM, λ)])
          expect(at([constant(thicknessM + moreM, λ)])).toBeLessThanOrEqual(thin + slack(thin))
        },
      ),
      { numRuns: 200 },
    )
  })
})

describe('continuity', () => {
  /** Follows the larger half of a change of flow down to where it happens: nothing is left of a smooth one. */
  function leftOfChange(system: System, fromC: number, toC: number) {
    const at = (mediumC: number) => solve({ ...system, mediumC }).heatFluxWPerM2
    let [low, high] = [fromC, toC]
    let [lowFlux, highFlux] = [at(low), at(high)]
    for (let i = 0; i < 44; i += 1) {
      const middle = (low + high) / 2
      const flux = at(middle)
      if (Math.abs(flux - lowFlux) > Math.abs(highFlux - flux)) [high, highFlux] = [middle, flux]
      else [low, lowFlux] = [middle, flux]
    }
    return { jump: Math.abs(highFlux - lowFlux), low, high }
  }

  const spans = fc.tuple(within(-200, 1000), within(-200, 1000))

  const continues = (system: System, fromC: number, toC: number, allowedShare: number): void => {
    const { jump, low, high } = leftOfChange(system, fromC, toC)
    const states = [low, high].map((mediumC) => ({ ...system, mediumC }))
    const scale = states.map((state) =>
      Math.max(
        ...solve(state).faces.map((face) =>
          Math.abs(face.convectionWPerM2K * (face.surfaceTempC - state.around.airC)),
        ),
      ),
    )
    if (jump <= allowedShare * Math.max(...scale, 1)) return
    const isSaid = states.some((state) =>
      notesOf(state, solve(state)).some(({ code }) => code === 'film-jump'),
    )
    expect(isSaid, `${JSON.stringify(system)} steps by ${jump} W/m² at ${low} °C`).toBe(true)
  }

  test('of the detailed film: no step on pipes that lie, walls, spheres, and in soil', () => {
    const smooth = anySystem.filter(
      ({ shape: thing }) =>
        (thing.kind === 'pipe' && thing.orientation === 'horizontal') ||
        (thing.kind === 'flat' && thing.facing === 'vertical') ||
        thing.kind === 'sphere' ||
        thing.kind === 'buried-pipe',
    )
    fc.assert(
      fc.property(smooth, spans, (system, [fromC, toC]) => {
        continues({ ...system, film: 'detailed' }, fromC, toC, 1e-6)
      }),
      { numRuns: 150 },
    )
  })

  // The steps of the horizontal plate: 0.59·200^(1/4) after 0.96·200^(1/6), −4 %; 0.54 after 0.59, −8.5 %; and
  // 0.15·8e6^(1/3) after 0.54·8e6^(1/4), +4 %.
  test('of the detailed film on surfaces that lie: no step beyond 9 % of the convection', () => {
    const lying = anySystem.filter(
      ({ shape: thing }) =>
        (thing.kind === 'flat' && thing.facing !== 'vertical') ||
        (thing.kind === 'rect-duct' && thing.riseM === null),
    )
    fc.assert(
      fc.property(lying, spans, (system, [fromC, toC]) => {
        continues({ ...system, film: 'detailed' }, fromC, toC, 0.09)
      }),
      { numRuns: 200 },
    )
  })

  test('of the simplified film: no step beyond a hundredth without a note', () => {
    const simplified = anySystem.filter(
      ({ shape: thing }) =>
        thing.kind === 'pipe' || (thing.kind === 'flat' && thing.facing === 'vertical'),
    )
    fc.assert(
      fc.property(simplified, spans, (system, [fromC, toC]) => {
        continues({ ...system, film: 'simplified' }, fromC, toC, 0.01)
      }),
      { numRuns: 200 },
    )
  })
})
