import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { RecentDoseRow } from '../administrations/index.ts'

/** What the words about a recorded dose are made of. */
export function doseParams(row: RecentDoseRow): Record<string, string | number> {
  const { amount_entered_value: value, amount_entered_unit: unit } = row
  return {
    number: row.number,
    key: row.dose_key,
    enclosure: row.enclosure_code,
    agent: row.agent,
    by: row.by_name,
    ...(value === null ? {} : { amount: formatDose(value, unit as UnitCode).text }),
  }
}
