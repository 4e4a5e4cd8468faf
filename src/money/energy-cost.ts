/** What a heat flow costs to make up. */
export interface EnergyTerms {
  readonly fuelPricePerKWh: number
  /** Useful heat over fuel, on the calorific basis of the price. */
  readonly efficiency: number
  /** Heat removed over electricity used; for runs colder than the air. */
  readonly cop: number
  readonly hoursPerYear: number
}

/** Heat over the year [kWh] of a heat flow [W]; always positive. */
export function yearlyKWh(heatW: number, hoursPerYear: number): number {
  return (Math.abs(heatW) * hoursPerYear) / 1000
}

/** Fuel over the year [kWh] for a heat flow [W], positive outwards: heat over efficiency, or cold over COP. */
export function yearlyFuelKWh(heatW: number, terms: EnergyTerms): number {
  const perHeat = heatW < 0 ? terms.cop : terms.efficiency
  return yearlyKWh(heatW, terms.hoursPerYear) / perHeat
}

/** Cost of that fuel, first year, at today's price. */
export function yearlyEnergyCost(heatW: number, terms: EnergyTerms): number {
  return yearlyFuelKWh(heatW, terms) * terms.fuelPricePerKWh
}
