import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { sayRounding } from '../orders/index.ts'
import type { DoseSituation } from './dose-situation.ts'

/** From the last line of the working to what is weighed now; null where nothing is rounded. */
export function saidRounding({ judgement, content }: DoseSituation): string | null {
  const dose = judgement?.dose
  const division = content.fields.division as Quantity | null
  if (!dose?.measured || !division) return null
  const amount = formatDose(dose.measured.value, dose.measured.unit).text
  return sayRounding({ value: dose.amount, unit: dose.unit }, division, amount)
}
