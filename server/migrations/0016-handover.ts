import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Notes from one watch to the next, and who has read them: both ledgers. */
export class Handover1764600000016 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE handover_notes (
        id uuid CONSTRAINT pk_handover_notes PRIMARY KEY,
        about text CONSTRAINT ck_handover_notes_about CHECK (about <> ''),
        words text NOT NULL CONSTRAINT ck_handover_notes_words CHECK (words <> ''),
        recorded_at timestamptz NOT NULL,
        recorded_by uuid NOT NULL CONSTRAINT fk_handover_notes_recorded_by REFERENCES people (id)
      )`)
    await q.query(`CREATE INDEX ix_handover_notes_recorded ON handover_notes (recorded_at DESC)`)
    await q.query(`
      CREATE TABLE handover_reads (
        id uuid CONSTRAINT pk_handover_reads PRIMARY KEY,
        note_id uuid NOT NULL CONSTRAINT fk_handover_reads_note REFERENCES handover_notes (id),
        recorded_at timestamptz NOT NULL,
        recorded_by uuid NOT NULL CONSTRAINT fk_handover_reads_recorded_by REFERENCES people (id)
      )`)
    await q.query(`CREATE INDEX ix_handover_reads_note ON handover_reads (note_id, recorded_at)`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
