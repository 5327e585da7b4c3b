import type { DataSource } from 'typeorm'
import { isMarked, isMarkedDraft, keptTables, markedDrafts, readTables } from './marked-tables.ts'
import { readMarks } from './row-marks.ts'
import type { RowMarks } from './row-marks.ts'

/** A row that is not what the audit trail saw written. */
export interface RowFault {
  /** Table and primary key of the row. */
  at: string
  what: 'changed' | 'missing' | 'not-by-the-program'
  /** The act that wrote it last, where the trail has one. */
  detail: string
}

export interface RowReport {
  rows: number
  faults: RowFault[]
}

interface Entry {
  seq: string
  action: string
  subject_label: string
  text: string
}

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

/** Those of a table's rows that are not as marked. */
async function compareWithMarks(
  db: DataSource,
  table: string,
  wanted: readonly Wanted[],
): Promise<RowFault[]> {
  const ids = wanted.map(({ id }) => id)
  const now = isMarked(table) ? await readMarks(db, table, ids) : {}
  return wanted
    .filter(({ id, mark }) => now[id] !== mark)
    .map(({ id, by }) => ({ at: `${table} ${id}`, what: now[id] ? 'changed' : 'missing', detail: by }))
}

/**
 * Compares every row of every marked table with the audit entry of the act that wrote it last: changed since, gone, or
 * put in by another hand, whatever time it bears.
 */
export async function verifyRows(dataSource: DataSource, pageSize = 2000): Promise<RowReport> {
  const faults: RowFault[] = []
  const marked = new Map<string, Set<string>>()
  /** Of rows that may change, the newest mark of each. */
  const newest = new Map<string, Map<string, Wanted>>()
  let rows = 0
  for (let seq = 0; ;) {
    const entries: Entry[] = await dataSource.query(
      `SELECT a.seq, a.action, a.subject_label, a.text FROM audit_entries a
        WHERE a.seq > $1 ORDER BY a.seq LIMIT $2`,
      [seq, pageSize],
    )
    const page = new Map<string, Wanted[]>()
    for (const entry of entries)
      for (const [table, marks] of Object.entries(marksIn(entry.text))) {
        const by = `entry ${entry.seq} of the audit trail, ${entry.action}, ${entry.subject_label}`
        for (const [id, mark] of Object.entries(marks)) listIn(page, table).push({ id, mark, by })
      }
    for (const [table, wanted] of page) {
      const ids = marked.get(table) ?? new Set<string>()
      marked.set(table, ids)
      for (const { id } of wanted) {
        if (!ids.has(id)) rows += 1
        ids.add(id)
      }
      if (isMarkedDraft(table)) {
        const last = newest.get(table) ?? new Map<string, Wanted>()
        newest.set(table, last)
        for (const one of wanted) last.set(one.id, one)
      } else faults.push(...(await compareWithMarks(dataSource, table, wanted)))
    }
    if (entries.length < pageSize) break
    seq = Number(entries.at(-1)?.seq)
  }
  for (const [table, last] of newest)
    faults.push(...(await compareWithMarks(dataSource, table, [...last.values()])))
  faults.push(...(await findStrangers(dataSource, marked)))
  return { rows, faults }
}

/** Rows that no act of the program wrote. */
async function findStrangers(
  dataSource: DataSource,
  marked: ReadonlyMap<string, ReadonlySet<string>>,
): Promise<RowFault[]> {
  const faults: RowFault[] = []
  for (const { table, keySql } of await readTables(dataSource, [...keptTables, ...markedDrafts])) {
    const rows: { key: string }[] = await dataSource.query(`SELECT ${keySql} AS key FROM ${table} t`)
    for (const { key } of rows)
      if (!marked.get(table)?.has(key))
        faults.push({ at: `${table} ${key}`, what: 'not-by-the-program', detail: 'no act wrote it' })
  }
  return faults
}
