/** The temperatures of the medium: as given, or of saturated steam at its pressure. */
import { saturationCells, saturationTemperatureC } from '#catalogue/lookup.ts'
import type { SteamReading } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'

/** A medium and a pressure may both be given if they agree within this [K]. */
const SAME_TEMPERATURE_K = 1

export interface Medium {
  readonly mediumC: number
  readonly hottestC: number
  readonly coldestC: number
}

export function resolveMedium(
  values: RunValues,
  index: CatalogueIndex,
  findings: Findings,
): Medium | null {
  const mediumC = mediumTemperatureC(values, index, findings)
  if (mediumC === null) return null
  const hottestC = values.mediumMaxC ?? mediumC
  const coldestC = values.mediumMinC ?? mediumC
  if (hottestC < mediumC) {
    findings.fault(
      'mediumMaxC',
      `${plain(hottestC)} °C`,
      `${plain(mediumC)} °C or more, since the medium itself is at that`,
    )
  }
  if (coldestC > mediumC) {
    findings.fault(
      'mediumMinC',
      `${plain(coldestC)} °C`,
      `${plain(mediumC)} °C or less, since the medium itself is at that`,
    )
  }
  return { mediumC, hottestC, coldestC }
}

function mediumTemperatureC(
  values: RunValues,
  index: CatalogueIndex,
  findings: Findings,
): number | null {
  if (values.pressureGaugePa === undefined) {
    if (values.mediumC !== undefined) return values.mediumC
    findings.fault(
      'mediumC',
      'nothing',
      'the temperature of the medium in °C, or pressure_bar_g if it is saturated steam',
    )
    return null
  }
  if (values.medium !== undefined && values.medium !== 'steam') {
    findings.fault(
      'pressureGaugePa',
      `a pressure beside medium ${values.medium}`,
      'nothing: only saturated steam is given by its pressure',
    )
    return null
  }
  const steam = saturationTemperatureC(index.catalogue.steam, values.pressureGaugePa)
  if (!steam.ok) {
    findings.fault(
      'pressureGaugePa',
      `${plain(values.pressureGaugePa / 1e5, 3)} bar g`,
      steam.message,
    )
    return null
  }
  if (
    values.mediumC !== undefined &&
    Math.abs(values.mediumC - steam.temperatureC) > SAME_TEMPERATURE_K
  ) {
    findings.fault(
      'mediumC',
      `${plain(values.mediumC)} °C beside ${plain(values.pressureGaugePa / 1e5, 3)} bar g`,
      `nothing, or ${plain(steam.temperatureC)} °C, at which steam of that pressure is saturated`,
    )
    return null
  }
  findings.note(
    'steam-saturated',
    `Steam of ${plain(values.pressureGaugePa / 1e5, 2)} bar g is saturated at ${plain(steam.temperatureC)} °C.`,
  )
  return steam.temperatureC
}

/** What the temperature of steam given by its pressure was read off; null where it was not. */
export function steamReading(
  { pressureGaugePa }: RunValues,
  { catalogue }: CatalogueIndex,
): SteamReading | null {
  if (pressureGaugePa === undefined) return null
  const cells = saturationCells(catalogue.steam, pressureGaugePa)
  return {
    gaugePressurePa: pressureGaugePa,
    cells: cells.map(({ pressureAbsolutePa, temperatureC }) => ({
      pressureAbsolutePa,
      temperatureC,
    })),
  }
}
