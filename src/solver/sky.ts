/** What an outdoor surface radiates to: the sky, and what stands around. */
import { kelvin, ZERO_CELSIUS_K } from './constants.ts'
import { correlation } from './correlation.ts'

/**
 * Radiant temperature of a clear night sky [°C]; clouds bring it up to that of the air.
 *
 * No range is remembered; given is that of the nights it was fitted to, widened. Above 55 °C it would pass the air itself.
 */
export const clearSky = correlation<{ readonly airC: number }>(
  {
    name: 'Swinbank, clear sky',
    source: 'clearSkySwinbank1963',
    equation: 'T = 0.0552 T_air^1.5, both in K',
    valid: { airC: [-10, 40] },
  },
  ({ airC }) => 0.0552 * kelvin(airC) ** 1.5 - ZERO_CELSIUS_K,
)

/** Radiant temperature of a clear night sky [°C] from air temperature [°C]. */
export const clearSkyC = (airC: number): number => clearSky({ airC })

export interface RadiantMix {
  /** Share of the sky in what the surface sees, 0 to 1; 0.5 for a pipe in the open. */
  readonly skyView: number
  readonly skyC: number
  /** Ground and walls: the rest of what the surface sees [°C]. */
  readonly surroundingsC: number
}

/**
 * The one temperature of surroundings that radiates as sky and surroundings do together [°C].
 *
 * T⁴ mixes by view, exact for a grey surface. Source: Stefan-Boltzmann law.
 */
export function radiantMixC({ skyView, skyC, surroundingsC }: RadiantMix): number {
  const mixed = skyView * kelvin(skyC) ** 4 + (1 - skyView) * kelvin(surroundingsC) ** 4
  return Math.sqrt(Math.sqrt(mixed)) - ZERO_CELSIUS_K
}
