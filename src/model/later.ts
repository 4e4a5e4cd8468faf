/** What the finished program takes and this version does not compute yet: refused by name, never ignored. */

/** Columns still to come. */
export const laterColumns: readonly string[] = `
  solar_w_m2 frost_air_c frost_wind_m_s frost_hours frost_start_c frost_fraction max_drop_k
  flow_kg_s code_table code_factor max_od_mm measured_surface_c bends tees flanges valves
  supports reducers ends strainers fittings bury_depth_m soil_w_mk floor_height_m access
  survey_air_c survey_surroundings_c survey_wind_m_s survey_medium_c survey_emissivity
  survey_tolerance_k state contact_situation
`
  .trim()
  .split(/\s+/)

/** Choices still to come, by column. */
export const laterChoices: Readonly<Record<string, readonly string[]>> = {
  shape: ['sphere', 'vessel'],
  orientation: ['inclined'],
  method: ['simplified'],
}
