import type { UnitCode } from '../units/unit-table.ts'
import { formatDose } from './format-dose.ts'
import type { FormattedQuantity } from './formatted-quantity.ts'
import { noBreakSpace } from './number-text.ts'

/**
 * Two doses as a range with its unit once: "0.431 to 0.449 g". The word between is given by the caller's catalogue.
 *
 * @param to the word between the figures, "to" in English; never a dash, which reads as a minus
 * @throws RangeError when a figure is not a finite number
 */
export function formatDoseRange(
  low: string | number,
  high: string | number,
  unit: UnitCode,
  to: string,
): FormattedQuantity {
  const upper = formatDose(high, unit)
  const lower = formatDose(low, unit)
  const number = `${lower.number}${noBreakSpace}${to}${noBreakSpace}${upper.number}`
  return { ...upper, number, text: `${lower.number}${noBreakSpace}${to}${noBreakSpace}${upper.text}` }
}
