import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Whose bodies those were that an observation could not name, or why nobody will know. */
export class Bodies1764600000026 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE observation_bodies (
        id uuid CONSTRAINT pk_observation_bodies PRIMARY KEY,
        observation_id uuid NOT NULL CONSTRAINT fk_observation_bodies_observation REFERENCES observations (id)
          CONSTRAINT uq_observation_bodies_observation UNIQUE,
        named_count integer NOT NULL CONSTRAINT ck_observation_bodies_named CHECK (named_count >= 0),
        reason text,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_observation_bodies_recorded_by REFERENCES people (id),
        CONSTRAINT ck_observation_bodies_reason CHECK (named_count > 0 OR reason IS NOT NULL)
      )`)
  }

  async down(): Promise<void> {
    throw new Error('A landed migration is never taken back; add another one.')
  }
}
