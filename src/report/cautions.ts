/** What every result and every document says about itself: read with the numbers, never hidden behind them. */

export interface Caution {
  readonly code: string
  readonly text: string
  /** Who decides in doubt. */
  readonly deferTo: string
}

export const cautions: readonly Caution[] = [
  {
    code: 'estimate',
    text: 'These are calculated estimates for people who can judge them. Check them against local codes before anything is built on them.',
    deferTo: 'the licensed engineer and the authority in charge',
  },
  {
    code: 'burn-thresholds',
    text: 'Burn thresholds hold for a brief touch of healthy skin on a small area, not for pain, startling or a fall. Measure the surface once it is in service.',
    deferTo: 'the safety officer and the labour inspectorate',
  },
  {
    code: 'longer-contact',
    text: 'Where children, the public, or old or infirm people can reach a surface, or where nobody can step back, choose a longer contact time.',
    deferTo: 'the safety officer and the health authority',
  },
  {
    code: 'hot-spots',
    text: 'Valves, flanges, supports, open ends and damaged places are hotter than the run. Judge them one by one, and put covers back on.',
    deferTo: 'the plant owner',
  },
  {
    code: 'asbestos',
    text: 'Old lagging of unknown make may hold asbestos. Do not cut, strip, lift or sample it. Keep people away and have it surveyed first.',
    deferTo: 'a licensed asbestos surveyor and the asbestos authority',
  },
  {
    code: 'corrosion',
    text: 'Wet lagging lets the metal under it rust unseen. Keep the weather barrier sealed, and ask whether a guard would do where only touch matters.',
    deferTo: 'the corrosion or inspection engineer',
  },
  {
    code: 'service-temperature',
    text: "No layer and no jacket may get hotter or colder than its own sheet allows, start-up and faults included. The maker's figure counts, not the catalogue's.",
    deferTo: 'the maker of the material',
  },
  {
    code: 'permits',
    text: 'Work on live steam, with flames or behind isolation needs a permit. A leak of steam is invisible; never search for it by hand.',
    deferTo: 'the permit office of the site',
  },
  {
    code: 'fire',
    text: 'Check how jacket and lagging behave in fire, and keep surfaces well below the ignition temperature of the dust and vapour around them.',
    deferTo: 'the fire authority and the explosion-protection specialist',
  },
  {
    code: 'illustrative-prices',
    text: 'Prices and labour hours of the shipped catalogue are illustrations. Money means nothing until your own are in.',
    deferTo: 'your own price book',
  },
]
