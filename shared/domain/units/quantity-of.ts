import type { Quantity } from './quantity.ts'
import type { UnitCode } from './unit-table.ts'

/**
 * A quantity from a number that the program holds, for handing to a calculator that takes what people enter.
 *
 * @param value any finite number; written with the shortest digits that mean exactly it
 */
export function quantityOf<U extends UnitCode>(value: number, unit: U): Quantity<U> {
  return { value: String(value), unit }
}
