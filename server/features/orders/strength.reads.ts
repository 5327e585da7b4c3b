import { lookCountsForHours } from '../../../shared/domain/observations/condition-before-bath.ts'
import type { StrengthSaid } from '../../../shared/domain/observations/condition-before-bath.ts'
import type { Db } from '../../platform/database/db.ts'
import { happenedBy, timeSeenAt } from '../../platform/database/happened-by.ts'

interface LookRow {
  enclosure_id: string
  happened_at: Date
  recorded_at: Date
  unwell_count: number | null
  handled: boolean | null
}

/**
 * What looks at these enclosures said, within a day before an instant, of weak and of handled animals. A look whose row
 * is not what was written says nothing.
 */
export async function readStrength(
  db: Db,
  enclosureIds: readonly string[],
  at: Date,
): Promise<StrengthSaid[]> {
  const rows: LookRow[] = await db.query(
    `SELECT o.enclosure_id, o.happened_at, o.recorded_at, o.unwell_count, o.handled
       FROM observations o
      WHERE o.enclosure_id = ANY($1::uuid[]) AND ${happenedBy('o', '$2')}
        AND o.happened_at >= $2::timestamptz - make_interval(hours => $3)
        AND (o.unwell_count IS NOT NULL OR o.handled IS NOT NULL)
        AND NOT EXISTS (SELECT 1 FROM observation_voids v WHERE v.observation_id = o.id)
        AND row_is_as_written('observations', o.id::text)
      ORDER BY o.happened_at DESC, o.recorded_at DESC, o.id DESC`,
    [[...enclosureIds], at, lookCountsForHours],
  )
  return rows.map((row) => ({
    enclosureId: row.enclosure_id,
    at: timeSeenAt(row, at).toISOString(),
    unwell: row.unwell_count,
    handled: row.handled,
  }))
}
