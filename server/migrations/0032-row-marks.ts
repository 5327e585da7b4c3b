import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * The mark of a stored row: a hash over every value in it, which the audit trail keeps beside the act that wrote it.
 * Empty columns are left out, so that a column added later leaves the marks as they are.
 */
export class RowMarks1764600000032 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE FUNCTION row_marks(of_table regclass, ids uuid[]) RETURNS TABLE (id uuid, mark text)
        LANGUAGE plpgsql STABLE SET timezone = 'UTC' SET datestyle = 'ISO' SET extra_float_digits = 1 AS $$
      BEGIN
        RETURN QUERY EXECUTE format(
          'SELECT t.id, encode(sha256(convert_to(jsonb_strip_nulls(to_jsonb(t.*))::text, ''UTF8'')), ''hex'')
             FROM %s t WHERE t.id = ANY ($1)', of_table) USING ids;
      END $$`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
