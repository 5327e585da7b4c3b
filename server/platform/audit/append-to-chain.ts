import { createHash } from 'node:crypto'
import type { EntityManager } from 'typeorm'
import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import type { RequestContext } from '../http/request-context.ts'
import type { RowMarks } from './row-marks.ts'

/** What a service notes about a change; actor, time and place in the chain are added when the transaction ends. */
export interface AuditDraft {
  /** noun.verb of what was done, for example `person.enter` */
  action: string
  subject: { kind: string; id: string; label: string }
  before?: Json
  after?: Json
  /** Holds clinical text, which people who may not read charts do not see. */
  clinical?: boolean
}

/** A draft with the marks of the rows that its act wrote. */
export interface AuditEntry extends AuditDraft {
  rows?: RowMarks | undefined
}

/** Key of the advisory lock that puts the entries of all transactions in one line. */
export const chainLock = 4400_0001
export const chainStart = '0'.repeat(64)

/** The hash of an entry covers its text and the hash of the entry before. */
export function chainHash(previousHash: string, text: string): string {
  return createHash('sha256').update(previousHash).update('\n').update(text).digest('hex')
}

/** Appends the entries of a transaction; the last thing it does, so that the lock is held for milliseconds. */
export async function appendToChain(
  manager: EntityManager,
  change: { context: RequestContext; at: Date; entries: readonly AuditEntry[] },
): Promise<void> {
  if (change.entries.length === 0) return
  await manager.query('SELECT pg_advisory_xact_lock($1)', [chainLock])
  const [last]: { seq: string; hash: string }[] = await manager.query(
    'SELECT a.seq, a.hash FROM audit_entries a ORDER BY a.seq DESC LIMIT 1',
  )
  let seq = Number(last?.seq ?? 0)
  let previousHash = last?.hash ?? chainStart
  for (const entry of change.entries) {
    seq += 1
    const { actor, requestId } = change.context
    const text = canonicalJson({
      seq,
      at: change.at.toISOString(),
      actor: { id: actor.personId, name: actor.printedName },
      action: entry.action,
      subject: entry.subject,
      before: entry.before,
      after: entry.after,
      clinical: entry.clinical ?? false,
      requestId,
      rows: entry.rows,
    })
    const hash = chainHash(previousHash, text)
    await manager.query(
      `INSERT INTO audit_entries
         (seq, happened_at, actor_id, actor_name, action, subject_kind, subject_id, subject_label, clinical, text,
          previous_hash, hash)
       VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12)`,
      [
        seq,
        change.at,
        actor.personId,
        actor.printedName,
        entry.action,
        entry.subject.kind,
        entry.subject.id,
        entry.subject.label,
        entry.clinical ?? false,
        text,
        previousHash,
        hash,
      ],
    )
    previousHash = hash
  }
}
