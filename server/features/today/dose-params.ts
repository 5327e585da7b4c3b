import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { orderWords } from '../../../shared/messages/orders.ts'
import type { RecentDoseRow } from '../administrations/index.ts'

function saidAmount({
  is_as_written,
  amount_entered_value: value,
  amount_entered_unit: unit,
}: RecentDoseRow): Record<string, string> {
  if (!is_as_written) return { amount: doseWords.notAsRecorded.toLowerCase() }
  return value === null ? {} : { amount: formatDose(value, unit as UnitCode).text }
}

/** What the words about a recorded dose are made of. */
export function doseParams(row: RecentDoseRow): Record<string, string | number> {
  return {
    number: row.number,
    key: row.dose_key,
    enclosure: row.enclosure_code,
    ...(row.agent === null ? { drug: orderWords.drugUnknown } : { agent: row.agent }),
    by: row.by_name,
    ...saidAmount(row),
  }
}
