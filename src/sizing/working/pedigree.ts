/** What a line says of the formula it uses: its name, its source, and where it holds. */
import { type Correlation, sources } from '#solver/index.ts'
import { printNumber } from './digits.ts'

const symbols: Readonly<Record<string, string>> = {
  rayleigh: 'Ra',
  reynolds: 'Re',
  prandtl: 'Pr',
  differenceK: 'ΔT in K',
  windMPerS: 'v in m/s',
  slenderness: 'H/D',
  airC: 'θ_a in °C',
}

/** Source and range of a correlation at these inputs, for `Ledger.step`. */
export function pedigreeOf<Inputs extends object>(
  { pedigree }: Correlation<Inputs>,
  inputs: Inputs,
): { readonly source: string; readonly validity: string | null } {
  const ranges: string[] = []
  for (const key of Object.keys(pedigree.valid) as (keyof Inputs & string)[]) {
    const range = pedigree.valid[key]
    const value = inputs[key]
    if (!range || typeof value !== 'number') continue
    const [from, to] = range
    const isWithin = value >= from && value <= to
    ranges.push(
      `${symbols[key] ?? key} ${printNumber(from, 3)} to ${printNumber(to, 3)}${isWithin ? '' : ` (here ${printNumber(value, 3)}: used beyond its range)`}`,
    )
  }
  return {
    source: `${pedigree.name}: ${sources[pedigree.source]}`,
    validity: ranges.length === 0 ? null : `holds for ${ranges.join(', ')}`,
  }
}
