/** What keeps water fit to live in. Valves are not here: they join bodies of water and have their own ledger. */
export const lifeSupportKinds = [
  'filter',
  'biofilter',
  'foam-fractionator',
  'ozone',
  'uv',
  'carbon',
  'heater',
  'chiller',
  'pump',
  'aeration',
] as const
export type LifeSupportKind = (typeof lifeSupportKinds)[number]
