/** The schema of what `size --json` writes; `npm run schema` prints it as JSON Schema. */
import { z } from 'zod'
import type { RunResult } from '#sizing/result.ts'
import type { Caution } from './cautions.ts'
import { caution, finite, type IsSame, orNull, text } from './schema-parts.ts'

const note = z
  .strictObject({
    code: text('Name of the kind of note, stable over versions'),
    text: text('What the reader should know'),
  })
  .meta({ id: 'Note', description: 'An assumption made, a range left, a caution' })

const limitName = z.enum(['touch', 'loss', 'damp', 'frost', 'arrival', 'code', 'space', 'service'])

const limitResult = z
  .strictObject({
    limit: limitName,
    pass: z.boolean().describe('Whether the limit is met'),
    value: finite('What was calculated, in `unit`'),
    rule: z
      .enum(['at most', 'below', 'at least'])
      .describe('How the value must stand to the bound'),
    bound: finite('What it was judged against, in `unit`'),
    unit: z
      .enum(['°C', 'K', 'W/m', 'W/m²', 'h', 'm', 'kg/s', 'm²K/W'])
      .describe('Unit of `value` and `bound`'),
    condition: z
      .enum(['loss', 'touch', 'damp', 'frost', 'survey', 'code'])
      .describe('The design condition of the place under which the limit was judged'),
    what: text('What was judged, in words'),
  })
  .meta({ id: 'LimitResult', description: 'One limit judged on one build-up' })

const rungMoney = z
  .strictObject({
    installed: finite('Installed cost [currency of the run, per `money.per`]'),
    energyPerYear: finite('Cost of the energy lost in a year [currency, per `money.per`]'),
    lifeCycle: finite(
      'Installed cost plus present value of the energy over the life [currency, per `money.per`]',
    ),
  })
  .meta({
    id: 'RungMoney',
    description: 'Money of one build-up, per metre of run or per square metre of a flat surface',
  })

const rating = z
  .strictObject({
    thicknessM: finite('Total thickness of insulation [m]; 0 bare'),
    nominalThicknessM: orNull('What an inch series calls the thickness [m]; null elsewhere'),
    piecesM: z.array(finite('Thickness of a piece [m]')).describe('Pieces, inside to outside'),
    outerDiameterM: orNull('Outer diameter of a pipe or round duct [m]; else null'),
    heatLossWPerM: orNull('Heat flow outwards per metre of run [W/m]; null for a flat surface'),
    heatFluxWPerM2: finite('Heat flow outwards on the outer area [W/m²]'),
    heatLossW: orNull(
      'Heat flow outwards of the whole run with its fittings [W]; null without length or area',
    ),
    fittingsLossW: orNull('What of it fittings, supports and ends lose [W]'),
    yearlyMeanLossW: orNull(
      'As `heatLossW`, mean of the months where those are given; months that need no making up count as nothing [W]',
    ),
    yearlyKWh: orNull('Heat of the whole run in a year [kWh]; null without hours or length'),
    surfaceTempC: finite(
      'Outer surface at the loss condition, mean of the faces; of an inclined pipe with the lower film [°C]',
    ),
    convectionWPerM2K: finite('Convective film coefficient of the outer surface [W/(m²·K)]'),
    radiationWPerM2K: finite(
      'Radiative film coefficient: radiated flux over surface minus surroundings [W/(m²·K)]',
    ),
    interfaceTempsC: z
      .array(finite('Temperature of an interface [°C]'))
      .describe('Inside to outside, one more than there are layers'),
    touchSurfaceC: finite(
      'Outer surface at the touch condition: the hottest day, no wind, new finish, worst face [°C]',
    ),
    timeToFreezeH: orNull(
      'Hours until stagnant water reaches 0 °C and freezes the stated fraction [h]; null where not asked',
    ),
    arrivalTempC: orNull('Medium at the end of the run [°C]; null where its flow is not known'),
    condensateKgPerS: orNull('Steam that condenses along the run [kg/s]; null elsewhere'),
    limits: z.array(limitResult),
    pass: z.boolean().describe('Whether every limit is met'),
    money: rungMoney.nullable(),
  })
  .meta({ id: 'Rating', description: 'One build-up rated at the loss condition' })

const runMoney = z
  .strictObject({
    currency: text('Currency of every amount of the run'),
    per: z
      .enum(['m', 'm2', 'piece'])
      .describe('Whether amounts are per metre of run, per square metre, or for the whole piece'),
    hoursPerYear: finite('Hours in service [h/year]'),
    fuel: text('Id of the fuel'),
    fuelPricePerKWh: finite('Price of the fuel [currency/kWh]'),
    efficiency: finite('Useful heat or cold per unit of fuel [-]'),
    discount: finite('Discount rate [1/year]'),
    growth: finite('Growth of the fuel price [1/year]'),
    lifeYears: finite('Life of the lagging [years]'),
    presentValueFactor: finite('Present value of one unit of yearly energy cost [years]'),
    bareEnergyPerYear: finite('Cost of the energy lost bare in a year [currency, per `per`]'),
    installedTotal: orNull('Installed cost of the run [currency]'),
    savingPerYearTotal: orNull(
      'Energy cost saved in a year against the bare run, without fittings whose lagging has no price [currency]',
    ),
    paybackYears: orNull('Installed cost over yearly saving [years]; null where nothing is saved'),
    co2KgPerYear: orNull('CO2 of the lagged run in a year [kg]'),
    co2SavedKgPerYear: orNull('CO2 saved in a year against the bare run [kg]'),
    cheapestThicknessM: orNull(
      'The cheapest rung, whether it passes or not [m]; null without prices',
    ),
    withinTwoPercentM: z
      .tuple([finite('Smallest [m]'), finite('Largest [m]')])
      .nullable()
      .describe('Passing thicknesses that cost at most 2 % more than the chosen one [m]'),
  })
  .meta({ id: 'RunMoney', description: 'Money of the run' })

const uncertain = z
  .strictObject({
    value: finite('The figure [unit of its name]'),
    plusMinus: finite(
      'How far it may be off: root of the sum of squares of what each reading may [same unit]',
    ),
  })
  .meta({ id: 'Uncertain', description: 'A figure and how far it may be off' })

const survey = z
  .strictObject({
    measuredSurfaceC: finite('Surface temperature as measured [°C]'),
    heatFluxWPerM2: uncertain.describe('Heat flow outwards on the outer area [W/m²]'),
    heatLossWPerM: uncertain.nullable().describe('Heat flow outwards per metre of run [W/m]'),
    heatLossW: uncertain.nullable().describe('Heat flow outwards of the run, without fittings [W]'),
    effectiveWPerMK: uncertain
      .nullable()
      .describe('Conductivity that the lagging as it stands must have [W/(m·K)]'),
    soundWPerMK: orNull(
      'Conductivity of the build-up as given, between the same temperatures [W/(m·K)]',
    ),
    expectedSurfaceC: orNull('Surface that the run as given would have that day [°C]'),
    notes: z.array(note),
  })
  .meta({ id: 'SurveyResult', description: 'What the measured surface temperature says' })

export const runResultSchema = z
  .strictObject({
    tag: text('Tag of the run'),
    bare: rating.describe('The run without lagging'),
    chosen: rating.nullable().describe('The chosen build-up; null where none meets every limit'),
    governing: z
      .enum([...limitName.options, 'money', 'smallest', 'fixed', 'bare', 'unmet'])
      .describe('What made the chosen build-up as thick as it is'),
    mattThicknessM: orNull(
      'Where damp governs under a bright jacket: the thickness a matt finish would need [m]; else null',
    ),
    unmet: z
      .array(
        z.strictObject({
          limit: limitName,
          neededM: orNull(
            'Whole thickness that would meet it, more than can be bought [m]; null where none up to 600 mm does',
          ),
          because: z.string().nullable().describe('Why none does; null where a thickness does'),
        }),
      )
      .describe('Where no rung passes: the limits that none meets'),
    reason: text('The choice in a sentence or two, with the numbers that decided'),
    limits: z
      .array(limitResult)
      .describe('The limits of the chosen build-up; of the thickest rung where none passes'),
    ladder: z.array(rating).describe('Every rung that can be bought, thinnest first'),
    money: runMoney.nullable(),
    survey: survey.nullable().describe('Null where no surface temperature was measured'),
    notes: z.array(note),
  })
  .meta({
    id: 'RunResult',
    description: 'The result of one run. SI units, temperatures in °C, heat flow positive outwards',
  })

export const sizedSchema = z
  .strictObject({ runs: z.array(runResultSchema), cautions: z.array(caution) })
  .describe('What `lagwright size --json` writes')

/** What `lagwright size --json` writes. */
export interface Sized {
  readonly runs: readonly RunResult[]
  readonly cautions: readonly Caution[]
}

/** The JSON Schema of `Sized`. */
export function sizedJsonSchema(): Record<string, unknown> {
  return { ...z.toJSONSchema(sizedSchema), title: 'Lagwright: sized runs' }
}

// The schema and the types say the same, both ways: the line fails to compile where they part.
const schemaIsType: IsSame<z.output<typeof sizedSchema>, Sized> = true
void schemaIsType
