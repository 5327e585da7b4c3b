import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * Lifts of movement locks that still have behind them what they were made for. A boundary was lifted because its case was
 * cleared or transferred out, or because the animal, or the group that it was taken out of, was entered into the case by
 * mistake. Where that record is gone or is not what was written, nobody can tell that the animal may leave.
 */
export class StandingLockLifts1764600000051 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE VIEW standing_lock_lifts AS
        SELECT f.*
          FROM movement_lock_lifts f
          JOIN movement_locks k ON k.id = f.lock_id
         WHERE k.kind <> 'boundary' OR k.source_kind <> 'quarantine-case'
            OR EXISTS (
                 SELECT 1 FROM live_case_events e
                  WHERE e.case_id = k.source_id AND e.kind IN ('cleared', 'transferred-out')
                    AND row_is_as_written('case_events', e.id::text)
                    AND (e.kind <> 'cleared' OR row_is_as_written('signed_texts', e.signed_text_id::text)))
            OR (WITH RECURSIVE kin AS (
                  SELECT k.animal_id AS id
                   UNION
                  SELECT a.split_from_id FROM kin JOIN animals a ON a.id = kin.id WHERE a.split_from_id IS NOT NULL)
                SELECT bool_and(EXISTS (
                         SELECT 1 FROM case_events v
                          WHERE v.kind = 'voided' AND v.facts ->> 'voidsEventId' = m.id::text))
                  FROM kin JOIN case_members m ON m.animal_id = kin.id AND m.case_id = k.source_id)`)
    await q.query(`REVOKE INSERT ON standing_lock_lifts FROM pratique_app`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
