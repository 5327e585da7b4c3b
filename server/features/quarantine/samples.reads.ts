import type { Db } from '../../platform/database/db.ts'
import { happenedBy } from '../../platform/database/happened-by.ts'

/**
 * When samples of animals in quarantine were taken: steps of their case that are samples by a protocol it ran under, and
 * the samples that results were entered for. Nobody says which of a batch was sampled: it may have been any.
 */
export async function readSamplesTaken(
  db: Db,
  animalIds: readonly string[],
  { from, at }: { from: Date; at: Date },
): Promise<Date[]> {
  const rows: { taken_at: Date }[] = await db.query(
    `WITH cases AS (
       SELECT DISTINCT m.case_id FROM case_members m
        WHERE m.animal_id = ANY ($1::uuid[])
          AND NOT EXISTS (SELECT 1 FROM case_events v
                           WHERE v.kind = 'voided' AND v.facts ->> 'voidsEventId' = m.id::text))
     SELECT r.happened_at AS taken_at
       FROM case_step_records r
       JOIN quarantine_cases c ON c.id = r.case_id
      WHERE r.case_id IN (SELECT case_id FROM cases) AND r.happened_at >= $2 AND ${happenedBy('r', '$3')}
        AND EXISTS (
          SELECT 1 FROM protocol_versions p, jsonb_array_elements(p.content -> 'steps') s
           WHERE s ->> 'key' = r.step_key AND s ->> 'kind' = 'sample'
             AND (p.id = c.protocol_version_id
                  OR p.id::text IN (SELECT e.facts -> 'protocol' ->> 'versionId' FROM live_case_events e
                                     WHERE e.case_id = c.id AND e.kind = 'protocol-changed')))
     UNION ALL
     SELECT (e.facts ->> 'takenAt')::timestamptz
       FROM live_case_events e
      WHERE e.case_id IN (SELECT case_id FROM cases) AND e.facts ? 'takenAt'
        AND (e.facts ->> 'takenAt')::timestamptz BETWEEN $2::timestamptz AND $3::timestamptz`,
    [[...animalIds], from, at],
  )
  return rows.map((row) => row.taken_at)
}
