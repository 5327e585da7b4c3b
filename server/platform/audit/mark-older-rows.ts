import type { EntityManager } from 'typeorm'
import { installation } from '../http/request-context.ts'
import { appendToChain } from './append-to-chain.ts'
import { readKeptTables } from './kept-tables.ts'
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

/**
 * Puts the marks of rows that were there before the trail kept any into it, once, so that from then on every row is
 * known and one that is put in with an old time is not. A row that an act should have marked, and none did, stays
 * without.
 */
export async function markOlderRows(manager: EntityManager): Promise<void> {
  const since = await readMarkedSince(manager)
  const change = { context: { actor: installation, requestId: 'mark-older-rows' }, at: new Date() }
  for (const { table, keySql, timeColumn } of await readKeptTables(manager)) {
    const isOlder = timeColumn === null || since === null ? '' : `WHERE t.${timeColumn} < $1`
    const rows: { key: string }[] = await manager.query(
      `SELECT ${keySql} AS key FROM ${table} t ${isOlder} ORDER BY 1`,
      isOlder === '' ? [] : [since],
    )
    for (let from = 0; from < rows.length; from += marksInEntry) {
      const keys = rows.slice(from, from + marksInEntry).map(({ key }) => key)
      await appendToChain(manager, {
        ...change,
        entries: [
          {
            action: 'audit.mark-older-rows',
            subject: { kind: 'table', id: table, label: table },
            after: { rows: keys.length },
          },
        ],
        rows: { [table]: await readMarks(manager, table, keys) },
      })
    }
  }
}
