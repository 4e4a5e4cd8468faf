/** The way into the solver. Pure: no dependency, no input or output, same input, same bits. */
export { conductivityAtWPerMK, layerDifferenceK } from './conductivity.ts'
export { kelvin, STEFAN_BOLTZMANN_W_PER_M2_K4 } from './constants.ts'
export { nusseltCylinderInWind, nusseltPlateInWind } from './convection/forced.ts'
export { insideFilmWPerM2K } from './convection/inside.ts'
export {
  nusseltHorizontalCylinder,
  nusseltPlateDrivingFlow,
  nusseltPlateHinderedFlow,
  nusseltSlenderCylinder,
  nusseltVerticalCylinder,
  nusseltVerticalPlate,
} from './convection/natural.ts'
export { arrivalTempC, condensateKgPerS } from './flow.ts'
export {
  coolingTimeS,
  freezingTimeS,
  wallCapacityJPerMK,
  waterCapacityJPerMK,
} from './frost.ts'
export { grown, wallOf } from './geometry.ts'
export { beyondCurveK, notesOf } from './notes.ts'
export { airAt, airDensityKgPerM3, standardPressurePa } from './properties/air.ts'
export { dewPointC, saturationPressurePa } from './properties/moist-air.ts'
export { radiationWPerM2K } from './radiation.ts'
export { bracketedRoot } from './root.ts'
export { clearSkyC, radiantMixC } from './sky.ts'
export { acrossLayersK, solve } from './solve.ts'
export { sources } from './sources.ts'
