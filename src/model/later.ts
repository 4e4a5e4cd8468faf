/** Columns that the finished program takes and this version does not compute yet: refused by name, never ignored. */
export const laterColumns: readonly string[] = [
  'floor_height_m',
  'access',
  'state',
  'contact_situation',
]
