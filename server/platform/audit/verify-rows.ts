import type { DataSource } from 'typeorm'
import { tableKinds } from '../database/table-kinds.ts'
import { readMarks } from './row-marks.ts'
import type { RowMarks } from './row-marks.ts'

/** A row of an append-only table that is not what the audit trail saw written. */
export interface RowFault {
  /** Table and id of the row. */
  at: string
  what: 'changed' | 'missing' | 'not-by-the-program'
  /** The act that wrote it, where the trail has one. */
  detail: string
}

export interface RowReport {
  rows: number
  faults: RowFault[]
}

interface Entry {
  seq: string
  happened_at: Date
  action: string
  subject_label: string
  text: string
}

/** Written by the server for itself; they hold no facts. */
const withoutMarks = new Set(['migrations', 'audit_entries', 'sign_in_tries', 'record_requests'])
const keptTables = Object.entries(tableKinds)
  .filter(([name, kind]) => (kind === 'ledger' || kind === 'sealed') && !withoutMarks.has(name))
  .map(([name]) => name)

interface Wanted {
  id: string
  mark: string
  by: string
}

/** The list under a table, begun where there is none. */
function listIn(page: Map<string, Wanted[]>, table: string): Wanted[] {
  const list = page.get(table) ?? []
  page.set(table, list)
  return list
}

function marksIn(text: string): RowMarks {
  try {
    return (JSON.parse(text) as { rows?: RowMarks }).rows ?? {}
  } catch {
    return {} // the walk of the chain reports the entry itself
  }
}

/** The tables whose rows have an id and the time of their record, with the name of that column. */
async function readTimedTables(dataSource: DataSource): Promise<{ table: string; column: string }[]> {
  const rows: { table: string; columns: string[] }[] = await dataSource.query(
    `SELECT c.table_name AS table, array_agg(c.column_name::text) AS columns
       FROM information_schema.columns c
      WHERE c.table_schema = 'public' AND c.table_name = ANY ($1) GROUP BY c.table_name`,
    [keptTables],
  )
  const times = ['recorded_at', 'signed_at', 'declared_at', 'confirmed_at', 'proposed_at']
  return rows.flatMap(({ table, columns }) => {
    const column = times.find((name) => columns.includes(name))
    return columns.includes('id') && column ? [{ table, column }] : []
  })
}

/**
 * Compares every row of every append-only table with the audit entry of the act that wrote it: changed since, gone, or
 * put in by another hand. What was written before the trail kept marks of rows is left out.
 */
export async function verifyRows(dataSource: DataSource, pageSize = 2000): Promise<RowReport> {
  const faults: RowFault[] = []
  const marked = new Map<string, Set<string>>()
  let since: Date | null = null
  let rows = 0
  for (let seq = 0; ;) {
    const entries: Entry[] = await dataSource.query(
      `SELECT a.seq, a.happened_at, a.action, a.subject_label, a.text FROM audit_entries a
        WHERE a.seq > $1 ORDER BY a.seq LIMIT $2`,
      [seq, pageSize],
    )
    const page = new Map<string, Wanted[]>()
    for (const entry of entries)
      for (const [table, marks] of Object.entries(marksIn(entry.text))) {
        since ??= entry.happened_at
        const by = `entry ${entry.seq} of the audit trail, ${entry.action}, ${entry.subject_label}`
        for (const [id, mark] of Object.entries(marks)) listIn(page, table).push({ id, mark, by })
      }
    for (const [table, wanted] of page) {
      const isKnown = keptTables.includes(table)
      const now = isKnown
        ? await readMarks(
            dataSource,
            table,
            wanted.map(({ id }) => id),
          )
        : {}
      const ids = marked.get(table) ?? new Set<string>()
      marked.set(table, ids)
      for (const { id, mark, by } of wanted) {
        rows += 1
        ids.add(id)
        if (now[id] !== mark)
          faults.push({ at: `${table} ${id}`, what: now[id] ? 'changed' : 'missing', detail: by })
      }
    }
    if (entries.length < pageSize) break
    seq = Number(entries.at(-1)?.seq)
  }
  if (since) faults.push(...(await findStrangers(dataSource, marked, since)))
  return { rows, faults }
}

/** Rows that no act of the program wrote, though the trail kept marks by then. */
async function findStrangers(
  dataSource: DataSource,
  marked: ReadonlyMap<string, ReadonlySet<string>>,
  since: Date,
): Promise<RowFault[]> {
  const faults: RowFault[] = []
  for (const { table, column } of await readTimedTables(dataSource)) {
    const rows: { id: string }[] = await dataSource.query(
      `SELECT t.id FROM ${table} t WHERE t.${column} >= $1`,
      [since],
    )
    for (const { id } of rows)
      if (!marked.get(table)?.has(id))
        faults.push({ at: `${table} ${id}`, what: 'not-by-the-program', detail: 'no act wrote it' })
  }
  return faults
}
