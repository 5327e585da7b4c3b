import type { MigrationInterface, QueryRunner } from 'typeorm'

/** What a bath asks of the animals before it begins can be said at a look: how many are weak, and whether any were handled. */
export class WeakAndHandled1764600000053 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    // empty in older rows, where nobody was asked: a column that was filled would change their marks
    await q.query(`
      ALTER TABLE observations
        ADD COLUMN unwell_count integer CONSTRAINT ck_observations_unwell CHECK (unwell_count >= 0),
        ADD COLUMN handled boolean`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
