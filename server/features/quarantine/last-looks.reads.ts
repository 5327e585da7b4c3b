import type { Db } from '../../platform/database/db.ts'

export interface LastLookOfCaseRow {
  number: string
  enclosure_code: string
  last_at: Date
  by_name: string | null
}

/** The last observation of each case in each of its enclosures since an instant; voided ones left out. */
export function readLastLooksOfCases(db: Db, since: Date): Promise<LastLookOfCaseRow[]> {
  return db.query(
    `SELECT DISTINCT ON (c.number, e.code) c.number, e.code AS enclosure_code, o.happened_at AS last_at,
            w.printed_name AS by_name
       FROM observations o
       JOIN observation_cases k ON k.observation_id = o.id
       JOIN quarantine_cases c ON c.id = k.case_id
       JOIN enclosures e ON e.id = o.enclosure_id
       LEFT JOIN people w ON w.id = o.recorded_by
      WHERE o.happened_at >= $1
        AND NOT EXISTS (SELECT 1 FROM observation_voids v WHERE v.observation_id = o.id)
      ORDER BY c.number, e.code, o.happened_at DESC`,
    [since],
  )
}
