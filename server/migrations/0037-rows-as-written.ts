import type { MigrationInterface, QueryRunner } from 'typeorm'
import { markDrafts } from '../platform/audit/mark-older-rows.ts'

/**
 * Whether a row is what the program wrote: its hash against the newest mark that the audit trail has of it, found by an
 * index over the rows that each entry marks. And the first marks of what may change, such as the strength of a product.
 */
export class RowsAsWritten1764600000037 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE FUNCTION audit_row_keys(entry text) RETURNS text[] LANGUAGE plpgsql IMMUTABLE AS $$
      BEGIN
        RETURN ARRAY(SELECT t.key || ' ' || r.key
                       FROM jsonb_each(coalesce(entry::jsonb -> 'rows', '{}')) t, jsonb_object_keys(t.value) r (key));
      EXCEPTION WHEN data_exception THEN
        RETURN '{}'; -- an entry that somebody made unreadable marks nothing; the walk of the chain reports it
      END $$`)
    // without the list of what waits to be sorted in, which every look-up would read through
    await q.query(
      `CREATE INDEX ix_audit_entries_row_keys ON audit_entries USING gin (audit_row_keys(text)) WITH (fastupdate = off)`,
    )
    await q.query(`
      CREATE FUNCTION row_is_as_written(of_table regclass, row_key text) RETURNS boolean LANGUAGE sql STABLE AS $$
        SELECT coalesce(
          (SELECT m.mark FROM row_marks_by_key(of_table, ARRAY[row_key]) m) =
          (SELECT (array_agg(a.text::jsonb -> 'rows' -> c.relname::text ->> row_key ORDER BY a.seq DESC))[1]
             FROM pg_class c, audit_entries a
            WHERE c.oid = of_table AND audit_row_keys(a.text) @> ARRAY[c.relname || ' ' || row_key]), false)
      $$`)
    await markDrafts(q.manager)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
