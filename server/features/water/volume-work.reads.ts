import type { Db } from '../../platform/database/db.ts'

export interface VolumeWorkRow {
  id: string
  /** Enclosure under which the determination is found; null where it covers none. */
  enclosure_code: string | null
  codes: string[]
  happened_at: Date
  determined_by: string
  determined_by_name: string | null
  next_check_on: string | null
  confirmed: boolean
}

/**
 * The newest determination of each set of bodies, where it waits for a second person or says until a day when it is to
 * be checked again.
 */
export function readVolumeWork(db: Db, checkUntilOn: string): Promise<VolumeWorkRow[]> {
  return db.query(
    `SELECT * FROM (
       SELECT DISTINCT ON (bodies.ids) d.id, bodies.enclosure_code, bodies.codes, d.happened_at,
              d.recorded_by AS determined_by, p.printed_name AS determined_by_name, d.next_check_on::text,
              EXISTS (SELECT 1 FROM volume_confirmations c WHERE c.determination_id = d.id) AS confirmed
         FROM volume_determinations d
         JOIN LATERAL (
           SELECT array_agg(b.id ORDER BY b.id) AS ids, array_agg(b.code ORDER BY b.code) AS codes,
                  min(e.code) AS enclosure_code
             FROM volume_determination_bodies x
             JOIN water_bodies b ON b.id = x.water_body_id
             LEFT JOIN enclosures e ON e.id = b.enclosure_id
            WHERE x.determination_id = d.id) bodies ON true
         LEFT JOIN people p ON p.id = d.recorded_by
        WHERE NOT EXISTS (SELECT 1 FROM water_voids v WHERE v.determination_id = d.id)
        ORDER BY bodies.ids, d.happened_at DESC, d.id DESC) newest
      WHERE NOT newest.confirmed OR newest.next_check_on::date <= $1::date
      ORDER BY newest.happened_at`,
    [checkUntilOn],
  )
}
