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
