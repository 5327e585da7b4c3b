import type { Db } from '../../platform/database/db.ts'

export interface OutsideCaseRow {
  accession: string
  name: string
  enclosure_code: string
  since: Date
}

/** Who lives inside a quarantine boundary and was never in a case, nor was the group it was split from. */
export function readOutsideCases(db: Db): Promise<OutsideCaseRow[]> {
  return db.query(
    `SELECT a.accession, coalesce(a.name, t.common_name) AS name, e.code AS enclosure_code, lower(s.during) AS since
       FROM stays s
       JOIN enclosures e ON e.id = s.enclosure_id
       JOIN animals a ON a.id = s.animal_id
       JOIN taxa t ON t.id = a.taxon_id
      WHERE e.boundary IS NOT NULL AND upper_inf(s.during)
        AND NOT EXISTS (SELECT 1 FROM case_members m WHERE m.animal_id IN (a.id, a.split_from_id))
      ORDER BY lower(s.during), a.accession`,
  )
}
