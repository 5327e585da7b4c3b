import type { EventOf } from '../../../shared/domain/quarantine/clock-event.ts'
import type { Db } from '../../platform/database/db.ts'

type Treatment = EventOf<'treatment-started'> | EventOf<'treatment-ended'>

export interface TreatmentReadRow {
  id: string
  case_id: string
  case_number: string
  kind: Treatment['kind']
  facts: Treatment
  happened_at: Date
}

/** What stands in the clocks of cases about one course of treatment, struck-out events left out. */
export function readTreatments(db: Db, courseId: string): Promise<TreatmentReadRow[]> {
  return db.query(
    `SELECT e.id, e.case_id, c.number AS case_number, e.kind, e.facts, e.happened_at
       FROM live_case_events e JOIN quarantine_cases c ON c.id = e.case_id
      WHERE e.kind IN ('treatment-started', 'treatment-ended') AND e.facts ->> 'treatmentId' LIKE $1 || '%'
      ORDER BY e.happened_at, e.id`,
    [courseId],
  )
}
