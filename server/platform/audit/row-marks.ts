import type { EntityManager } from 'typeorm'
import type { Db } from '../database/db.ts'
import { writtenBy } from '../database/written-rows.ts'

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
 * The marks of everything that a transaction wrote into append-only tables. They go into the audit trail with the act
 * itself: a row that is changed, taken away or put in later, by whatever hand, differs from them.
 */
export async function marksOfWritten(manager: EntityManager): Promise<RowMarks | null> {
  const marks: RowMarks = {}
  for (const [table, keys] of writtenBy(manager)) marks[table] = await readMarks(manager, table, [...keys])
  return Object.keys(marks).length === 0 ? null : marks
}
