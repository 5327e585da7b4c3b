import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * What is behind a lift is looked up for the lifts that are asked about, one by one. As part of the view it was looked up
 * for every lock of the house before those of one animal were picked out.
 */
export class LiftsOneByOne1764600000052 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    // dear enough that whatever else leaves a lift out is looked at first
    await q.query(`
      CREATE FUNCTION lock_lift_stands(of_lock uuid) RETURNS boolean LANGUAGE plpgsql STABLE COST 20000 AS $$
      DECLARE
        k movement_locks;
      BEGIN
        SELECT * INTO k FROM movement_locks l WHERE l.id = of_lock;
        IF k.kind <> 'boundary' OR k.source_kind <> 'quarantine-case' THEN
          RETURN true;
        END IF;
        IF EXISTS (
          SELECT 1 FROM live_case_events e
           WHERE e.case_id = k.source_id AND e.kind IN ('cleared', 'transferred-out')
             AND row_is_as_written('case_events', e.id::text)
             AND (e.kind <> 'cleared' OR row_is_as_written('signed_texts', e.signed_text_id::text))) THEN
          RETURN true;
        END IF;
        RETURN coalesce((
          WITH RECURSIVE kin AS (
            SELECT k.animal_id AS id
             UNION
            SELECT a.split_from_id FROM kin JOIN animals a ON a.id = kin.id WHERE a.split_from_id IS NOT NULL)
          SELECT bool_and(EXISTS (
                   SELECT 1 FROM case_events v
                    WHERE v.kind = 'voided' AND v.facts ->> 'voidsEventId' = m.id::text))
            FROM kin JOIN case_members m ON m.animal_id = kin.id AND m.case_id = k.source_id), false);
      END $$`)
    await q.query(`
      CREATE OR REPLACE VIEW standing_lock_lifts AS
        SELECT f.* FROM movement_lock_lifts f WHERE lock_lift_stands(f.lock_id)`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
