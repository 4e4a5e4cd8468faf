/** From the flux to the loss of a metre and of the whole run with what is on it. */
import type { Solution } from '#solver/types.ts'
import type { Settled } from '../build-up.ts'
import type { Fittings, Problem } from '../problem.ts'
import { runLoss } from '../run-loss.ts'
import { Ledger } from './ledger.ts'
import { endSteps } from './sizes.ts'
import type { Section } from './types.ts'

const perUnit = { m: 'W/m', m2: 'W/m²', piece: 'W' } as const
const ofUnit = { m: 'a metre', m2: 'a square metre', piece: 'the whole' } as const
const extents = {
  m: { words: 'Length', symbol: 'l', unit: 'm' },
  m2: { words: 'Area', symbol: 'S', unit: 'm²' },
  piece: { words: 'Pieces', symbol: 'N', unit: '' },
} as const

export function totalsSection(
  problem: Problem,
  settled: Settled,
  state: Solution,
  bareState: Solution,
  title: string,
): Section {
  const ledger = new Ledger(`${title}: the whole run`, null)
  const { unit } = state
  ledger.given('Flux on the outer area', 'q', state.heatFluxWPerM2, 'W/m²')
  ledger.given('Outer area', 'A', state.outerAreaM2PerUnit, unit === 'm' ? 'm²/m' : 'm²')
  ledger.step(`Heat that ${ofUnit[unit]} loses`, 'Φ', 'q × A', perUnit[unit], {
    value: state.heatFlowWPerUnit,
  })
  const total = runLoss(problem, settled, state, bareState)
  if (problem.extent === null || total === null) {
    ledger.say('The length is not given: there is no loss of the whole run.')
    return ledger.section()
  }
  const { words, symbol } = extents[unit]
  ledger.given(words, symbol, problem.extent, extents[unit].unit)
  ledger.step('Loss of the run as if straight and plain', 'Q_0', `Φ × ${symbol}`, 'W')
  const added = fittingSteps(ledger, problem, settled, state, bareState)
  ledger.step('Loss of the whole run', 'Q', ['Q_0', ...added].join(' + '), 'W', {
    value: total.totalW,
  })
  return ledger.section()
}

/** What supports, fittings and ends add; the symbols of their lines. */
function fittingSteps(
  ledger: Ledger,
  { shape, fittings }: Problem,
  settled: Settled,
  state: Solution,
  bareState: Solution,
): string[] {
  const isBare = settled.layers.length === 0
  const areBare = isBare || fittings.areBare
  const source = fittings.convention
  const added: string[] = []
  if (!isBare && fittings.supportShare > 0) {
    ledger.given('Share that supports add', 'f', fittings.supportShare, '', { source })
    ledger.step('Supports', 'Q_S', 'f × Q_0', 'W')
    added.push('Q_S')
  }
  const hasEnds = state.unit === 'm' && fittings.ends > 0
  if (areBare && (fittings.bareAreaM2 > 0 || hasEnds)) {
    ledger.given('Flux of the bare run', 'q_b', bareState.heatFluxWPerM2, 'W/m²')
  }
  if (areBare && fittings.bareAreaM2 > 0) {
    itemSteps(ledger, fittings, 'bareAreaM2')
    ledger.step('Bare fittings lose the flux of the bare run', 'Q_F', 'A_F × q_b', 'W')
    added.push('Q_F')
  } else if (!areBare && fittings.laggedLengthM > 0) {
    itemSteps(ledger, fittings, 'laggedLengthM')
    ledger.step('Lagged fittings', 'Q_F', 'l_F × Φ', 'W')
    added.push('Q_F')
  }
  if (hasEnds) {
    ledger.given('Ends that are closed off', 'n', fittings.ends, '')
    endSteps(ledger, shape, areBare ? 0 : settled.thicknessM)
    ledger.step(
      areBare ? 'Ends lose the flux of the bare run' : 'Ends lose the flux of the run',
      'Q_E',
      areBare ? 'n × A_E × q_b' : 'n × A_E × q',
      'W',
    )
    added.push('Q_E')
  }
  return added
}

const sums = {
  bareAreaM2: {
    each: 'Surface of each',
    all: 'Surface of the bare fittings',
    letter: 'A',
    unit: 'm²',
  },
  laggedLengthM: {
    each: 'Length of run that loses as much as each',
    all: 'Length of run that loses as much as the lagged fittings',
    letter: 'l',
    unit: 'm',
  },
} as const

/** Surface or length of all fittings, A_F or l_F: so many of each kind. */
function itemSteps(ledger: Ledger, fittings: Fittings, by: keyof typeof sums): void {
  const { each, all, letter, unit } = sums[by]
  const source = fittings.convention
  fittings.items.forEach((item, index) => {
    const at = index + 1
    ledger.given(`Number of ${item.name}`, `n_${at}`, item.count, '')
    ledger.given(each, `${letter}_${at}`, item[by], unit, { source })
  })
  const terms = fittings.items.map((_, index) => `n_${index + 1} × ${letter}_${index + 1}`)
  ledger.step(all, `${letter}_F`, terms.join(' + '), unit, { value: fittings[by] })
}
