/** The eight sheets of the bridge, in their order; the place is the number and the key. */
export const sheetNames = [
  'today',
  'quarantine',
  'animals',
  'water',
  'orders',
  'pharmacy',
  'register',
  'bench',
] as const
export type SheetName = (typeof sheetNames)[number]
