import type { ParsedQuantity } from '../units/parse-quantity.ts'
import type { Dimension } from '../units/unit-table.ts'
import { valueTerm } from './value-term.ts'
import { expressionUnit } from './expression-unit.ts'

/**
 * A quantity inside an expression with the digits and the unit that a person entered: `2.40 m`, `100 gal`. Where their
 * unit cannot stand in an expression the canonical value does.
 */
export function enteredTerm<D extends Dimension>(parsed: ParsedQuantity<D>): string {
  const { value, unit } = parsed.entered
  const name = expressionUnit(unit)
  if (name === undefined) return valueTerm(parsed.value, parsed.unit)
  const term = name === '' ? value : `${value} ${name}`
  return value.startsWith('-') ? `(${term})` : term
}
