import type { Db } from '../database/db.ts'

/** The tables of those rows, each `[table, key]`, that are not what the program wrote, in the order given. */
export async function readChangedTables(
  db: Db,
  rows: readonly (readonly [table: string, key: string])[],
): Promise<string[]> {
  if (rows.length === 0) return []
  const changed: { name: string }[] = await db.query(
    `SELECT r.name FROM unnest($1::text[], $2::text[]) WITH ORDINALITY r (name, key, n)
      WHERE NOT row_is_as_written(r.name::regclass, r.key) ORDER BY r.n`,
    [rows.map(([table]) => table), rows.map(([, key]) => key)],
  )
  return changed.map(({ name }) => name)
}

/**
 * Whether everything that acts upon a subject ever wrote is there and as they wrote it: a row taken away, such as the
 * withdrawal of a volume, is seen only so.
 */
export async function isAsActedUpon(db: Db, kind: string, id: string): Promise<boolean> {
  const [found]: { changed: boolean }[] = await db.query(
    `SELECT EXISTS (
       SELECT 1 FROM audit_entries a
        CROSS JOIN LATERAL jsonb_each(coalesce(a.text::jsonb -> 'rows', '{}')) AS written (name, marks)
        CROSS JOIN LATERAL jsonb_object_keys(written.marks) AS key
        WHERE a.subject_kind = $1 AND a.subject_id = $2
          AND NOT row_is_as_written(to_regclass(written.name), key)) AS changed`,
    [kind, id],
  )
  return found?.changed === false
}
