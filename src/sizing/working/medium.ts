/** What was read off the tables of the catalogue for the medium: saturation, heat capacity, heat of condensation. */
import type { Problem, TableCell } from '../problem.ts'
import { Ledger } from './ledger.ts'
import type { Section } from './types.ts'

const STEAM_TABLE =
  'steam table of the catalogue, by IAPWS-IF97; between its states 1/T is straight in ln p'

/** The temperature of saturated steam from its pressure; null where the medium was given by its temperature. */
export function steamSection({ steam, conditions }: Problem): Section | null {
  const [low, high] = steam?.cells ?? []
  if (steam === null || !low) return null
  const ledger = new Ledger('The steam', null)
  ledger.given('Pressure above that of the atmosphere', 'p_g', steam.gaugePressurePa, 'Pa')
  ledger.step('Absolute pressure', 'p_S', 'p_g + 101325', 'Pa')
  if (!high) {
    ledger.given('Saturated at that pressure', 'θ_i', low.temperatureC, '°C', {
      source: STEAM_TABLE,
    })
    return ledger.section()
  }
  for (const [state, at, side] of [
    [low, 1, 'below'],
    [high, 2, 'above'],
  ] as const) {
    ledger.given(`Pressure of the state ${side}`, `p_${at}`, state.pressureAbsolutePa, 'Pa')
    ledger.given('Its temperature', `θ_${at}`, state.temperatureC, '°C')
  }
  ledger.step('Way from the one to the other', 'x', 'ln(p_S / p_1) / ln(p_2 / p_1)', '')
  ledger.step(
    'Saturated at that pressure',
    'θ_i',
    '1 / ((1 − x) / (θ_1 + 273.15) + x / (θ_2 + 273.15)) − 273.15',
    '°C',
    { value: conditions.loss.mediumC, source: STEAM_TABLE },
  )
  return ledger.section()
}

export interface Tabled {
  readonly words: string
  readonly symbol: string
  readonly unit: string
  readonly value: number
  readonly cells: readonly TableCell[]
  /** Of the temperature at which it is read: stands above. */
  readonly at: string
}

/** A figure of the medium: as given, the cell of a table, or straight between the two around it. */
export function tabledStep(ledger: Ledger, tabled: Tabled): void {
  const { words, symbol, unit, value, cells, at } = tabled
  const [low, high] = cells
  const source =
    cells.length === 0 ? 'given' : 'table of the catalogue, straight between its states'
  if (!low || !high) {
    ledger.given(words, symbol, value, unit, { source })
    return
  }
  for (const [cell, end, side] of [
    [low, 'a', 'below'],
    [high, 'b', 'above'],
  ] as const) {
    ledger.given(`Temperature of the state ${side}`, `θ_${end}`, cell.tempC, '°C')
    ledger.given(`${words} there`, `${symbol}_${end}`, cell.value, unit)
  }
  const share = `(${at} − θ_a) / (θ_b − θ_a)`
  ledger.step(words, symbol, `${symbol}_a + (${symbol}_b − ${symbol}_a) × ${share}`, unit, {
    value,
    source,
  })
}
