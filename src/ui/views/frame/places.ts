/** The places of the window, in the order of the rail. */
export const places = [
  { name: 'schedule', label: 'Schedule', keys: 'Alt 1' },
  { name: 'catalogue', label: 'Catalogue', keys: 'Alt 2' },
  { name: 'job', label: 'Job', keys: 'Alt 3' },
] as const

export type PlaceName = (typeof places)[number]['name']
