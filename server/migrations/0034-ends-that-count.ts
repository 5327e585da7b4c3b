import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * An end that was recorded for a time before its dose is kept, and ends nothing: the bath runs on until its real end is
 * recorded. A minute is the finest that is typed, so the minute of the dose is not before it.
 */
export class EndsThatCount1764600000034 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE VIEW recorded_bath_stops AS
        SELECT s.*, s.happened_at < date_trunc('minute', d.happened_at) AS before_start
          FROM bath_stops s JOIN doses d ON d.id = s.dose_id
         WHERE NOT EXISTS (SELECT 1 FROM dose_voids v WHERE v.stop_id = s.id)`)
    await q.query(`
      CREATE OR REPLACE VIEW live_bath_stops AS
        SELECT s.id, s.dose_id, s.cause, s.seen, s.rescue, s.happened_at, s.happened_on, s.recorded_at, s.recorded_by
          FROM recorded_bath_stops s WHERE NOT s.before_start`)
    await q.query(`REVOKE INSERT ON recorded_bath_stops FROM pratique_app`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
