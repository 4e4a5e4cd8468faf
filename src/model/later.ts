/** What the finished program takes and this version does not compute yet: refused by name, never ignored. */

/** Columns still to come. */
export const laterColumns: readonly string[] = [
  'floor_height_m',
  'access',
  'state',
  'contact_situation',
]

/** Choices still to come, by column. */
export const laterChoices: Readonly<Record<string, readonly string[]>> = {}
