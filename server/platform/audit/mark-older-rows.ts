import type { EntityManager } from 'typeorm'
import { installation } from '../http/request-context.ts'
import { appendToChain } from './append-to-chain.ts'
import { keptTables, markedDrafts, readTables } from './marked-tables.ts'
import { readMarks } from './row-marks.ts'

/** So many marks stand in one entry of the trail. */
const marksInEntry = 500

/** When the first entry with marks was written; from then on rows with an id and a time have theirs from their act. */
async function readMarkedSince(manager: EntityManager): Promise<Date | null> {
  const [first]: { happened_at: Date }[] = await manager.query(
    `SELECT a.happened_at FROM audit_entries a WHERE a.text::jsonb ? 'rows' ORDER BY a.seq LIMIT 1`,
  )
  return first?.happened_at ?? null
}

/** Puts the marks of some rows of a table as they stand into the trail. */
async function markRows(manager: EntityManager, table: string, keys: readonly string[]): Promise<void> {
  for (let from = 0; from < keys.length; from += marksInEntry) {
    const some = keys.slice(from, from + marksInEntry)
    await appendToChain(manager, {
      context: { actor: installation, requestId: 'mark-older-rows' },
      at: new Date(),
      entries: [
        {
          action: 'audit.mark-older-rows',
          subject: { kind: 'table', id: table, label: table },
          after: { rows: some.length },
          rows: { [table]: await readMarks(manager, table, some) },
        },
      ],
    })
  }
}

/**
 * Puts the marks of rows that were there before the trail kept any into it, once, so that from then on every row is
 * known and one that is put in with an old time is not. A row that an act should have marked, and none did, stays
 * without.
 */
export async function markOlderRows(manager: EntityManager): Promise<void> {
  const since = await readMarkedSince(manager)
  for (const { table, keySql, timeColumn } of await readTables(manager, keptTables)) {
    const isOlder = timeColumn === null || since === null ? '' : `WHERE t.${timeColumn} < $1`
    const rows: { key: string }[] = await manager.query(
      `SELECT ${keySql} AS key FROM ${table} t ${isOlder} ORDER BY 1`,
      isOlder === '' ? [] : [since],
    )
    await markRows(
      manager,
      table,
      rows.map(({ key }) => key),
    )
  }
}

/** The same of every row that may change, as it stands: from then on each change has a mark of its own. */
export async function markDrafts(manager: EntityManager): Promise<void> {
  for (const { table, keySql } of await readTables(manager, markedDrafts)) {
    const rows: { key: string }[] = await manager.query(`SELECT ${keySql} AS key FROM ${table} t ORDER BY 1`)
    await markRows(
      manager,
      table,
      rows.map(({ key }) => key),
    )
  }
}
