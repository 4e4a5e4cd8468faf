/** What sizing takes: one run with everything looked up and checked. SI units, temperatures in °C. */
import type { FinishPrice, LabourTerms, PriceModel } from '#catalogue/types.ts'
import type { EnergyTerms } from '#money/energy-cost.ts'
import type { Conductivity, FilmChoice, Shape, Surroundings } from '#solver/types.ts'
import type { Note } from './result.ts'

/** The worst the run meets for one question. */
export interface Condition {
  readonly around: Surroundings
  readonly mediumC: number
  /** Of the jacket: aged for loss and frost, new for touch and damp, as found for the survey. */
  readonly emissivity: number
  /** Of the bare surface. */
  readonly bareEmissivity: number
  /** Sun on each m² of the outer surface [W/m²], and what jacket and bare surface take up of it. */
  readonly sunWPerM2: number
  readonly solarAbsorptance: number
  readonly bareSolarAbsorptance: number
  readonly film: FilmChoice
  /** Share of clear sky in what the surface sees, and what else it sees; null where there is none. `around` holds the mix. */
  readonly sky: { readonly view: number; readonly groundC: number } | null
  /** For an inclined pipe: the higher film where a loss is asked, the lower where a temperature is. */
  readonly inclinedFilm: 'lower' | 'higher'
}

export interface LayerMaterial {
  readonly name: string
  readonly conductivity: Conductivity
  /** Null where no range is stated, as for a conductivity given by hand. */
  readonly serviceMinC: number | null
  readonly serviceMaxC: number | null
  /** Water vapour resistance factor; null where unknown. */
  readonly vapourResistance: number | null
  readonly price: PriceModel | null
}

/** One material of a build-up, inside to outside; its thickness is fixed, or null for the one that is sized. */
export interface BuildUpLayer {
  readonly material: LayerMaterial
  readonly thicknessM: number | null
  /** Thickness of each piece where it is fixed [m]. */
  readonly piecesM: readonly number[]
}

export interface FinishChoice {
  readonly name: string
  readonly surfaceMaxC: number | null
  /** Whether it keeps vapour out: a tight sheet, one whose laps must be sealed, or none. */
  readonly vapourTight: 'yes' | 'if sealed' | 'no'
  readonly price: FinishPrice | null
}

/** One thickness of the sized layer that can be bought. */
export interface Step {
  /** True thickness [m]. */
  readonly thicknessM: number
  readonly nominalThicknessM: number | null
  /** Pieces it is made of, inside to outside [m]. */
  readonly piecesM: readonly number[]
}

/** A surface passes only below it. */
export interface BurnLimit {
  readonly thresholdC: number
  /** The touched surface and the contact time in words: "smooth metal", "1 min". */
  readonly surface: string
  readonly contact: string
  /** How it was read off its row of the burn curve; null where it stands by itself. */
  readonly read: BurnReading | null
}

/** One cell of the row, or the two around the contact time that was looked up [s]. */
export interface BurnReading {
  readonly contactS: number
  readonly cells: readonly { readonly contactS: number; readonly thresholdC: number }[]
}

export interface Limits {
  /** Stated surface limit [°C], passes at or below. */
  readonly maxSurfaceC: number | null
  /** Burn threshold of the jacket; null where touch is not judged by the burn curve. */
  readonly burn: BurnLimit | null
  /** Burn threshold of the bare surface. */
  readonly bareBurn: BurnLimit | null
  readonly maxLossWPerM: number | null
  readonly maxLossWPerM2: number | null
  /** Dew point of the damp air and the margin; null where damp is not judged. */
  readonly damp: { readonly dewPointC: number; readonly marginK: number } | null
  /** Null where the run holds no water that could freeze, or is not asked about. */
  readonly frost: FrostLimit | null
  readonly arrival: ArrivalLimit | null
  readonly code: CodeLimit | null
  /** Largest overall diameter, or larger outer side of a duct [m]. */
  readonly maxOuterDiameterM: number | null
}

/** Stagnant water in a pipe, judged at the frost condition, whose medium is the water at the start. */
export interface FrostLimit {
  readonly hours: number
  /** Ice the water may hold at the end, 0 to 1; 0 where it may only just reach 0 °C. */
  readonly iceFraction: number
  readonly boreM: number
  /** Heat capacity of wall and water for each metre [J/(m·K)]. */
  readonly wallJPerMK: number
  readonly waterJPerMK: number
  /** What that of the wall comes from; its outer diameter is that of the run. */
  readonly wall: { readonly densityKgPerM3: number; readonly heatCapacityJPerKgK: number }
}

/** What flows along the run at the loss condition, and with how much less (or more) than it set out it may arrive. */
export type ArrivalLimit =
  | {
      readonly kind: 'drop'
      /** Null where the arrival is told, not limited. */
      readonly maxDropK: number | null
      readonly flowKgPerS: number
      readonly heatCapacityJPerKgK: number
      /** What it was read off, straight between two; empty where it was given. */
      readonly cells: readonly TableCell[]
    }
  /** Saturated steam condenses at its temperature: as long as some is left it arrives as it set out. */
  | {
      readonly kind: 'condensate'
      readonly maxDropK: number | null
      readonly flowKgPerS: number
      readonly latentHeatJPerKg: number
      readonly cells: readonly TableCell[]
    }

/** What the rows of a code table ask of this run: each is judged. */
export interface CodeLimit {
  /** Name and edition, as a reader looks them up. */
  readonly table: string
  readonly asks: readonly CodeAsk[]
}

export type CodeAsk = CodeThickness | CodeResistance | CodeLoss

/** A thickness on this pipe. */
export interface CodeThickness {
  readonly kind: 'thickness'
  /** Rising in conductivity; one where the table asks the same of every material it names. */
  readonly rows: readonly CodeThicknessRow[]
  /** How a thickness carries over to a conductivity that no row names. */
  readonly conversion: 'conductivity-range' | 'equal-loss' | 'interpolate' | 'none'
  /** Outside radius of the pipe [m]. */
  readonly radiusM: number
  /** Mean temperature at which the layers are compared with the table [°C]. */
  readonly ratingMeanC: number
}

export interface CodeThicknessRow {
  readonly thicknessM: number
  /** Conductivities that take the thickness as it stands, from and to; null where any does. */
  readonly rangeWPerMK: readonly [number, number] | null
}

/** Thickness over conductivity, films left out. */
export interface CodeResistance {
  readonly kind: 'resistance'
  readonly resistanceM2KPerW: number
  readonly ratingMeanC: number
}

/** A loss or gain, at the medium, air and wind that the table states it for. */
export interface CodeLoss {
  readonly kind: 'loss'
  readonly maxLossWPerM: number
  readonly condition: Condition
}

/** What the fittings of a run add to its loss; all by one convention, which is named. */
export interface Fittings {
  /** Surface of the bare fittings [m²]: it loses the flux of the bare run. */
  readonly bareAreaM2: number
  /** Length of lagged run that loses as much as the lagged fittings [m]. */
  readonly laggedLengthM: number
  /** True where the fittings stay bare on a lagged run. */
  readonly areBare: boolean
  /** Share that supports add to the loss of the lagged run. */
  readonly supportShare: number
  /** Ends of the run that are closed off like its surface: discs. */
  readonly ends: number
  /** What the areas and lengths are the sum of. */
  readonly items: readonly FittingCount[]
  /** Where the figures come from, in words. */
  readonly convention: string
}

/** So many of one kind, each with so much bare surface, or losing as much as so much lagged run. */
export interface FittingCount {
  /** In the plural: "valves". */
  readonly name: string
  readonly count: number
  readonly bareAreaM2: number
  /** 0 where the fittings stay bare. */
  readonly laggedLengthM: number
}

/** Air that flows inside of a duct, whose film was worked out by its velocity. */
export interface InsideAir {
  readonly velocityMPerS: number
  /** What the velocity follows from; null where it was given itself. */
  readonly flowKgPerS: number | null
  readonly airC: number
}

/** What was measured on the day, besides the survey condition. */
export interface SurveyReading {
  readonly surfaceTempC: number
  /** How far each may be off: half width of what is believed. */
  readonly thermometerK: number
  readonly airK: number
  readonly emissivity: number
}

export interface MoneyTerms {
  readonly energy: EnergyTerms
  readonly fuelName: string
  readonly co2KgPerKWh: number | null
  readonly currency: string
  readonly discount: number
  readonly growth: number
  readonly lifeYears: number
  readonly labour: LabourTerms
}

/** A state of a table of the catalogue: what it holds at a temperature. */
export interface TableCell {
  readonly tempC: number
  readonly value: number
}

/** Saturated steam that was given by its pressure: the state of the table that has it, or the two around it. */
export interface SteamReading {
  readonly gaugePressurePa: number
  readonly cells: readonly { readonly pressureAbsolutePa: number; readonly temperatureC: number }[]
}

export interface Problem {
  readonly tag: string
  readonly shape: Shape
  /** Null where the medium was given by its temperature. */
  readonly steam: SteamReading | null
  readonly insideFilmWPerM2K: number | null
  /** What the film inside was worked out from; null where it was given, usual, or none. */
  readonly insideAir: InsideAir | null
  /** Length of a pipe or duct [m], area of a flat surface [m²], or 1 for a sphere or vessel; null where not given. */
  readonly extent: number | null
  readonly layers: readonly BuildUpLayer[]
  readonly finish: FinishChoice | null
  /** Rungs in order for the sized layer; empty where every thickness is fixed. */
  readonly steps: readonly Step[]
  readonly conditions: {
    readonly loss: Condition
    readonly touch: Condition
    readonly damp: Condition
    /** Coldest day; null where frost is not asked about. */
    readonly frost: Condition | null
    /** The day of the survey; null where nothing was measured. */
    readonly survey: Condition | null
    /** The loss condition in each month, January first; empty where the yearly mean stands for all. */
    readonly months: readonly Condition[]
  }
  readonly limits: Limits
  readonly fittings: Fittings
  readonly survey: SurveyReading | null
  /** Null where the cost is not weighed. */
  readonly money: MoneyTerms | null
  /** Yearly running hours; null where not given. */
  readonly hoursPerYear: number | null
  /** Assumptions made while the run was put together. */
  readonly notes: readonly Note[]
}
