import type { FacilityDate } from '../../../shared/domain/time/instant.ts'
import type { Db } from '../../platform/database/db.ts'
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

/** Notes once a day that a person worked out what a drug comes to in the water of an enclosure; true when it is new. */
export async function insertPreviewed(
  tx: Tx,
  row: { id: string; enclosureId: string; agent: string; personId: string; on: FacilityDate },
): Promise<boolean> {
  const rows: unknown[] = await tx.manager.query(
    `INSERT INTO amounts_previewed (id, enclosure_id, agent, person_id, previewed_on, recorded_at)
     VALUES ($1, $2, $3, $4, $5, $6) ON CONFLICT ON CONSTRAINT uq_amounts_previewed_day DO NOTHING RETURNING id`,
    [row.id, row.enclosureId, row.agent, row.personId, row.on, tx.at],
  )
  if (rows.length > 0) noteWritten(tx.manager.queryRunner, 'amounts_previewed', row.id)
  return rows.length > 0
}

/** Those of some enclosures for which a person has not worked out this drug on this day. */
export async function readNotPreviewed(
  db: Db,
  asked: { enclosureIds: readonly string[]; agent: string; personId: string; on: FacilityDate },
): Promise<string[]> {
  const rows: { id: string }[] = await db.query(
    `SELECT e.id FROM unnest($1::uuid[]) e (id)
      WHERE NOT EXISTS (SELECT 1 FROM amounts_previewed p
                         WHERE p.enclosure_id = e.id AND p.agent = $2 AND p.person_id = $3 AND p.previewed_on = $4)
      ORDER BY e.id`,
    [asked.enclosureIds, asked.agent, asked.personId, asked.on],
  )
  return rows.map(({ id }) => id)
}
