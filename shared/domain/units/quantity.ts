import type { UnitCode } from './unit-table.ts'

/**
 * A quantity as a person entered it: the digits they typed (with a decimal point, trailing zeros kept) and their unit.
 * This is what goes over the wire and into forms; 0.10 stays 0.10.
 */
export interface Quantity<U extends UnitCode = UnitCode> {
  value: string
  unit: U
}
