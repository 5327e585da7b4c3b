import type { MigrationInterface, QueryRunner } from 'typeorm'

/** A body whose death was struck out is named again: one row for each naming, with how many bodies it settled. */
export class BodiesNamedAgain1764600000045 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    // empty in older rows, each the only one of its look: a column that was filled would change their marks
    await q.query(`
      ALTER TABLE observation_bodies
        ADD COLUMN naming_no integer CONSTRAINT ck_observation_bodies_naming CHECK (naming_no > 0),
        ADD COLUMN settled_count integer CONSTRAINT ck_observation_bodies_settled CHECK (settled_count >= named_count)`)
    await q.query(`ALTER TABLE observation_bodies DROP CONSTRAINT uq_observation_bodies_observation`)
    await q.query(`
      CREATE UNIQUE INDEX uq_observation_bodies_observation
        ON observation_bodies (observation_id, coalesce(naming_no, 1))`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
