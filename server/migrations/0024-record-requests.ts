import type { MigrationInterface, QueryRunner } from 'typeorm'

/** What was sent under the id of a record when it was written: the same id with other content is refused, not dropped. */
export class RecordRequests1764600000024 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE record_requests (
        record_id uuid NOT NULL,
        contract_id text NOT NULL,
        content_hash text NOT NULL,
        recorded_at timestamptz NOT NULL,
        CONSTRAINT pk_record_requests PRIMARY KEY (record_id, contract_id)
      )`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
