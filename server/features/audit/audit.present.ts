import type { AuditEntry } from '../../../shared/contracts/audit.contract.ts'
import { amountFacts } from '../animals/index.ts'
import type { AuditRow } from './audit.reads.ts'

/** What of an entry its reader is not to see. */
export interface LeftOut {
  /** Clinical content: they may not read charts. */
  clinical: boolean
  /** The amount of a dose: they may still calculate one of its order blind. */
  amount: boolean
  /** What was asked on the bench: the amount can be had from it. */
  bench: boolean
}

/** Entries of doses: what was worked out, given, recorded, struck out. */
export const isOfDose = ({ subject_kind, action }: AuditRow): boolean =>
  subject_kind === 'order' && action.startsWith('dose.')

/** The order whose amount an entry names: that of a dose, or of a discrepancy that a dose opened. */
export function orderNamedBy(row: AuditRow): string | null {
  if (isOfDose(row)) return row.subject_label
  if (!row.action.startsWith('discrepancy.')) return null
  const { before, after } = JSON.parse(row.text) as { before?: Facts | null; after?: Facts | null }
  const order = after?.['order'] ?? before?.['order']
  return typeof order === 'string' ? order : null
}

/** The order that an entry keeps a draft of. */
export const orderDraftedBy = ({ subject_kind, action, subject_label }: AuditRow): string | null =>
  subject_kind === 'order' && (action === 'order.draft' || action === 'order.revise-draft')
    ? subject_label
    : null

type Facts = Record<string, unknown>
const amounts = ['amount', ...amountFacts]

function without(names: readonly string[], said: unknown): unknown {
  if (typeof said !== 'object' || said === null) return said ?? null
  return Object.fromEntries(Object.entries(said).filter(([name]) => !names.includes(name)))
}

/** An entry as the reader may see it. */
export function presentAuditEntry(row: AuditRow, leftOut: LeftOut): AuditEntry {
  const said = JSON.parse(row.text) as { before?: unknown; after?: unknown }
  const withheld = row.clinical && leftOut.clinical
  const names = [...(leftOut.amount ? amounts : []), ...(leftOut.bench ? ['bench'] : [])]
  const shown = (part: unknown) => without(names, part)
  return {
    seq: Number(row.seq),
    at: row.happened_at.toISOString(),
    actorName: row.actor_name,
    action: row.action,
    subjectKind: row.subject_kind,
    subjectLabel: row.subject_label,
    withheld,
    amountLeftOut: (leftOut.amount || leftOut.bench) && !withheld,
    before: withheld ? null : shown(said.before),
    after: withheld ? null : shown(said.after),
    hash: row.hash,
  }
}
