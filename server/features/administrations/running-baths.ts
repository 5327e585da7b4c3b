import type { RunningBath } from '../../../shared/contracts/doses.contract.ts'
import { wentIn } from '../../../shared/domain/orders/dose-states.ts'
import { compareInstants } from '../../../shared/domain/time/instant-arithmetic.ts'
import type { DoseReadRow } from './administrations.reads.ts'

const minuteMs = 60_000

/**
 * The timed baths among an order's records that went in and have no end, the first to end first; of one whose time cannot
 * be read any more the end is not known, and it may be over already. Two of one order can
 * run at once, and two records of one planned dose as well: each has its own time.
 */
export function runningBaths(records: readonly DoseReadRow[]): RunningBath[] {
  return records
    .flatMap((row): RunningBath[] => {
      if (!wentIn(row) || row.stop_at !== null || (row.contact_is_told && row.contact_minutes === null))
        return []
      return [
        {
          doseId: row.id,
          key: row.dose_key,
          startedAt: row.happened_at.toISOString(),
          endsAt:
            row.contact_minutes === null
              ? null
              : new Date(row.happened_at.getTime() + row.contact_minutes * minuteMs).toISOString(),
          by: row.by_name,
        },
      ]
    })
    .sort((a, b) => compareInstants(a.endsAt ?? a.startedAt, b.endsAt ?? b.startedAt))
}
