import type { Tx } from '../../platform/database/transactions.ts'
import { noteWritten } from '../../platform/database/written-rows.ts'

/** Notes once that a person was shown the amount of a dose; true when it is new. */
export async function insertSeen(
  tx: Tx,
  row: { id: string; orderVersionId: string; doseKey: string; personId: string },
): Promise<boolean> {
  const rows: unknown[] = await tx.manager.query(
    `INSERT INTO dose_amounts_seen (id, order_version_id, dose_key, person_id, recorded_at)
     VALUES ($1, $2, $3, $4, $5) ON CONFLICT ON CONSTRAINT uq_dose_amounts_seen_person DO NOTHING RETURNING id`,
    [row.id, row.orderVersionId, row.doseKey, row.personId, tx.at],
  )
  if (rows.length > 0) noteWritten(tx.manager.queryRunner, 'dose_amounts_seen', row.id)
  return rows.length > 0
}
