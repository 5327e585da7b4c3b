import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Whether an animal or group may be eaten or set free, as somebody said. Of whom nobody did it is not known. */
export class FoodOrRelease1764600000062 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE food_statements (
        id uuid CONSTRAINT pk_food_statements PRIMARY KEY,
        animal_id uuid NOT NULL CONSTRAINT fk_food_statements_animal REFERENCES animals (id),
        answer text NOT NULL CONSTRAINT ck_food_statements_answer CHECK (answer IN ('yes', 'no')),
        reason text NOT NULL CONSTRAINT ck_food_statements_reason CHECK (length(trim(reason)) >= 3),
        happened_at timestamptz NOT NULL,
        happened_on date NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid NOT NULL CONSTRAINT fk_food_statements_recorded_by REFERENCES people (id)
      )`)
    await q.query(`CREATE INDEX ix_food_statements_animal ON food_statements (animal_id, happened_at DESC)`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
