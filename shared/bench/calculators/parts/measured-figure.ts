import { convert } from '../../../domain/units/convert.ts'
import type { Quantity } from '../../../domain/units/quantity.ts'
import type { Figure } from '../../definition.ts'

/** An amount in the unit of the balance or measure, with the digits that it shows; unrounded where none is named. */
export function measuredFigure(
  key: string,
  value: number,
  unit: 'g' | 'mL',
  measured: Quantity | undefined,
): Figure {
  if (measured === undefined) return { key, value, unit, kind: 'dose' }
  const there = convert(value, unit, measured.unit)
  const inItsUnit = there.ok ? there.value : value
  return { key, value: inItsUnit, unit: measured.unit, measured: measured.value, kind: 'dose' }
}
