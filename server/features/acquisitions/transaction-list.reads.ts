import { containing } from '../../platform/database/like.ts'
import type { TransactionKind } from '../../../shared/domain/register/transaction-kinds.ts'
import type { Db } from '../../platform/database/db.ts'

export interface TransactionListRow {
  id: string
  number: string
  way: 'in' | 'out'
  kind: TransactionKind
  happened_text: string
  counterparty_name: string | null
  reference: string | null
  animals: { accession: string; commonName: string; count: number }[]
  lines: string
  count: string
  permits: string
  documents: string
  open_marks: string
  voided: boolean
  recorded_at: Date
}

export interface TransactionFilter {
  q?: string
  way?: 'in' | 'out'
  kind?: TransactionKind
  voided?: 'yes' | 'no'
  open?: 'yes'
  animalId?: string
  from?: string
  until?: string
  sort?: 'date' | 'number' | 'counterparty' | 'count'
  direction?: 'asc' | 'desc'
  offset: number
  limit: number
}

const from = `
  transactions t
  LEFT JOIN counterparties c ON c.id = t.counterparty_id
  CROSS JOIN LATERAL (
    SELECT count(*) AS lines, coalesce(sum(l.count), 0) AS count
      FROM transaction_lines l WHERE l.transaction_id = t.id) s
  CROSS JOIN LATERAL (
    SELECT count(DISTINCT u.permit_id) AS permits,
           count(*) FILTER (WHERE cardinality(u.marks) > 0 AND NOT EXISTS (
             SELECT 1 FROM permit_use_explanations e WHERE e.permit_use_id = u.id)) AS open_marks
      FROM permit_uses u WHERE u.transaction_id = t.id) m
  CROSS JOIN LATERAL (
    SELECT EXISTS (SELECT 1 FROM transaction_voids v WHERE v.transaction_id = t.id) AS voided) o`

const columns = `
  t.id, t.number, t.way, t.kind, t.happened_text, c.name AS counterparty_name, t.reference, s.lines, s.count, m.permits,
  CASE WHEN o.voided THEN 0 ELSE m.open_marks END AS open_marks, o.voided, t.recorded_at,
  (SELECT count(*) FROM documents d WHERE d.parent_kind = 'transaction' AND d.parent_id = t.id
     AND NOT EXISTS (SELECT 1 FROM document_voids dv WHERE dv.document_id = d.id)) AS documents,
  (SELECT json_agg(json_build_object('accession', f.accession, 'commonName', f.common_name, 'count', f.count)
                   ORDER BY f.position)
     FROM (SELECT l.position, l.count, a.accession, x.common_name
             FROM transaction_lines l JOIN animals a ON a.id = l.animal_id JOIN taxa x ON x.id = a.taxon_id
            WHERE l.transaction_id = t.id ORDER BY l.position LIMIT 3) f) AS animals`

const where = `
  ($1::text IS NULL OR plain_text(t.number) LIKE plain_text($1) OR plain_text(t.reference) LIKE plain_text($1) OR plain_text(c.name) LIKE plain_text($1) OR plain_text(t.place) LIKE plain_text($1)
    OR EXISTS (SELECT 1 FROM transaction_lines l JOIN animals a ON a.id = l.animal_id JOIN taxa x ON x.id = a.taxon_id
                WHERE l.transaction_id = t.id
                  AND (plain_text(a.accession) LIKE plain_text($1) OR plain_text(a.name) LIKE plain_text($1) OR plain_text(x.common_name) LIKE plain_text($1)
                       OR plain_text(x.scientific_name) LIKE plain_text($1))))
  AND ($2::text IS NULL OR t.way = $2) AND ($3::text IS NULL OR t.kind = $3)
  AND ($4::boolean IS NULL OR o.voided = $4) AND (NOT $5::boolean OR (m.open_marks > 0 AND NOT o.voided))
  AND ($6::uuid IS NULL OR EXISTS (
    SELECT 1 FROM transaction_lines l WHERE l.transaction_id = t.id AND l.animal_id = $6))
  AND ($7::date IS NULL OR t.happened_on >= $7) AND ($8::date IS NULL OR t.happened_on <= $8)`

const sortColumns = {
  date: 't.happened_at',
  number: 't.number',
  counterparty: 'lower(c.name)',
  count: 's.count',
} as const

/** A page of transactions, the newest first unless told. */
export async function readTransactions(
  db: Db,
  filter: TransactionFilter,
): Promise<{ rows: TransactionListRow[]; total: number }> {
  const values = [
    containing(filter.q),
    filter.way ?? null,
    filter.kind ?? null,
    filter.voided === undefined ? null : filter.voided === 'yes',
    filter.open === 'yes',
    filter.animalId ?? null,
    filter.from ?? null,
    filter.until ?? null,
  ]
  const sort = filter.sort ?? 'date'
  const direction = filter.direction ?? (filter.sort ? 'asc' : 'desc')
  const rows: TransactionListRow[] = await db.query(
    `SELECT ${columns} FROM ${from} WHERE ${where}
      ORDER BY ${sortColumns[sort]} ${direction === 'desc' ? 'DESC' : 'ASC'} NULLS LAST, t.number ${
        direction === 'desc' ? 'DESC' : 'ASC'
      } LIMIT $9 OFFSET $10`,
    [...values, filter.limit, filter.offset],
  )
  const [count]: { n: string }[] = await db.query(`SELECT count(*) AS n FROM ${from} WHERE ${where}`, values)
  return { rows, total: Number(count?.n ?? 0) }
}
