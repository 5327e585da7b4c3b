import type { MigrationInterface, QueryRunner } from 'typeorm'
import { markOlderRows } from '../platform/audit/mark-older-rows.ts'

/**
 * Marks of rows by the text of their primary key, so that rows without an id of their own have one too; and the marks of
 * everything that was written before the trail kept any. The function of 0032 stays for a program that still runs.
 */
export class MarksByKey1764600000035 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE FUNCTION row_marks_by_key(of_table regclass, keys text[]) RETURNS TABLE (key text, mark text)
        LANGUAGE plpgsql STABLE SET timezone = 'UTC' SET datestyle = 'ISO' SET extra_float_digits = 1 AS $$
      DECLARE
        key_of text;
        matches text;
      BEGIN
        -- columns by name, so that the key stays the same however the table declares them
        SELECT 'concat_ws(''/'', ' || string_agg(format('t.%I', c.name), ', ' ORDER BY c.n) || ')',
               string_agg(format('t.%I = split_part(k.key, ''/'', %s)::%s', c.name, c.n, c.type), ' AND ' ORDER BY c.n)
          INTO key_of, matches
          FROM (SELECT a.attname AS name, format_type(a.atttypid, a.atttypmod) AS type,
                       row_number() OVER (ORDER BY a.attname COLLATE "C") AS n
                  FROM pg_index i JOIN pg_attribute a ON a.attrelid = i.indrelid AND a.attnum = ANY (i.indkey)
                 WHERE i.indrelid = of_table AND i.indisprimary) c;
        RETURN QUERY EXECUTE format(
          'SELECT %s, encode(sha256(convert_to(jsonb_strip_nulls(to_jsonb(t.*))::text, ''UTF8'')), ''hex'')
             FROM unnest($1) k (key) JOIN %s t ON %s', key_of, of_table, matches) USING keys;
      END $$`)
    await markOlderRows(q.manager)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
