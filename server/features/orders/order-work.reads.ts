import type { Db } from '../../platform/database/db.ts'

export interface StandingHoldRow {
  order_id: string
  reason: string | null
  happened_at: Date
  by_name: string | null
}

/** The holds that stand, each with who made it and why. */
export function readStandingHolds(db: Db): Promise<StandingHoldRow[]> {
  return db.query(
    `SELECT l.order_id, l.reason, l.happened_at, p.printed_name AS by_name
       FROM (SELECT DISTINCT ON (e.order_id) e.order_id, e.kind, e.reason, e.happened_at, e.recorded_by
               FROM order_events e
              WHERE e.kind <> 'discontinued'
              ORDER BY e.order_id, e.recorded_at DESC, e.happened_at DESC) l
       LEFT JOIN people p ON p.id = l.recorded_by
      WHERE l.kind = 'held'`,
  )
}
