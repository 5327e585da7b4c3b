import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Condition } from '../../../shared/domain/permissions/table.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { animalRefusals } from '../../../shared/messages/animal-refusals.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { FacilityService } from '../facility/index.ts'
import type { RecordedFact } from './recorded-fact.entity.ts'

const detailOf = {
  'weight.strike': animalRefusals.strikeOwnWeight,
  'death.strike': animalRefusals.strikeOwnDeath,
  'move.strike': animalRefusals.strikeOwnMove,
  'dose.strike': doseWords.strikeOwn,
}

/**
 * Whether this person may strike a row out. A slip of the hand is taken back by whoever made it, on the day of it; later,
 * others rest on the record (clocks, counts, doses, tracing), and the roles that answer for it decide.
 */
export async function checkMayStrike(
  parts: { facility: FacilityService },
  tx: Tx,
  action: keyof typeof detailOf,
  row: Pick<RecordedFact, 'recordedAt' | 'recordedBy'>,
  facts: Partial<Record<Condition, boolean>> = {},
): Promise<void> {
  const zone = await parts.facility.zone(tx)
  const dayOf = (at: Date) => facilityDateOf(at.toISOString(), zone)
  const isOwn = row.recordedBy !== null && row.recordedBy === tx.actor.personId
  const own = isOwn && dayOf(row.recordedAt) === dayOf(tx.at)
  if (!decide(action, tx.actor.roles, { ...facts, 'own-record-of-the-day': own }).allowed)
    throw new Problem('may-not', { detail: detailOf[action] })
}
