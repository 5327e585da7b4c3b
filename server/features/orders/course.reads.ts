import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import type { Db } from '../../platform/database/db.ts'

export interface CourseReadRow {
  number: string
  agent: AgentCode
  doses: number
  interval_hours: number | null
  contact_minutes: number | null
  starts_at: Date
  /** Discontinued by a veterinarian. */
  discontinued: boolean
  /** Planned doses with a record of any kind. */
  done_keys: string[]
  /** When doses went in, and when the bath was over or the agent out of the water. */
  given: { at: string; ended: string | null }[]
}

/** How far the course of an order has come, by the signed version in force; null while none is signed. */
export async function readCourse(db: Db, orderId: string): Promise<CourseReadRow | null> {
  const [row]: CourseReadRow[] = await db.query(
    `SELECT o.number, v.agent, v.doses, v.interval_hours, v.contact_minutes, v.starts_at,
            EXISTS (SELECT 1 FROM order_events e WHERE e.order_id = o.id AND e.kind = 'discontinued') AS discontinued,
            coalesce((SELECT array_agg(DISTINCT d.dose_key) FROM live_doses d JOIN order_versions x ON x.id = d.order_version_id
                       WHERE x.order_id = o.id), '{}') AS done_keys,
            coalesce((SELECT json_agg(json_build_object('at', d.happened_at, 'ended',
                               (SELECT max(s.happened_at) FROM live_bath_stops s WHERE s.dose_id = d.id)))
                        FROM live_doses d JOIN order_versions x ON x.id = d.order_version_id
                       WHERE x.order_id = o.id AND d.kind IN ('given', 'recorded')), '[]') AS given
       FROM orders o
       JOIN order_versions v ON v.order_id = o.id
      WHERE o.id = $1 ORDER BY v.version_no DESC LIMIT 1`,
    [orderId],
  )
  return row ?? null
}
