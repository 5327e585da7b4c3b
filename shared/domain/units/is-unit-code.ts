import { unitTable, type UnitCode } from './unit-table.ts'

/** Whether a text from outside is the code of a unit in the table; inherited names such as "constructor" are not. */
export function isUnitCode(text: unknown): text is UnitCode {
  return typeof text === 'string' && Object.hasOwn(unitTable, text)
}
