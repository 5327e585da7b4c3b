import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * The same answer as the function of 0037, through the index: joined to the catalogue, the trail was read from end to
 * end for each row. A plan made while the trail is short must not do so either, so reading it whole is ruled out.
 */
export class RowMarkLookup1764600000040 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE OR REPLACE FUNCTION row_is_as_written(of_table regclass, row_key text) RETURNS boolean
        LANGUAGE plpgsql STABLE SET enable_seqscan = off AS $$
      DECLARE
        table_name text := (SELECT c.relname FROM pg_class c WHERE c.oid = of_table);
        wanted text[] := ARRAY[table_name || ' ' || row_key];
        newest text;
      BEGIN
        SELECT (array_agg(a.text::jsonb -> 'rows' -> table_name ->> row_key ORDER BY a.seq DESC))[1] INTO newest
          FROM audit_entries a WHERE audit_row_keys(a.text) @> wanted;
        RETURN coalesce((SELECT m.mark = newest FROM row_marks_by_key(of_table, ARRAY[row_key]) m), false);
      END $$`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
