import type { Db } from '../../platform/database/db.ts'

export interface DependentReadRow {
  kind: 'case' | 'order'
  number: string
}

/** Records of other features that rest on an animal being here: cases that it is in, and orders signed for it. */
export function readDependents(db: Db, animalId: string): Promise<DependentReadRow[]> {
  return db.query(
    `SELECT 'case' AS kind, c.number FROM case_members m JOIN quarantine_cases c ON c.id = m.case_id
      WHERE m.animal_id = $1
        AND NOT EXISTS (SELECT 1 FROM case_events v
                         WHERE v.kind = 'voided' AND v.facts ->> 'voidsEventId' = m.id::text)
     UNION
     SELECT 'order', o.number FROM order_version_animals a
       JOIN order_versions v ON v.id = a.order_version_id JOIN orders o ON o.id = v.order_id
      WHERE a.animal_id = $1
      ORDER BY 1, 2`,
    [animalId],
  )
}
