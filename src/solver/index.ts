/** The way into the solver. Pure: no dependency, no input or output, same input, same bits. */
export { conductivityAtWPerMK } from './conductivity.ts'
export { kelvin, STEFAN_BOLTZMANN_W_PER_M2_K4 } from './constants.ts'
export {
  nusseltCylinderInWind,
  nusseltPlateInWind,
  TURBULENT_REYNOLDS,
} from './convection/forced.ts'
export { insideFilmWPerM2K, nusseltInside } from './convection/inside.ts'
export {
  nusseltHorizontalCylinder,
  nusseltPlateDrivingFlow,
  nusseltPlateHinderedFlow,
  nusseltSlenderCylinder,
  nusseltVerticalCylinder,
  nusseltVerticalPlate,
  TURBULENT_RAYLEIGH,
} from './convection/natural.ts'
export {
  branchUsed,
  simplifiedFreePipe,
  simplifiedFreeWall,
  simplifiedWindOnPipe,
  simplifiedWindOnWall,
  type TwoBranchFormula,
} from './convection/simplified.ts'
export { nusseltSphere, nusseltSphereInWind } from './convection/sphere.ts'
export type { Correlation } from './correlation.ts'
export {
  filmOf,
  isCylinder,
  isDriving,
  isSimplified,
  radiates,
  sphereWind,
  type Weather,
} from './film.ts'
export { arrivalTempC, condensateKgPerS } from './flow.ts'
export {
  conductionFluxWPerM2,
  effectiveConductivityWPerMK,
  fluxOf,
  type SurfaceFlux,
} from './from-surface.ts'
export {
  coolingTimeS,
  FREEZING_C,
  freezingTimeS,
  ICE_KG_PER_M3,
  ICE_LATENT_J_PER_KG,
  ICE_W_PER_M_K,
  WATER_J_PER_KG_K,
  WATER_KG_PER_M3,
  wallCapacityJPerMK,
  waterCapacityJPerMK,
} from './frost.ts'
export { type FaceShape, wallOf } from './geometry.ts'
export { grown } from './grown.ts'
export { beyondCurveK, notesOf } from './notes.ts'
export {
  airAt,
  airDensityKgPerM3,
  airHeatCapacityJPerKgK,
  airViscosityPaS,
  standardPressurePa,
} from './properties/air.ts'
export { dewPointC, saturationPressurePa } from './properties/moist-air.ts'
export { radiationWPerM2K } from './radiation.ts'
export { bracketedRoot } from './root.ts'
export { clearSky, clearSkyC, radiantMixC } from './sky.ts'
export { solve, weatherOf } from './solve.ts'
export { sources } from './sources.ts'
