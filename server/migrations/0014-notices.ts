import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Urgent calls: who was told, by which way and with what success, who has seen it, and who telephoned whom. */
export class Notices1764600000014 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE notices (
        id uuid CONSTRAINT pk_notices PRIMARY KEY,
        observation_id uuid NOT NULL CONSTRAINT fk_notices_observation REFERENCES observations (id)
          CONSTRAINT uq_notices_observation UNIQUE,
        enclosure_id uuid NOT NULL CONSTRAINT fk_notices_enclosure REFERENCES enclosures (id),
        case_number text,
        words text NOT NULL,
        happened_at timestamptz NOT NULL,
        happened_on date NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_notices_recorded_by REFERENCES people (id)
      )`)
    await q.query(`CREATE INDEX ix_notices_time ON notices (happened_at DESC)`)
    await q.query(`
      CREATE TABLE notice_deliveries (
        id uuid CONSTRAINT pk_notice_deliveries PRIMARY KEY,
        notice_id uuid NOT NULL CONSTRAINT fk_notice_deliveries_notice REFERENCES notices (id),
        to_name text NOT NULL,
        to_address text NOT NULL,
        outcome text NOT NULL CONSTRAINT ck_notice_deliveries_outcome CHECK (outcome IN ('sent', 'failed')),
        error text,
        recorded_at timestamptz NOT NULL,
        CONSTRAINT ck_notice_deliveries_error CHECK ((outcome = 'failed') = (error IS NOT NULL))
      )`)
    await q.query(`CREATE INDEX ix_notice_deliveries_notice ON notice_deliveries (notice_id, recorded_at)`)
    await q.query(`
      CREATE TABLE notice_acts (
        id uuid CONSTRAINT pk_notice_acts PRIMARY KEY,
        notice_id uuid NOT NULL CONSTRAINT fk_notice_acts_notice REFERENCES notices (id),
        kind text NOT NULL CONSTRAINT ck_notice_acts_kind CHECK (kind IN ('seen', 'telephoned')),
        whom text,
        happened_at timestamptz NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_notice_acts_recorded_by REFERENCES people (id),
        CONSTRAINT ck_notice_acts_whom CHECK (kind = 'telephoned' OR whom IS NULL)
      )`)
    await q.query(`CREATE INDEX ix_notice_acts_notice ON notice_acts (notice_id, happened_at)`)
  }

  async down(): Promise<void> {
    throw new Error('A landed migration is never taken back; add another one.')
  }
}
