import type { UnitCode } from '../units/unit-table.ts'
import { formatDose } from './format-dose.ts'
import type { FormattedQuantity } from './formatted-quantity.ts'

/** Enough to see what a rounding took away, and fewer than a binary fraction shows of itself. */
const unroundedDigits = 8

/**
 * An amount as the working comes to it, before the balance rounds it: the same on the screen and on paper.
 *
 * @param value the unrounded amount, a finite number in `unit`
 * @returns a quantity of kind `dose` of at most 8 significant digits: 4.3628 g
 * @throws RangeError when the value is not a finite number
 * @source ismp-dose-designations for the writing; the number of digits is a project-default
 */
export function formatUnrounded(value: number, unit: UnitCode): FormattedQuantity {
  return formatDose(Number(value.toPrecision(unroundedDigits)), unit)
}
