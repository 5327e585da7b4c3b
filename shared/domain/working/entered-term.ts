import type { ParsedQuantity } from '../units/parse-quantity.ts'
import type { Dimension, UnitCode } from '../units/unit-table.ts'
import { valueTerm } from './value-term.ts'
import { expressionUnit, workingUnit } from './expression-unit.ts'

/**
 * A quantity inside an expression with the digits and the unit that a person entered: `2.40 m`, `100 gal`. Where their
 * unit cannot stand in an expression, or stands there as a plain number in another unit, the canonical value does.
 */
export function enteredTerm<D extends Dimension>(parsed: ParsedQuantity<D>): string {
  const { value, unit } = parsed.entered
  const name = expressionUnit(unit)
  const canonical: UnitCode = parsed.unit
  const plain = workingUnit(unit) === '' && unit === canonical
  if (name === undefined && !plain) return valueTerm(parsed.value, canonical)
  const term = name === undefined || name === '' ? value : `${value} ${name}`
  return value.startsWith('-') ? `(${term})` : term
}
