import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { formatUnrounded } from '../../../shared/domain/quantities/format-unrounded.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { orderViewWords } from '../../../shared/messages/orders-screens.ts'
import type { DoseSituation } from './dose-situation.ts'

/** From the last line of the working to what is weighed now, in the words of the order; null where nothing is rounded. */
export function saidRounding({ judgement, content }: DoseSituation): string | null {
  const dose = judgement?.dose
  const division = content.fields.division as Quantity | null
  if (!dose?.measured || !division) return null
  return orderViewWords.rounded({
    unrounded: formatUnrounded(dose.amount, dose.unit).text,
    division: formatDose(division.value, division.unit as UnitCode).text,
    amount: formatDose(dose.measured.value, dose.measured.unit).text,
  })
}
