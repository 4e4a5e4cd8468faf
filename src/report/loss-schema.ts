/** The schema of what `loss --json` writes; `npm run schema -- loss` prints it as JSON Schema. */
import { z } from 'zod'
import type { LossTotal } from '#model/loss-total.ts'
import type { RunLoss } from '#model/run-loss.ts'
import type { Caution } from './cautions.ts'
import { caution, finite, type IsSame, orNull, text } from './schema-parts.ts'

const yearlyLoss = z
  .strictObject({
    heatLossWPerM: orNull(
      'Heat flow outwards per metre of run at the loss condition [W/m]; null for a flat surface, a sphere and a vessel',
    ),
    heatFluxWPerM2: finite('Heat flow outwards on the outer area at the loss condition [W/m²]'),
    heatLossW: orNull(
      'Heat flow outwards of the whole run with its fittings at the loss condition [W]; null without length or area',
    ),
    yearlyMeanLossW: orNull(
      'As `heatLossW`, mean of the months where those are given; what needs no making up counts as nothing [W]',
    ),
    heatKWh: orNull('Heat of a year, lost or gained [kWh]; null without length or area'),
    cost: orNull('Energy cost of a year [currency of the run]; null without a fuel or a length'),
    co2Kg: orNull('CO2 of a year [kg]; null where the fuel states none'),
  })
  .meta({ id: 'YearlyLoss', description: 'The loss of a run in one state: bare, or as built' })

const saved = z
  .strictObject({
    heatKWh: orNull('Heat saved in a year [kWh]'),
    cost: orNull('Energy cost saved in a year [currency of the run]'),
    co2Kg: orNull('CO2 saved in a year [kg]'),
  })
  .meta({ id: 'Saved', description: 'Bare less as built' })

const runLoss = z
  .strictObject({
    tag: text('Tag of the run'),
    built: z
      .enum(['bare', 'fixed', 'chosen', 'thickest'])
      .describe(
        'What as built is: the bare run, the fixed thickness, the chosen rung, or the thickest rung where none meets every limit',
      ),
    thicknessM: finite('Total thickness of insulation as built [m]'),
    nominalThicknessM: orNull('What an inch series calls the thickness [m]; null elsewhere'),
    hoursPerYear: finite('Hours in service; 8760 where not given [h/year]'),
    fuel: z.string().nullable().describe('Name of the fuel; null where none is known'),
    currency: z.string().nullable().describe('Currency of the costs; null without a fuel'),
    bare: yearlyLoss,
    asBuilt: yearlyLoss,
    saved,
    notes: z.array(
      z
        .strictObject({
          code: text('Name of the kind of note, stable over versions'),
          text: text('What the reader should know'),
        })
        .meta({ id: 'Note', description: 'An assumption made, a range left, a caution' }),
    ),
  })
  .meta({ id: 'RunLoss', description: 'What one run loses in a year, bare and as built' })

const costSum = z.strictObject({
  currency: text('Currency of the sums'),
  bare: finite('Energy cost of a year, bare [currency]'),
  asBuilt: finite('Energy cost of a year, as built [currency]'),
  saved: finite('Energy cost saved in a year [currency]'),
})

const lossSum = z
  .strictObject({
    runs: finite('Runs in the sum [count]'),
    bareHeatLossW: finite('Heat flow outwards, bare, at the loss condition [W]'),
    asBuiltHeatLossW: finite('Heat flow outwards, as built, at the loss condition [W]'),
    bareYearlyMeanLossW: finite('Heat flow outwards to be made up, bare, mean of the year [W]'),
    asBuiltYearlyMeanLossW: finite(
      'Heat flow outwards to be made up, as built, mean of the year [W]',
    ),
    bareHeatKWh: finite('Heat of a year, bare [kWh]'),
    asBuiltHeatKWh: finite('Heat of a year, as built [kWh]'),
    savedHeatKWh: finite('Heat saved in a year [kWh]'),
    costs: z.array(costSum).describe('One for each currency'),
    bareCo2Kg: finite('CO2 of a year, bare, of the runs whose fuel states it [kg]'),
    asBuiltCo2Kg: finite('CO2 of a year, as built, of the runs whose fuel states it [kg]'),
    savedCo2Kg: finite('CO2 saved in a year, of the runs whose fuel states it [kg]'),
  })
  .meta({ id: 'LossSum', description: 'Sums over runs' })

const lossTotal = z
  .strictObject({
    lost: lossSum.describe('Runs that have to be heated when bare'),
    gained: lossSum.describe(
      'Runs that have to be cooled when bare; their heat flows are negative',
    ),
    withoutLength: z
      .array(text('Tag of a run'))
      .describe('Runs without length or area: listed, and in neither sum'),
    withoutFuel: z
      .array(text('Tag of a run'))
      .describe('Runs whose heat is in a sum, and its cost is not'),
  })
  .meta({ id: 'LossTotal', description: 'Heat lost and heat gained do not make up for each other' })

export const listLossSchema = z
  .strictObject({
    runs: z.array(runLoss),
    total: lossTotal,
    cautions: z.array(caution),
  })
  .describe('What `lagwright loss --json` writes')

/** What `lagwright loss --json` writes. */
export interface ListLoss {
  readonly runs: readonly RunLoss[]
  readonly total: LossTotal
  readonly cautions: readonly Caution[]
}

/** The JSON Schema of `ListLoss`. */
export function lossJsonSchema(): Record<string, unknown> {
  return { ...z.toJSONSchema(listLossSchema), title: 'Lagwright: losses of runs' }
}

// The schema and the types say the same, both ways: the line fails to compile where they part.
const schemaIsType: IsSame<z.output<typeof listLossSchema>, ListLoss> = true
void schemaIsType
