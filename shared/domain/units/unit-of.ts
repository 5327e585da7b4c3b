import { unitTable, type Unit, type UnitCode } from './unit-table.ts'

/** The row of the table for a code, as the general type. */
export function unitOf(code: UnitCode): Unit {
  return unitTable[code]
}
