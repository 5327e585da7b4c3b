import { containing } from '../../platform/database/like.ts'
import type { Db } from '../../platform/database/db.ts'

export interface AuditRow {
  seq: string
  happened_at: Date
  actor_id: string | null
  actor_name: string
  action: string
  subject_kind: string
  subject_label: string
  clinical: boolean
  text: string
  hash: string
}

/** Which part of the trail a reader may see. */
export interface AuditScope {
  /** Only entries of this person, besides clinical ones where `clinical` is set; null: everybody's */
  ownOf: string | null
  clinical: boolean
}

export interface AuditFilter {
  q?: string
  subjectKind?: string
  subjectId?: string
  before: number | null
  limit: number
}

/** A page of the trail, the newest first, and how many entries match in all. */
export async function readAudit(
  db: Db,
  scope: AuditScope,
  filter: AuditFilter,
): Promise<{ rows: AuditRow[]; total: number }> {
  const values = [
    scope.ownOf,
    scope.clinical,
    containing(filter.q),
    filter.subjectKind ?? null,
    filter.subjectId ?? null,
  ]
  const where = `
    ($1::uuid IS NULL OR a.actor_id = $1 OR ($2 AND a.clinical))
    AND ($3::text IS NULL OR plain_text(a.actor_name) LIKE plain_text($3) OR plain_text(a.action) LIKE plain_text($3) OR plain_text(a.subject_label) LIKE plain_text($3))
    AND ($4::text IS NULL OR a.subject_kind = $4) AND ($5::text IS NULL OR a.subject_id = $5)`
  const rows: AuditRow[] = await db.query(
    `SELECT a.seq, a.happened_at, a.actor_id, a.actor_name, a.action, a.subject_kind, a.subject_label, a.clinical,
            a.text, a.hash
       FROM audit_entries a WHERE ${where} AND ($6::bigint IS NULL OR a.seq < $6)
      ORDER BY a.seq DESC LIMIT $7`,
    [...values, filter.before, filter.limit],
  )
  const [count]: { n: string }[] = await db.query(
    `SELECT count(*) AS n FROM audit_entries a WHERE ${where}`,
    values,
  )
  return { rows, total: Number(count?.n ?? 0) }
}
