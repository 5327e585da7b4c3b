import type { Db } from '../../platform/database/db.ts'
import { latestFirst } from './administrations.reads.ts'

export interface RecentDoseRow {
  id: string
  number: string
  dose_key: string
  kind: 'given' | 'recorded' | 'withheld' | 'refused'
  /** Null where the signed version is gone. */
  agent: string | null
  enclosure_code: string
  amount_entered_value: string | null
  amount_entered_unit: string | null
  /** False where somebody changed it in the database: none of its figures is shown. */
  is_as_written: boolean
  contact_minutes: number | null
  /** False where the signed text cannot be read: nobody can tell how long it was to be in. */
  contact_is_told: boolean
  has_exceptions: boolean
  happened_at: Date
  recorded_at: Date
  by_name: string
  stop_at: Date | null
  stop_cause: 'time-up' | 'stopped' | null
  stop_seen: string | null
  stop_by: string | null
}

/** Doses that happened or were entered since an instant, and every bath that has not ended, in time order. */
export function readRecentDoses(db: Db, since: Date): Promise<RecentDoseRow[]> {
  return db.query(
    `WITH live AS (
       SELECT d.*, d.happened_at >= $1 OR d.recorded_at >= $1 AS is_recent,
              d.kind IN ('given', 'recorded')
                AND NOT EXISTS (SELECT 1 FROM live_bath_stops b WHERE b.dose_id = d.id) AS has_no_end
         FROM live_doses d)
     SELECT d.id, o.number, d.dose_key, d.kind, v.agent, c.code AS enclosure_code, d.amount_entered_value,
            d.amount_entered_unit, row_is_as_written('doses', d.id::text) AS is_as_written, l.contact_minutes, l.is_told AS contact_is_told, d.exceptions_text <> '[]' AS has_exceptions, d.happened_at,
            d.recorded_at, p.printed_name AS by_name, s.happened_at AS stop_at, s.cause AS stop_cause,
            s.seen AS stop_seen, q.printed_name AS stop_by
       FROM live d
       JOIN contacts_of_doses l ON l.dose_id = d.id
       JOIN orders_of_doses w ON w.dose_id = d.id
       JOIN orders o ON o.id = w.order_id
       LEFT JOIN order_versions v ON v.id = d.order_version_id
       JOIN enclosures c ON c.id = o.enclosure_id
       JOIN people p ON p.id = d.recorded_by
       LEFT JOIN LATERAL (SELECT * FROM live_bath_stops b WHERE b.dose_id = d.id ORDER BY ${latestFirst} LIMIT 1) s ON true
       LEFT JOIN people q ON q.id = s.recorded_by
      WHERE (d.is_recent OR d.has_no_end) AND (d.is_recent OR l.needs_an_end)
      ORDER BY d.happened_at, d.id`,
    [since],
  )
}

export interface WantedSecondRow {
  number: string
  dose_key: string
  agent: string
  enclosure_code: string
  first_at: Date
  first_by: string
  first_by_name: string
}

/**
 * Doses worked out once since an instant and not a second time in agreement, of the version in force, not yet recorded.
 */
export function readWantedSeconds(db: Db, since: Date): Promise<WantedSecondRow[]> {
  return db.query(
    `SELECT o.number, f.dose_key, v.agent, c.code AS enclosure_code, f.recorded_at AS first_at,
            f.recorded_by AS first_by, p.printed_name AS first_by_name
       FROM dose_calculations f
       JOIN order_versions v ON v.id = f.order_version_id
       JOIN orders o ON o.id = v.order_id
       JOIN enclosures c ON c.id = o.enclosure_id
       JOIN people p ON p.id = f.recorded_by
      WHERE f.part = 'first' AND f.recorded_at >= $1
        AND NOT EXISTS (SELECT 1 FROM order_versions n WHERE n.order_id = o.id AND n.version_no > v.version_no)
        AND NOT EXISTS (SELECT 1 FROM order_events e WHERE e.order_id = o.id AND e.kind = 'discontinued')
        AND NOT EXISTS (SELECT 1 FROM live_doses d WHERE d.order_version_id = v.id AND d.dose_key = f.dose_key)
        AND NOT EXISTS (SELECT 1 FROM dose_calculations l
                         WHERE l.order_version_id = v.id AND l.dose_key = f.dose_key
                           AND ((l.part = 'first' AND (l.recorded_at, l.id) > (f.recorded_at, f.id))
                             OR (l.part = 'second' AND l.agrees AND l.recorded_at >= f.recorded_at)))
      ORDER BY f.recorded_at`,
    [since],
  )
}
