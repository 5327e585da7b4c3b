import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Who was shown the amount of a dose before its two calculations agreed: they are no blind second person any more. */
export class AmountsSeen1764600000023 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE dose_amounts_seen (
        id uuid CONSTRAINT pk_dose_amounts_seen PRIMARY KEY,
        order_version_id uuid NOT NULL CONSTRAINT fk_dose_amounts_seen_version REFERENCES order_versions (id),
        dose_key text NOT NULL,
        person_id uuid NOT NULL CONSTRAINT fk_dose_amounts_seen_person REFERENCES people (id),
        recorded_at timestamptz NOT NULL,
        CONSTRAINT uq_dose_amounts_seen_person UNIQUE (order_version_id, dose_key, person_id)
      )`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
