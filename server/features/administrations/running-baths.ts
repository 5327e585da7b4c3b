import type { RunningBath } from '../../../shared/contracts/doses.contract.ts'
import { wentIn } from '../../../shared/domain/orders/dose-states.ts'
import { compareInstants } from '../../../shared/domain/time/instant-arithmetic.ts'
import type { DoseReadRow } from './administrations.reads.ts'

const minuteMs = 60_000

/**
 * Whether a dose is a bath with an end, and when: `null` when nobody can tell the time any more, and it may be up;
 * `undefined` for an agent that stays in the water.
 */
export function endOfBath(
  dose: Pick<DoseReadRow, 'happened_at' | 'contact_minutes' | 'contact_is_told'>,
): string | null | undefined {
  if (dose.contact_minutes === null) return dose.contact_is_told ? undefined : null
  return new Date(dose.happened_at.getTime() + dose.contact_minutes * minuteMs).toISOString()
}

/**
 * The timed baths among an order's records that went in and have no end, the first to end first. Two of one order can run
 * at once, and two records of one planned dose as well: each has its own time.
 */
export function runningBaths(records: readonly DoseReadRow[]): RunningBath[] {
  return records
    .flatMap((row): RunningBath[] => {
      const endsAt = endOfBath(row)
      if (!wentIn(row) || row.stop_at !== null || endsAt === undefined) return []
      return [
        {
          doseId: row.id,
          key: row.dose_key,
          startedAt: row.happened_at.toISOString(),
          endsAt,
          by: row.by_name,
        },
      ]
    })
    .sort((a, b) => compareInstants(a.endsAt ?? a.startedAt, b.endsAt ?? b.startedAt))
}
