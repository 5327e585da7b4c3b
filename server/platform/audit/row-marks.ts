import type { EntityManager } from 'typeorm'
import type { Db } from '../database/db.ts'
import type { Written } from '../database/written-rows.ts'

/** Table → text of the primary key → hash over the row as it was written. */
export type RowMarks = Record<string, Record<string, string>>

/** The hashes of rows as they stand now; rows that are gone are left out. */
export async function readMarks(
  db: Db,
  table: string,
  keys: readonly string[],
): Promise<Record<string, string>> {
  const rows: { key: string; mark: string }[] = await db.query(
    'SELECT m.key, m.mark FROM row_marks_by_key($1::regclass, $2::text[]) m ORDER BY m.key',
    [table, [...keys]],
  )
  return Object.fromEntries(rows.map(({ key, mark }) => [key, mark]))
}

/**
 * The marks of what each act of a transaction wrote, as it stands at the end of it. They go into the audit trail with the
 * act itself: a row that is changed, taken away or put in later, by whatever hand, differs from them.
 */
export async function marksOfWritten(
  manager: EntityManager,
  acts: readonly Written[],
): Promise<(RowMarks | undefined)[]> {
  const all: RowMarks = {}
  for (const table of new Set(acts.flatMap((written) => [...written.keys()]))) {
    const keys = new Set(acts.flatMap((written) => [...(written.get(table) ?? [])]))
    all[table] = await readMarks(manager, table, [...keys])
  }
  const marksOf = (table: string, keys: ReadonlySet<string>) =>
    Object.fromEntries(Object.entries(all[table] ?? {}).filter(([key]) => keys.has(key)))
  return acts.map((written) =>
    written.size === 0
      ? undefined
      : Object.fromEntries([...written].map(([table, keys]) => [table, marksOf(table, keys)])),
  )
}
