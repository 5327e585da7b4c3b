import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Records of doses and stops that were struck out with a reason; they stay readable, and nothing rests on them. */
export class DoseVoids1764600000025 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE dose_voids (
        id uuid CONSTRAINT pk_dose_voids PRIMARY KEY,
        dose_id uuid CONSTRAINT fk_dose_voids_dose REFERENCES doses (id) CONSTRAINT uq_dose_voids_dose UNIQUE,
        stop_id uuid CONSTRAINT fk_dose_voids_stop REFERENCES bath_stops (id) CONSTRAINT uq_dose_voids_stop UNIQUE,
        reason text NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid NOT NULL CONSTRAINT fk_dose_voids_recorded_by REFERENCES people (id),
        CONSTRAINT ck_dose_voids_one CHECK (num_nonnulls(dose_id, stop_id) = 1)
      )`)
    await q.query(`
      CREATE VIEW live_doses AS
        SELECT d.* FROM doses d WHERE NOT EXISTS (SELECT 1 FROM dose_voids v WHERE v.dose_id = d.id)`)
    await q.query(`
      CREATE VIEW live_bath_stops AS
        SELECT s.* FROM bath_stops s WHERE NOT EXISTS (SELECT 1 FROM dose_voids v WHERE v.stop_id = s.id)`)
    await q.query(`REVOKE INSERT ON live_doses, live_bath_stops FROM pratique_app`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
