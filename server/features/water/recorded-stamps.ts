import type { Tx } from '../../platform/database/transactions.ts'
import { timeNotAhead } from '../../platform/http/check-time.ts'
import type { FacilityService } from '../facility/index.ts'

/** When a fact happened, on which facility date, and who writes it down now. Refuses a time ahead of the clock. */
export async function recordedStamps(tx: Tx, facility: FacilityService, happenedAt: string) {
  const at = timeNotAhead(happenedAt, tx.at)
  return {
    happenedAt: at,
    happenedOn: await facility.dateOf(at, tx),
    recordedAt: tx.at,
    recordedBy: tx.actor.personId,
  }
}
