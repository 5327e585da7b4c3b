import { unitOf } from './unit-of.ts'
import { unitTable, type Dimension, type UnitCode, type UnitOf } from './unit-table.ts'

/** The units of a dimension in the order of the table, for a choice in a field. */
export function unitsOf<D extends Dimension>(dimension: D): UnitOf<D>[] {
  const codes = Object.keys(unitTable) as UnitCode[]
  return codes.filter((code) => unitOf(code).dimension === dimension) as UnitOf<D>[]
}
