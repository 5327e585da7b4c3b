import { containing } from '../../platform/database/like.ts'
import type { PermitMark } from '../../../shared/domain/register/judge-permit-use.ts'
import type { PermitKind } from '../../../shared/domain/register/permit-kinds.ts'
import { permitWarningDays } from '../../../shared/domain/register/permit-state.ts'
import type { PermitState } from '../../../shared/domain/register/permit-state.ts'
import type { Db } from '../../platform/database/db.ts'

export interface PermitReadRow {
  id: string
  number: string
  permit_number: string
  authority: string
  kind: PermitKind
  valid_from: string
  valid_until: string
  quantity_allowed: number | null
  purpose_code: string | null
  conditions: string | null
  counterparty_id: string | null
  counterparty_name: string | null
  used: string
  open_marks: string
  documents: string
  taxa: { id: string; commonName: string; scientificName: string }[]
  recorded_at: Date
  recorded_by_name: string | null
  voided_reason: string | null
  voided_at: Date | null
  voided_by_name: string | null
}

const live = `NOT EXISTS (SELECT 1 FROM transaction_voids tv WHERE tv.transaction_id = u.transaction_id)`
const from = `
  permits p
  LEFT JOIN counterparties c ON c.id = p.counterparty_id
  LEFT JOIN people w ON w.id = p.recorded_by
  LEFT JOIN permit_voids v ON v.permit_id = p.id
  LEFT JOIN people x ON x.id = v.recorded_by
  CROSS JOIN LATERAL (
    SELECT coalesce(sum(u.quantity), 0) AS used,
           count(*) FILTER (WHERE cardinality(u.marks) > 0 AND NOT EXISTS (
             SELECT 1 FROM permit_use_explanations e WHERE e.permit_use_id = u.id)) AS open_marks
      FROM permit_uses u WHERE u.permit_id = p.id AND ${live}) s`
const columns = `
  p.id, p.number, p.permit_number, p.authority, p.kind, p.valid_from::text, p.valid_until::text, p.quantity_allowed,
  p.purpose_code, p.conditions, p.counterparty_id, c.name AS counterparty_name, s.used, s.open_marks,
  (SELECT count(*) FROM documents d WHERE d.parent_kind = 'permit' AND d.parent_id = p.id
     AND NOT EXISTS (SELECT 1 FROM document_voids dv WHERE dv.document_id = d.id)) AS documents,
  coalesce((SELECT json_agg(json_build_object('id', t.id, 'commonName', t.common_name,
                                              'scientificName', t.scientific_name) ORDER BY lower(t.common_name))
              FROM permit_taxa pt JOIN taxa t ON t.id = pt.taxon_id WHERE pt.permit_id = p.id), '[]') AS taxa,
  p.recorded_at, w.printed_name AS recorded_by_name, v.reason AS voided_reason, v.recorded_at AS voided_at,
  x.printed_name AS voided_by_name`

/** As permitState in shared/domain/register, for filters; $2 is the day. */
const stateSql = `
  CASE WHEN v.id IS NOT NULL THEN 'void' WHEN $2::date < p.valid_from THEN 'not-yet'
       WHEN $2::date > p.valid_until THEN 'expired'
       WHEN $2::date >= p.valid_until - ${String(permitWarningDays)} THEN 'runs-out' ELSE 'valid' END`

export async function readPermit(db: Db, number: string): Promise<PermitReadRow | null> {
  const [row]: PermitReadRow[] = await db.query(`SELECT ${columns} FROM ${from} WHERE p.number = $1`, [
    number,
  ])
  return row ?? null
}

export interface PermitFilter {
  q?: string
  state?: PermitState
  kind?: PermitKind
  open?: 'yes'
  sort?: 'validUntil' | 'number' | 'authority' | 'remaining'
  direction?: 'asc' | 'desc'
  offset: number
  limit: number
}

const sortColumns = {
  validUntil: 'p.valid_until',
  number: 'p.number',
  authority: 'lower(p.authority)',
  remaining: 'p.quantity_allowed - s.used',
} as const

export async function readPermits(
  db: Db,
  on: string,
  filter: PermitFilter,
): Promise<{ rows: PermitReadRow[]; total: number }> {
  const where = `
    ($1::text IS NULL OR plain_text(p.number) LIKE plain_text($1) OR plain_text(p.permit_number) LIKE plain_text($1) OR plain_text(p.authority) LIKE plain_text($1) OR plain_text(c.name) LIKE plain_text($1)
      OR EXISTS (SELECT 1 FROM permit_taxa pt JOIN taxa t ON t.id = pt.taxon_id
                  WHERE pt.permit_id = p.id AND (plain_text(t.common_name) LIKE plain_text($1) OR plain_text(t.scientific_name) LIKE plain_text($1))))
    AND ($3::text IS NULL OR $3 = ${stateSql}) AND ($4::text IS NULL OR p.kind = $4)
    AND (NOT $5::boolean OR s.open_marks > 0) AND $2::date IS NOT NULL`
  const values = [containing(filter.q), on, filter.state ?? null, filter.kind ?? null, filter.open === 'yes']
  const order = `${sortColumns[filter.sort ?? 'validUntil']} ${filter.direction === 'desc' ? 'DESC' : 'ASC'} NULLS LAST, p.id`
  const rows: PermitReadRow[] = await db.query(
    `SELECT ${columns} FROM ${from} WHERE ${where} ORDER BY ${order} LIMIT $6 OFFSET $7`,
    [...values, filter.limit, filter.offset],
  )
  const [count]: { n: string }[] = await db.query(`SELECT count(*) AS n FROM ${from} WHERE ${where}`, values)
  return { rows, total: Number(count?.n ?? 0) }
}

export interface PermitUseReadRow {
  id: string
  transaction_number: string
  transaction_kind: string
  happened_text: string
  accession: string
  common_name: string
  quantity: number
  excess: number
  marks: PermitMark[]
  explained_reason: string | null
  explained_at: Date | null
  explained_by_name: string | null
  voided: boolean
  /** Animals taken under the permit up to and including this use, voided ones left out. */
  running: string
}

export function readPermitUses(db: Db, permitId: string): Promise<PermitUseReadRow[]> {
  return db.query(
    `SELECT u.id, t.number AS transaction_number, t.kind AS transaction_kind, t.happened_text, a.accession,
            x.common_name, u.quantity, u.excess, u.marks, e.reason AS explained_reason,
            e.recorded_at AS explained_at, w.printed_name AS explained_by_name, NOT ${live} AS voided,
            sum(u.quantity) FILTER (WHERE ${live}) OVER (ORDER BY t.happened_at, u.recorded_at, u.id) AS running
       FROM permit_uses u
       JOIN transactions t ON t.id = u.transaction_id
       JOIN transaction_lines l ON l.id = u.line_id
       JOIN animals a ON a.id = l.animal_id
       JOIN taxa x ON x.id = a.taxon_id
       LEFT JOIN permit_use_explanations e ON e.permit_use_id = u.id
       LEFT JOIN people w ON w.id = e.recorded_by
      WHERE u.permit_id = $1 ORDER BY t.happened_at, u.recorded_at, u.id`,
    [permitId],
  )
}
