import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Signed texts: what was signed, by whom, under which licence, and the seal over it. */
export class Signing1764600000010 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE signed_texts (
        id uuid CONSTRAINT pk_signed_texts PRIMARY KEY,
        subject_kind text NOT NULL,
        subject_id uuid NOT NULL,
        subject_label text NOT NULL,
        meaning text NOT NULL,
        text text NOT NULL,
        hash text NOT NULL,
        signature text NOT NULL,
        key_id text NOT NULL,
        signer_id uuid NOT NULL CONSTRAINT fk_signed_texts_signer REFERENCES people (id),
        signed_at timestamptz NOT NULL
      )`)
    await q.query(
      `CREATE INDEX ix_signed_texts_subject ON signed_texts (subject_kind, subject_id, signed_at)`,
    )
    await q.query(`CREATE INDEX ix_signed_texts_hash ON signed_texts (hash)`)
  }

  async down(): Promise<void> {
    throw new Error('A landed migration is never taken back; add another one.')
  }
}
