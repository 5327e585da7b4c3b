import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { formatUnrounded } from '../../../shared/domain/quantities/format-unrounded.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { orderViewWords } from '../../../shared/messages/orders-screens.ts'

/**
 * From the last line of a working to what is weighed, in the words of the screen.
 *
 * @param unrounded what the working comes to
 * @param division  to what the balance or measure reads
 * @param amount    what is weighed or measured, as written
 */
export function sayRounding(
  unrounded: { value: number; unit: UnitCode },
  division: { value: number | string; unit: string },
  amount: string,
): string {
  return orderViewWords.rounded({
    unrounded: formatUnrounded(unrounded.value, unrounded.unit).text,
    division: formatDose(division.value, division.unit as UnitCode).text,
    amount,
  })
}
