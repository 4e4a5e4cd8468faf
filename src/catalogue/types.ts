/**
 * The catalogue as plain values, read once from SQLite and handed to whoever computes: the command line, the worker
 * and the window. SI units, temperatures in °C. Every row says where it comes from.
 */
import type { Conductivity } from '#solver/types.ts'

/** `found`: read in a text. `memory`: recalled, verify against your own copy. `estimate`: a judgement, illustrative. */
export type Confidence = 'found' | 'memory' | 'estimate'

export interface Provenance {
  readonly source: string
  readonly confidence: Confidence
}

export interface Material extends Provenance {
  readonly id: string
  readonly name: string
  readonly family: string
  readonly form: string
  /** Its default curve, with the lowest confidence of its points. */
  readonly conductivity: Conductivity & { readonly kind: 'curve' }
  readonly curveName: string
  readonly curveSource: string
  readonly curveConfidence: Confidence
  readonly densityKgPerM3: number
  readonly serviceMinC: number
  readonly serviceMaxC: number
  /** Water vapour diffusion resistance factor; null where unknown. */
  readonly vapourResistance: number | null
  /** Not for cylinders whose outside diameter is this or less [m]; null where it goes on anything. */
  readonly notOnDiametersUpToM: number | null
  readonly note: string
}

export type TouchClass =
  | 'smooth-metal'
  | 'coated-metal'
  | 'ceramic-glass-stone'
  | 'plastic'
  | 'wood'

export interface Finish extends Provenance {
  readonly id: string
  readonly name: string
  readonly category: string
  readonly emissivityNew: number
  readonly emissivityAged: number
  readonly touchClass: TouchClass
  /** For coated metal: kind and thickness [m]; null where unknown, which counts as bare metal. */
  readonly coating: string | null
  readonly coatingThicknessM: number | null
  /** Highest surface temperature the finish stands [°C]; null where none is stated. */
  readonly surfaceMaxC: number | null
  readonly outdoor: boolean
  /** Share of the sun's heat the surface takes up. */
  readonly solarAbsorptanceNew: number
  readonly solarAbsorptanceAged: number
  /** Whether it keeps vapour out by itself; null where nothing is stated, as for bare pipes. */
  readonly vapourTight: 'yes' | 'if sealed' | 'no' | null
  /** The same with its condition, e.g. `only if all laps sealed`. */
  readonly vapourNote: string
  readonly note: string
}

/** A bare pipe or duct wall as a surface. */
export interface WallMaterial extends Provenance {
  readonly id: string
  readonly name: string
  readonly conductivityWPerMK: number
  readonly densityKgPerM3: number
  readonly specificHeatJPerKgK: number
  /** Emissivity of the wall as found in service. */
  readonly emissivityBare: number
  readonly touchClass: TouchClass
}

export interface PipeSize extends Provenance {
  readonly system: string
  readonly standard: string
  /** Wall material of the system, an id of `wallMaterials`. */
  readonly wallMaterial: string
  readonly label: string
  readonly dn: number | null
  readonly npsIn: number | null
  readonly series: string
  readonly outerDiameterM: number
  readonly wallM: number
}

export interface DuctSize extends Provenance {
  readonly standard: string
  readonly label: string
  readonly diameterM: number | null
  readonly widthM: number | null
  readonly heightM: number | null
}

/** One thickness that can be bought. */
export interface ThicknessStep extends Provenance {
  readonly materialId: string
  readonly form: string
  readonly series: 'metric' | 'inch'
  readonly thicknessM: number
  /** Largest piece sold [m]: above it two or more layers. */
  readonly maxSingleLayerM: number
  /** True where the form is never built up in layers. */
  readonly singleLayerOnly: boolean
}

/** True thickness of an inch-series section on one pipe size. */
export interface InchSection extends Provenance {
  readonly system: string
  readonly pipeOuterDiameterM: number
  readonly nominalThicknessM: number
  readonly actualThicknessM: number
}

/** One state of a medium; for saturated steam the pressure belongs to the temperature. */
export interface SteamState extends Provenance {
  readonly pressureAbsolutePa: number
  readonly temperatureC: number
  readonly latentHeatJPerKg: number
  /** Of the dry saturated vapour. */
  readonly densityVapourKgPerM3: number
  readonly specificHeatVapourJPerKgK: number
}

export interface MediumState extends Provenance {
  readonly mediumId: string
  readonly name: string
  readonly phase: string
  readonly massFraction: number | null
  readonly temperatureC: number
  readonly densityKgPerM3: number | null
  readonly specificHeatJPerKgK: number | null
}

export interface Fuel extends Provenance {
  readonly id: string
  readonly name: string
  /** Illustrative price of one kWh of fuel on `basis`; null where none is held. */
  readonly pricePerKWh: number | null
  /** Typical efficiency on the same basis, or 1 for delivered heat. */
  readonly efficiency: number
  readonly co2KgPerKWh: number | null
  /** Calorific basis of price, efficiency and CO2 factor: they belong together. */
  readonly basis: 'HHV' | 'LHV' | 'electricity' | 'delivered heat'
  readonly note: string
}

/** One cell of the burn-threshold table: the lower curve of ISO 13732-1 for a surface and a contact time. */
export interface BurnThreshold extends Provenance {
  /** A touch class, or a coated metal with its coating, e.g. `lacquer-50`. */
  readonly surface: string
  readonly contactS: number
  readonly lowerC: number
  readonly upperC: number | null
  /** How sure the cell is: H may pass a surface, M may, L never does. */
  readonly grade: 'H' | 'M' | 'L'
}

/** What a code or a law asks for, as people select it by its id. */
export interface CodeTable extends Provenance {
  readonly id: string
  readonly name: string
  readonly edition: string
  readonly service: string
  /** The measure of the pipe that the size bands count. */
  readonly sizeBasis: 'nominal' | 'outer-diameter' | 'inner-diameter' | 'any'
  /** Which band a value on the border of two belongs to; the outermost ends belong to the table. */
  readonly sizeBorder: BandBorder
  readonly fluidBorder: BandBorder
  /**
   * How a thickness carries over to another conductivity: by T = r[(1 + t/r)^(K/k) − 1] outside the range of the row;
   * by the thickness that loses the same heat; by interpolation between the rows of the band; not at all.
   */
  readonly conversion: 'conductivity-range' | 'equal-loss' | 'interpolate' | 'none'
  readonly note: string
  /** Stands wherever a figure of the table does. */
  readonly warning: string
  readonly rows: readonly CodeRow[]
  /** Factors the code puts on its thicknesses, for `code_factor`. */
  readonly factors: readonly CodeFactor[]
}

export type BandBorder = 'band-above' | 'band-below'

/** One cell of a code table: null ends are open, null conductivities have no part in it. */
export interface CodeRow extends Provenance {
  readonly sizeMinM: number | null
  readonly sizeMaxM: number | null
  readonly fluidMinC: number | null
  readonly fluidMaxC: number | null
  readonly conductivityMinWPerMK: number | null
  readonly conductivityMaxWPerMK: number | null
  /** Mean temperature at which the conductivity is judged. */
  readonly ratingMeanC: number | null
  readonly quantity: 'min-thickness' | 'max-loss' | 'min-resistance'
  /** Thickness [m], amount of loss or gain [W/m], resistance without films [m²K/W]; null where the rule stands for it. */
  readonly value: number | null
  /** `inner-diameter`: the thickness is the inner diameter of the pipe. */
  readonly rule: 'inner-diameter' | null
  /** What a loss is stated for. */
  readonly conditions: CodeConditions | null
  readonly note: string
}

export interface CodeConditions {
  readonly mediumC: number
  readonly airC: number
  readonly windMPerS: number
  /** Null: that of the finish. */
  readonly emissivity: number | null
}

export interface CodeFactor extends Provenance {
  readonly factor: number
  readonly appliesTo: string
}

export type FittingItem = 'flange-pair' | 'valve'

/** Convention "equal area of bare surface": the fitting loses heat as the same area of bare pipe does. */
export interface FittingArea extends Provenance {
  readonly item: FittingItem
  readonly dn: number
  readonly pipeOuterDiameterM: number
  readonly pressureClass: number
  readonly areaM2: number
  readonly note: string
}

/** Convention "metres of insulated pipe": the fitting loses as much as this length of the lagged pipe beside it. */
export interface FittingLength extends Provenance {
  readonly item: FittingItem
  readonly dn: number
  readonly pipeOuterDiameterM: number
  readonly mediumC: number
  readonly lagged: boolean
  readonly place: 'indoors' | 'outdoors' | 'any'
  readonly lengthM: number
  /** Range of the guideline [m]. */
  readonly lowM: number
  readonly highM: number
  readonly note: string
}

/** What hangers and supports within the lagging add to the loss of the straight pipe. */
export interface SupportAllowance extends Provenance {
  readonly place: 'indoors' | 'outdoors'
  readonly lossFraction: number
  readonly note: string
}

/** The simple price model: installed price of one material, illustrative until the user owns a price book. */
export interface PriceModel extends Provenance {
  readonly materialId: string
  readonly perM3: number
  readonly perM2: number
  readonly perM: number
  /** Labour hours per metre: fixed part, and part per m² of outer area. */
  readonly labourHoursPerM: number
  readonly labourHoursPerM2: number
  readonly wasteFraction: number
}

export interface FinishPrice extends Provenance {
  readonly finishId: string
  readonly perM2: number
  readonly labourHoursPerM: number
  readonly labourHoursPerM2: number
  readonly wasteFraction: number
}

export interface LabourTerms extends Provenance {
  readonly ratePerHour: number
  /** Factor on labour for 1, 2, 3 layers. */
  readonly layerFactors: readonly number[]
  readonly currency: string
}

export interface Catalogue {
  readonly materials: readonly Material[]
  readonly finishes: readonly Finish[]
  readonly wallMaterials: readonly WallMaterial[]
  readonly pipeSizes: readonly PipeSize[]
  readonly ductSizes: readonly DuctSize[]
  readonly steps: readonly ThicknessStep[]
  readonly inchSections: readonly InchSection[]
  readonly steam: readonly SteamState[]
  readonly media: readonly MediumState[]
  readonly fuels: readonly Fuel[]
  readonly burnThresholds: readonly BurnThreshold[]
  readonly codeTables: readonly CodeTable[]
  readonly fittingAreas: readonly FittingArea[]
  readonly fittingLengths: readonly FittingLength[]
  readonly supportAllowances: readonly SupportAllowance[]
  readonly priceModels: readonly PriceModel[]
  readonly finishPrices: readonly FinishPrice[]
  readonly labour: LabourTerms
}
