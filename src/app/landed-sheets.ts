import type { SheetName } from './sheet-names.ts'

/**
 * Sheets whose feature is in this version. Add a name here together with its routes in router.tsx; until then the bridge
 * leads to a page that says the sheet is not there. Nothing pretends.
 */
export const landed: ReadonlySet<SheetName> = new Set<SheetName>([
  'today',
  'quarantine',
  'water',
  'animals',
  'orders',
  'pharmacy',
  'register',
  'bench',
])
