/** The outer film of one face at one condition: from the surface temperature to the flux that leaves it. */
import { type FaceShape, isCylinder, isSimplified, kelvin, radiates } from '#solver/index.ts'
import { airSteps, pressureStep } from './air.ts'
import type { FaceAt } from './face.ts'
import { freeSteps } from './free.ts'
import type { Ledger } from './ledger.ts'
import { radiationSteps } from './radiation.ts'
import { simplifiedSteps } from './simplified.ts'
import { windSteps } from './wind.ts'

const W_M2K = 'W/(m²·K)'
const W_M2 = 'W/m²'

export function filmSteps(ledger: Ledger, at: FaceAt): void {
  const { system, shape, face } = at
  const { around } = system
  const isGround = shape.flow === 'ground'
  ledger.given(isGround ? 'Surface of the ground' : 'Air', 'θ_a', around.airC, '°C')
  surfaceLine(ledger, at)
  const isRadiating = radiates(shape, system.film)
  if (face.closure === 'on-jump') {
    ledger.given(
      'Coefficient of convection that closes the balance: between the two sides of a jump of the film formula',
      'h_c',
      face.convectionWPerM2K,
      W_M2K,
    )
  } else convectionSteps(ledger, at)
  ledger.step(
    isRadiating ? 'Flux by convection' : isGround ? 'Flux into the ground' : 'Flux to the air',
    'q_c',
    'h_c × (θ_s − θ_a)',
    W_M2,
  )
  const parts = ['q_c']
  if (isRadiating) {
    radiationSteps(ledger, at)
    parts.push('+ q_r')
  }
  if (at.sunWPerM2 > 0) {
    ledger.given('Sun on the surface', 'G', at.sunWPerM2, W_M2)
    ledger.given('Share of it that the surface takes up', 'α', at.solarAbsorptance, '')
    ledger.step('Sun taken up', 'q_S', 'α × G', W_M2, { value: system.sunAbsorbedWPerM2 })
    parts.push('− q_S')
  }
  ledger.step('Flux outwards on the outer area', 'q', parts.join(' '), W_M2, {
    value: face.heatFluxWPerM2,
  })
}

/** A bare surface without a film inside is as warm as the medium; any other is found by search. */
function surfaceLine(ledger: Ledger, { system, face, surfaceWords }: FaceAt): void {
  const isMedium = system.layers.length === 0 && system.insideFilmWPerM2K === null
  ledger.given(
    surfaceWords ??
      (isMedium
        ? 'Surface: bare, as warm as the medium'
        : 'Surface: found by search so that both fluxes agree, that of the film here and that of the layers below'),
    'θ_s',
    face.surfaceTempC,
    '°C',
  )
}

function convectionSteps(ledger: Ledger, at: FaceAt): void {
  const { system, shape, face } = at
  const { film } = system
  if (shape.flow === 'ground') groundSteps(ledger, at)
  else if (typeof film === 'object') {
    ledger.given('Film coefficient, fixed for this run', 'h_c', film.fixedWPerM2K, W_M2K, {
      source: 'given; convection and radiation together',
    })
  } else if (film === 'simplified' && isSimplified(shape.flow)) {
    differenceAndLengths(ledger, at)
    simplifiedSteps(ledger, {
      shape,
      windMPerS: system.around.windMPerS,
      excessK: face.surfaceTempC - system.around.airC,
      inclinedFilm: system.inclinedFilm,
      convectionWPerM2K: face.convectionWPerM2K,
    })
  } else detailedSteps(ledger, at)
}

function differenceAndLengths(ledger: Ledger, { system, shape }: FaceAt): void {
  const { windMPerS } = system.around
  ledger.step('Surface and air differ by', 'ΔT', 'abs(θ_s − θ_a)', 'K')
  const isRound = isCylinder(shape.flow) || shape.flow === 'sphere'
  ledger.given(lengthWords(shape), 'L', shape.freeLengthM, 'm')
  const isDiameterUsed = windMPerS > 0 || shape.flow !== 'horizontal-cylinder'
  if (isRound && (isDiameterUsed || system.film === 'simplified')) {
    ledger.given('Outer diameter', 'D_w', shape.windLengthM, 'm')
  }
  ledger.given('Wind', 'v', windMPerS, 'm/s')
  if (!isRound && windMPerS > 0) {
    ledger.given('Length along the wind', 'L_w', shape.windLengthM, 'm')
  }
}

function lengthWords({ flow }: FaceShape): string {
  switch (flow) {
    case 'horizontal-cylinder':
    case 'sphere':
      return 'Length of free convection: the outer diameter'
    case 'up':
    case 'down':
      return 'Length of free convection: area over perimeter'
    default:
      return 'Length of free convection: the height'
  }
}

function detailedSteps(ledger: Ledger, at: FaceAt): void {
  const { system, shape, face } = at
  const { airC, windMPerS, altitudeM } = system.around
  const excessK = face.surfaceTempC - airC
  const filmC = airC + 0.5 * excessK
  const pressurePa = pressureStep(ledger, altitudeM)
  ledger.step(
    'Film: halfway between surface and air, absolute',
    'T',
    '(θ_s + θ_a) / 2 + 273.15',
    'K',
    {
      value: kelvin(filmC),
    },
  )
  airSteps(ledger, filmC, pressurePa)
  differenceAndLengths(ledger, at)
  freeSteps(ledger, { shape, excessK, inclinedFilm: system.inclinedFilm })
  const value = face.convectionWPerM2K
  if (windMPerS === 0) {
    ledger.step('Coefficient of convection: no wind', 'h_c', 'h_n', W_M2K, { value })
    return
  }
  windSteps(ledger, shape, { airC, windMPerS, pressurePa }, excessK)
  const isRound = isCylinder(shape.flow) || shape.flow === 'sphere'
  const power = isRound ? 4 : 3
  ledger.step(
    'Coefficient of convection: both together',
    'h_c',
    `(h_n^${power} + h_w^${power})^(1 / ${power})`,
    W_M2K,
    { value, source: 'mixed convection, power of 4 round and 3 flat: Incropera, from memory' },
  )
}

function groundSteps(ledger: Ledger, { system, shape, face }: FaceAt): void {
  if (system.shape.kind !== 'buried-pipe') return
  const { depthM, soilWPerMK } = system.shape
  ledger.given('Depth of the axis', 'H', depthM, 'm')
  ledger.given('Outer diameter', 'D_w', shape.windLengthM, 'm')
  ledger.given('Conductivity of the soil', 'λ_E', soilWPerMK, 'W/(m·K)')
  if (2 * depthM <= shape.windLengthM) {
    ledger.given(
      'Coefficient of the soil: the pipe reaches out of it, so that it is taken as no resistance',
      'h_c',
      face.convectionWPerM2K,
      W_M2K,
    )
    return
  }
  ledger.step('Depth over radius', 'y', '2 × H / D_w', '')
  ledger.step(
    'Resistance of the soil, per metre',
    'R_E',
    'ln(y + sqrt(y^2 − 1)) / (2 × π × λ_E)',
    'm·K/W',
    {
      source: 'shape factor of a cylinder below a plane, from memory',
    },
  )
  ledger.step('The same as a coefficient on the outer area', 'h_c', '1 / (R_E × π × D_w)', W_M2K, {
    value: face.convectionWPerM2K,
  })
}
