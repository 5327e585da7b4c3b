import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Classes, corrections and early ends of licences; locks of signing after wrong passwords. */
export class LicencesAndSigningLocks1764600000055 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    // empty in older rows, which are licences to practise: a column that was filled would change their marks
    await q.query(`
      ALTER TABLE licences
        ADD COLUMN class text CONSTRAINT ck_licences_class CHECK (class IN ('veterinary', 'controlled-substance')),
        ADD COLUMN supersedes_id uuid CONSTRAINT fk_licences_supersedes REFERENCES licences (id)
          CONSTRAINT uq_licences_supersedes UNIQUE,
        ADD COLUMN reason text CONSTRAINT ck_licences_reason
          CHECK ((supersedes_id IS NULL) = (reason IS NULL) AND length(trim(reason)) > 0)`)

    await q.query(`
      CREATE TABLE licence_ends (
        id uuid CONSTRAINT pk_licence_ends PRIMARY KEY,
        licence_id uuid NOT NULL CONSTRAINT fk_licence_ends_licence REFERENCES licences (id)
          CONSTRAINT uq_licence_ends_licence UNIQUE,
        ended_on date NOT NULL,
        reason text NOT NULL CONSTRAINT ck_licence_ends_reason CHECK (length(trim(reason)) > 0),
        recorded_at timestamptz NOT NULL,
        recorded_by uuid
      )`)

    await q.query(`
      CREATE TABLE signing_locks (
        id uuid CONSTRAINT pk_signing_locks PRIMARY KEY,
        person_id uuid NOT NULL CONSTRAINT fk_signing_locks_person REFERENCES people (id),
        locked_at timestamptz NOT NULL,
        until_at timestamptz NOT NULL,
        wrong_tries integer NOT NULL,
        last_try_id bigint NOT NULL,
        CONSTRAINT ck_signing_locks_period CHECK (until_at > locked_at)
      )`)
    await q.query(`CREATE INDEX ix_signing_locks_person ON signing_locks (person_id, until_at DESC)`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
