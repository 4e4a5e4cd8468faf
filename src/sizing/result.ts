/**
 * The answer for one run. The same object is what `--json` writes and what the window shows; its JSON Schema is
 * generated from `report/run-result-schema.ts`. SI units, temperatures in °C; heat flow is positive outwards.
 */

export type LimitName =
  | 'touch'
  | 'loss'
  | 'damp'
  | 'frost'
  | 'arrival'
  | 'code'
  | 'space'
  | 'service'
/** A limit as people read it. */
export const limitWords: Readonly<Record<LimitName, string>> = {
  touch: 'Touch',
  loss: 'Loss',
  damp: 'Damp',
  frost: 'Frost',
  arrival: 'Arrival',
  code: 'Code',
  space: 'Space',
  service: 'Service',
}

export type Governing = LimitName | 'money' | 'smallest' | 'fixed' | 'bare' | 'unmet'
/** `code`: the air and wind that a loss table of a code brings with it. */
export type ConditionName = 'loss' | 'touch' | 'damp' | 'frost' | 'survey' | 'code'

/** Something a reader should know: an assumption made, a range left, a caution. */
export interface Note {
  readonly code: string
  readonly text: string
}

/** SI throughout; lengths and mass flows are shown in mm and kg/h. */
export type LimitUnit = '°C' | 'K' | 'W/m' | 'W/m²' | 'h' | 'm' | 'kg/s' | 'm²K/W'

/** One limit judged on one rung. */
export interface LimitResult {
  readonly limit: LimitName
  readonly pass: boolean
  readonly value: number
  /** How the value must stand to the bound. */
  readonly rule: 'at most' | 'below' | 'at least'
  readonly bound: number
  readonly unit: LimitUnit
  readonly condition: ConditionName
  /** What was judged, in words: "surface, top" or "jacket", "stone wool, inside". */
  readonly what: string
}

/** Money of one rung, per metre of run (per m² of a flat surface, for the whole of a sphere or vessel), in the currency of the run. */
export interface RungMoney {
  readonly installed: number
  readonly energyPerYear: number
  /** Installed cost plus the present value of the energy over the life. */
  readonly lifeCycle: number
}

/** One build-up rated: the bare run, or one rung of the ladder. At the loss condition. */
export interface Rating {
  /** Total thickness of insulation [m]; 0 bare. */
  readonly thicknessM: number
  /** What an inch series calls the thickness [m]; null elsewhere. */
  readonly nominalThicknessM: number | null
  /** Thickness of each piece, inside to outside [m]. */
  readonly piecesM: readonly number[]
  /** Of a pipe, round duct, sphere or vessel [m]; else null. */
  readonly outerDiameterM: number | null
  /** Null for a flat surface, a sphere and a vessel. */
  readonly heatLossWPerM: number | null
  readonly heatFluxWPerM2: number
  /** Whole run with its fittings and supports [W]; null where neither length nor area is known. */
  readonly heatLossW: number | null
  /** What of it fittings, supports and ends lose [W]. */
  readonly fittingsLossW: number | null
  /** As `heatLossW`, mean of the twelve months where those are given. */
  readonly yearlyMeanLossW: number | null
  readonly yearlyKWh: number | null
  readonly surfaceTempC: number
  readonly convectionWPerM2K: number
  readonly radiationWPerM2K: number
  readonly interfaceTempsC: readonly number[]
  /** Surface at the touch condition [°C]: the hottest day, no wind, new finish, worst face. */
  readonly touchSurfaceC: number
  /** Hours until stagnant water at the frost condition reaches 0 °C and freezes the stated fraction; null where not asked. */
  readonly timeToFreezeH: number | null
  /** Of the medium at the end of the run [°C]; null where the flow is not known. */
  readonly arrivalTempC: number | null
  /** Steam that condenses along the run [kg/s]; null elsewhere. */
  readonly condensateKgPerS: number | null
  readonly limits: readonly LimitResult[]
  readonly pass: boolean
  readonly money: RungMoney | null
}

export interface RunMoney {
  readonly currency: string
  /** Per metre of run, per m² of a flat surface, or for the whole of a sphere or vessel. */
  readonly per: 'm' | 'm2' | 'piece'
  readonly hoursPerYear: number
  readonly fuel: string
  readonly fuelPricePerKWh: number
  readonly efficiency: number
  readonly discount: number
  readonly growth: number
  readonly lifeYears: number
  /** Present-value factor of the yearly energy. */
  readonly presentValueFactor: number
  /** Energy cost per year of the bare run, per metre or m². */
  readonly bareEnergyPerYear: number
  /** Of the whole run; null without length or area, or without a chosen rung. */
  readonly installedTotal: number | null
  readonly savingPerYearTotal: number | null
  /** Years until the installed cost is saved; null where nothing is saved. */
  readonly paybackYears: number | null
  readonly co2KgPerYear: number | null
  readonly co2SavedKgPerYear: number | null
  /** Thickness of the cheapest rung whether or not it passes [m]; null where nothing has a price. */
  readonly cheapestThicknessM: number | null
  /** Smallest and largest passing thickness that cost at most 2 % more than the chosen one [m]. */
  readonly withinTwoPercentM: readonly [number, number] | null
}

/** Exact end of the thicknesses that pass a limit, for the ladder picture; only computed on request. */
export interface LimitEnd {
  readonly limit: LimitName
  /** Passes from this thickness on [m]; null where no thickness up to the search end passes. */
  readonly fromM: number | null
  /** And up to this one [m]; null where there is no upper end. */
  readonly upToM: number | null
}

/** A figure and how far it may be off, from thermometer, emissivity and air together (root of the sum of squares). */
export interface Uncertain {
  readonly value: number
  readonly plusMinus: number
}

/** What the measured surface temperature says. Null parts cannot be told from what is known. */
export interface SurveyResult {
  readonly measuredSurfaceC: number
  readonly heatFluxWPerM2: Uncertain
  /** Null for a flat surface, a sphere and a vessel. */
  readonly heatLossWPerM: Uncertain | null
  /** Whole run, without fittings [W]. */
  readonly heatLossW: Uncertain | null
  /** Of the lagging as it stands, if its thickness is known. */
  readonly effectiveWPerMK: Uncertain | null
  /** What the build-up as given would have: for comparison at the same mean temperature. */
  readonly soundWPerMK: number | null
  /** Surface that the run as given would have at the survey condition [°C]; null where its thickness is not given. */
  readonly expectedSurfaceC: number | null
  readonly notes: readonly Note[]
}

/** A limit that no rung meets. */
export interface UnmetLimit {
  readonly limit: LimitName
  /** Whole thickness that would meet it, thicker than can be bought [m]; null where none up to 600 mm does. */
  readonly neededM: number | null
  /** Why none does, in words that end a sentence; null where a thickness does. */
  readonly because: string | null
}

export interface RunResult {
  readonly tag: string
  readonly bare: Rating
  readonly chosen: Rating | null
  readonly governing: Governing
  /** Where damp governs or cannot be met under a bright jacket: the thickness a matt finish would need [m]; else null. */
  readonly mattThicknessM: number | null
  /** Where no rung passes: the limits that none meets; empty where limits only exclude each other. */
  readonly unmet: readonly UnmetLimit[]
  /** One plain sentence or two, with the numbers that decided. */
  readonly reason: string
  /** The limits of the chosen rung; of the thickest rung where none passes. */
  readonly limits: readonly LimitResult[]
  readonly ladder: readonly Rating[]
  readonly money: RunMoney | null
  /** Null where no surface temperature was measured. */
  readonly survey: SurveyResult | null
  readonly notes: readonly Note[]
}

/** One thing wrong with the input of a run: what was found, where, what is allowed, what to do. */
export interface Issue {
  /** CSV column, e.g. `air_c`. */
  readonly column: string
  readonly found: string
  readonly allowed: string
}

/** Either the run was sized, or everything that is wrong with its input. */
export type RunOutcome =
  | { readonly ok: true; readonly result: RunResult }
  | { readonly ok: false; readonly issues: readonly Issue[] }

export type SensitivityInput =
  | 'medium'
  | 'air'
  | 'wind'
  | 'emissivity'
  | 'conductivity'
  | 'thickness'
  | 'fuel price'
  | 'hours'
  | 'humidity'

/** One input at one end of its range, against the run as given: the same build-up, except `chosenThicknessM`. */
export interface SensitivityEnd {
  /** How far the input was moved, in the unit of the sensitivity. */
  readonly change: number
  /** Of the loss of a metre, m² or piece, outwards [W]. */
  readonly heatFlowChangeWPerUnit: number
  /** Of the loss of the whole run [W]; null where its length is not known. */
  readonly heatLossChangeW: number | null
  /** Of the cost of the energy in a year, per metre, m² or piece; null where it is not weighed. */
  readonly energyPerYearChange: number | null
  /** Of the surface at the loss condition, and at the touch condition [K]. */
  readonly surfaceChangeK: number
  readonly touchSurfaceChangeK: number
  /** What would be chosen here [m]; null where nothing passes. For the thickness as laid: as chosen. */
  readonly chosenThicknessM: number | null
  /** Why; null for the thickness as laid. */
  readonly governing: Governing | null
  /** Whether the build-up as chosen still passes every limit. */
  readonly passes: boolean
}

/** What one input does to the answer when it alone is moved. */
export interface Sensitivity {
  readonly input: SensitivityInput
  /** `share`: of its own value; `fraction`: of an emissivity or a relative humidity, added. */
  readonly unit: 'K' | 'm/s' | 'fraction' | 'share'
  /** The lower end first; one only where the other lies outside of what the input may be. */
  readonly ends: readonly SensitivityEnd[]
  /** True where another rung would be chosen at one of the ends. */
  readonly movesRung: boolean
  /** Largest change of the yearly energy cost, or without cost of the loss, as a share of it. */
  readonly influence: number
}

/** What the run sheet asks for the selected run only. */
export interface RunDetail {
  readonly ends: readonly LimitEnd[]
  /** Where one thickness is fixed by hand: the rungs it could be instead. Empty elsewhere. */
  readonly otherRungs: readonly Rating[]
  /** What its inputs do to the answer, those that move it most first. */
  readonly sensitivity: readonly Sensitivity[]
}
