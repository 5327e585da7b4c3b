import { refuse, type Result } from '../result.ts'
import type { QuantityRefusal } from './number-refusal.ts'
import { parseQuantity, type ParsedQuantity, type QuantityRules } from './parse-quantity.ts'
import type { Dimension, UnitCode } from './unit-table.ts'

/**
 * Reads one text that holds a number and its unit, such as "38 US gal" or "0,68m".
 *
 * @param typed      the whole text
 * @param unitIfNone the unit of the field, taken when only a number stands there; without it a bare number is refused
 * @refuses as parseQuantity
 */
export function parseQuantityText<D extends Dimension>(
  typed: unknown,
  rules: QuantityRules<D>,
  unitIfNone?: UnitCode,
): Result<ParsedQuantity<D>, QuantityRefusal> {
  if (typeof typed !== 'string') return refuse('not-a-number', rules.field ?? 'value')
  const match = /^\s*([+\-−–]?[\d.,]*)\s*(.*)$/s.exec(typed)
  const unit = match?.[2]?.trim() ?? ''
  // "deep" has no number at all: say so, instead of calling it an unknown unit.
  const value = match?.[1] === '' && unit !== '' ? unit : (match?.[1] ?? typed)
  return parseQuantity({ value, unit: unit === '' ? unitIfNone : unit }, rules)
}
