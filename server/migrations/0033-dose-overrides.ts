import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Stops at one dose that a veterinarian overrode: the signed text holds the finding, its facts and the reason. */
export class DoseOverrides1764600000033 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE dose_overrides (
        id uuid CONSTRAINT pk_dose_overrides PRIMARY KEY,
        order_version_id uuid NOT NULL CONSTRAINT fk_dose_overrides_version REFERENCES order_versions (id),
        dose_key text NOT NULL,
        signed_text_id uuid NOT NULL CONSTRAINT fk_dose_overrides_text REFERENCES signed_texts (id)
          CONSTRAINT uq_dose_overrides_text UNIQUE,
        rule_id text NOT NULL,
        code text NOT NULL,
        reason text NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid NOT NULL CONSTRAINT fk_dose_overrides_recorded_by REFERENCES people (id)
      )`)
    await q.query(`CREATE INDEX ix_dose_overrides_dose ON dose_overrides (order_version_id, dose_key)`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
