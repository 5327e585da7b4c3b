import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Something went wrong with animals under an order, and what a veterinarian found; between the two no dose is given. */
export class AdverseEvents1764600000063 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE adverse_events (
        id uuid CONSTRAINT pk_adverse_events PRIMARY KEY,
        order_id uuid NOT NULL CONSTRAINT fk_adverse_events_order REFERENCES orders (id),
        dose_key text,
        seen text NOT NULL CONSTRAINT ck_adverse_events_seen CHECK (length(trim(seen)) >= 3),
        affected_count integer CONSTRAINT ck_adverse_events_affected CHECK (affected_count >= 0),
        happened_at timestamptz NOT NULL,
        happened_on date NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid NOT NULL CONSTRAINT fk_adverse_events_recorded_by REFERENCES people (id)
      )`)
    await q.query(`CREATE INDEX ix_adverse_events_order ON adverse_events (order_id, happened_at)`)
    await q.query(`
      CREATE TABLE adverse_event_reviews (
        id uuid CONSTRAINT pk_adverse_event_reviews PRIMARY KEY,
        event_id uuid NOT NULL CONSTRAINT fk_adverse_event_reviews_event REFERENCES adverse_events (id)
          CONSTRAINT uq_adverse_event_reviews_event UNIQUE,
        finding text NOT NULL CONSTRAINT ck_adverse_event_reviews_finding CHECK (length(trim(finding)) >= 3),
        recorded_at timestamptz NOT NULL,
        recorded_by uuid NOT NULL CONSTRAINT fk_adverse_event_reviews_recorded_by REFERENCES people (id)
      )`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
