import type { AuditEntry } from '../../../shared/contracts/audit.contract.ts'
import type { AuditRow } from './audit.reads.ts'

/** An entry as the reader may see it: clinical content is left out for people who may not read charts. */
export function presentAuditEntry(row: AuditRow, mayReadClinical: boolean): AuditEntry {
  const said = JSON.parse(row.text) as { before?: unknown; after?: unknown }
  const withheld = row.clinical && !mayReadClinical
  return {
    seq: Number(row.seq),
    at: row.happened_at.toISOString(),
    actorName: row.actor_name,
    action: row.action,
    subjectKind: row.subject_kind,
    subjectLabel: row.subject_label,
    withheld,
    before: withheld ? null : (said.before ?? null),
    after: withheld ? null : (said.after ?? null),
    hash: row.hash,
  }
}
