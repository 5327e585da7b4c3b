import { wentIn } from '../../../shared/domain/orders/dose-states.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { readDoses, stands } from './administrations.reads.ts'
import { readDoseSituation } from './dose-situation.ts'
import type { DoseSituationParts } from './dose-situation.ts'

/**
 * Clocks of quarantine rest on doses and their ends. After one of them was struck out, or another end was recorded, what
 * they were told is voided, and told anew by the records that stand.
 */
export async function tellClocksAnew(
  parts: DoseSituationParts,
  tx: Tx,
  order: { id: string; number: string },
  reason: string,
): Promise<void> {
  const orderId = order.id
  await parts.orders.course.takenBack(tx, { orderId, reason })
  const standing = (await readDoses(tx.manager, orderId)).filter(stands).filter(wentIn)
  for (const record of standing) {
    const { enclosureIds } = await readDoseSituation(
      parts,
      order.number,
      record.dose_key,
      record.happened_at,
      { db: tx.manager },
    )
    await parts.orders.course.doseWentIn(tx, { orderId, enclosureIds, at: record.happened_at })
  }
  await parts.orders.course.settle(tx, orderId)
}
