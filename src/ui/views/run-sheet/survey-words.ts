/** The lines of a survey: what was found, how far it may be off, and what a sound run would show. */
import type { SurveyResult, Uncertain } from '#sizing/result.ts'
import { formatQuantity, formatWithUnit, shownValue, unitLabel } from '#units/format.ts'
import type { QuantityName, UnitSystem } from '#units/quantities.ts'

export interface SurveyRow {
  readonly name: string
  readonly value: string
  /** Null where it is read, not found. */
  readonly plusMinus: string | null
  readonly unit: string
  /** With its unit; null where nothing is there to compare with. */
  readonly sound: string | null
}

export function surveyRows(survey: SurveyResult, units: UnitSystem): readonly SurveyRow[] {
  const found = (
    name: string,
    uncertain: Uncertain | null,
    quantity: QuantityName,
    sound: number | null = null,
  ): SurveyRow[] => {
    if (uncertain === null) return []
    const decimals = tellingDecimals(uncertain, quantity, units)
    return [
      {
        name,
        value: formatQuantity(uncertain.value, quantity, units, decimals),
        plusMinus: formatQuantity(uncertain.plusMinus, quantity, units, decimals),
        unit: unitLabel(quantity, units),
        sound: sound === null ? null : formatWithUnit(sound, quantity, units, decimals),
      },
    ]
  }
  const { expectedSurfaceC: expected } = survey
  return [
    {
      name: 'Surface, measured',
      value: formatQuantity(survey.measuredSurfaceC, 'temperature', units),
      plusMinus: null,
      unit: unitLabel('temperature', units),
      sound: expected === null ? null : formatWithUnit(expected, 'temperature', units),
    },
    ...found('Heat flux', survey.heatFluxWPerM2, 'heatFlux'),
    ...found('Loss', survey.heatLossWPerM, 'heatLossPerLength'),
    ...found('Loss, whole', survey.heatLossW, 'power'),
    ...found('Conducts', survey.effectiveWPerMK, 'conductivity', survey.soundWPerMK),
  ]
}

/** Two figures of what it may be off: more would pretend to know. */
function tellingDecimals(
  { plusMinus }: Uncertain,
  quantity: QuantityName,
  units: UnitSystem,
): number {
  const shown = Math.abs(
    (shownValue(plusMinus, quantity, units) ?? 0) - (shownValue(0, quantity, units) ?? 0),
  )
  return shown > 0 ? Math.min(4, Math.max(0, 1 - Math.floor(Math.log10(shown)))) : 1
}
