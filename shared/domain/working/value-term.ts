import type { UnitCode } from '../units/unit-table.ts'
import { workingUnit } from './expression-unit.ts'

/**
 * A computed value inside an expression, unrounded: the shortest digits that mean exactly this double.
 *
 * @throws RangeError for a unit that cannot stand in an expression
 */
export function valueTerm(value: number, unit: UnitCode): string {
  const name = workingUnit(unit)
  if (name === undefined) throw new RangeError(`${unit} cannot stand in an expression`)
  const term = name === '' ? String(value) : `${value} ${name}`
  return value < 0 ? `(${term})` : term
}
