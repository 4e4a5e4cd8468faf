/** The few functions of the psychrometric library that tests compare with; it brings no types of its own. */
declare module 'psychrolib' {
  interface Psychrometrics {
    /** For `SetUnitSystem`: kelvin apart, °C and Pa. */
    readonly SI: number
    SetUnitSystem(unitSystem: number): void
    GetSatVapPres(tempC: number): number
    GetTDewPointFromRelHum(airC: number, humidity: number): number
    GetVapPresFromRelHum(airC: number, humidity: number): number
    GetStandardAtmPressure(altitudeM: number): number
    GetDryAirDensity(tempC: number, pressurePa: number): number
  }
  const library: Psychrometrics
  export = library
}
