import type { Db } from '../database/db.ts'
import { tableKinds } from '../database/table-kinds.ts'
import type { TableKind } from '../database/table-kinds.ts'

/** Written by the server for itself; they hold no facts. */
const withoutMarks = new Set(['migrations', 'audit_entries', 'sign_in_tries', 'record_requests'])
/** Changes with every sign-in and with how somebody likes to read, without an act in the trail. */
const changedWithoutAct = new Set(['people'])

const tablesOf = (kinds: readonly TableKind[]) =>
  Object.keys(tableKinds).filter((name) => kinds.includes(tableKinds[name] ?? 'plumbing'))

/** Rows of these are never changed. */
export const keptTables = tablesOf(['ledger', 'sealed']).filter((name) => !withoutMarks.has(name))
/** Rows of these change, and each change has its act and its mark: the newest counts. */
export const markedDrafts = tablesOf(['draft']).filter((name) => !changedWithoutAct.has(name))

const marked = new Set([...keptTables, ...markedDrafts])
const drafts = new Set(markedDrafts)

/** Whether the trail keeps marks of the rows of a table. */
export const isMarked = (table: string): boolean => marked.has(table)
export const isMarkedDraft = (table: string): boolean => drafts.has(table)

export interface MarkedTable {
  table: string
  /** The text of a row's primary key, as an expression over `t`. */
  keySql: string
  /** Column with the time of the record, where the table has one. */
  timeColumn: string | null
}

const times = ['recorded_at', 'signed_at', 'declared_at', 'confirmed_at', 'proposed_at']

/** Those of some tables that exist now; a migration may read them before the last of them is there. */
export async function readTables(db: Db, tables: readonly string[]): Promise<MarkedTable[]> {
  const rows: { table: string; key_sql: string; columns: string[] }[] = await db.query(
    `SELECT r.relname AS table,
            (SELECT 'concat_ws(''/'', ' || string_agg(format('t.%I', a.attname), ', ' ORDER BY a.attname COLLATE "C") || ')'
               FROM pg_index i JOIN pg_attribute a ON a.attrelid = i.indrelid AND a.attnum = ANY (i.indkey)
              WHERE i.indrelid = r.oid AND i.indisprimary) AS key_sql,
            (SELECT array_agg(a.attname::text) FROM pg_attribute a
              WHERE a.attrelid = r.oid AND a.attnum > 0 AND NOT a.attisdropped) AS columns
       FROM pg_class r JOIN pg_namespace s ON s.oid = r.relnamespace
      WHERE s.nspname = 'public' AND r.relkind = 'r' AND r.relname = ANY ($1)
      ORDER BY r.relname`,
    [[...tables]],
  )
  return rows.map(({ table, key_sql, columns }) => ({
    table,
    keySql: key_sql,
    timeColumn: (columns.includes('id') && times.find((name) => columns.includes(name))) || null,
  }))
}
