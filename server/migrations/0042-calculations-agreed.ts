import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Doses whose newest two calculations agree: one that is struck out needs no other second calculation, any other does. */
export class CalculationsAgreed1764600000042 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE VIEW calculations_agreed AS
        SELECT s.order_version_id, s.dose_key
          FROM dose_calculations s
         WHERE s.part = 'second' AND s.agrees
           AND NOT EXISTS (SELECT 1 FROM dose_calculations l
                            WHERE l.order_version_id = s.order_version_id AND l.dose_key = s.dose_key
                              AND ((l.part = 'second' AND (l.recorded_at, l.id) > (s.recorded_at, s.id))
                                OR (l.part = 'first' AND l.recorded_at > s.recorded_at)))`)
    await q.query(`REVOKE INSERT ON calculations_agreed FROM pratique_app`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
