import type { TransactionKind } from '../../../shared/domain/register/transaction-kinds.ts'
import type { Db } from '../../platform/database/db.ts'

export interface UnfinishedTransactionRow {
  number: string
  kind: TransactionKind
  way: 'in' | 'out'
  counterparty_name: string | null
  happened_at: Date
  happened_on: string
  /** Marks of permit uses that nobody has explained. */
  open_marks: number
  documents: number
  accession: string | null
  common_name: string | null
}

/** Transactions with another party that have no paper, and those with open permit marks; the oldest first. */
export function readUnfinishedTransactions(db: Db, limit: number): Promise<UnfinishedTransactionRow[]> {
  return db.query(
    `SELECT t.number, t.kind, t.way, c.name AS counterparty_name, t.happened_at, t.happened_on::text, m.open_marks,
            m.documents, f.accession, f.common_name
       FROM transactions t
       LEFT JOIN counterparties c ON c.id = t.counterparty_id
       CROSS JOIN LATERAL (
         SELECT (SELECT count(*)::int FROM permit_uses u
                  WHERE u.transaction_id = t.id AND cardinality(u.marks) > 0
                    AND NOT EXISTS (SELECT 1 FROM permit_use_explanations x WHERE x.permit_use_id = u.id)) AS open_marks,
                (SELECT count(*)::int FROM documents d
                  WHERE d.parent_kind = 'transaction' AND d.parent_id = t.id
                    AND NOT EXISTS (SELECT 1 FROM document_voids v WHERE v.document_id = d.id)) AS documents) m
       LEFT JOIN LATERAL (
         SELECT a.accession, x.common_name
           FROM transaction_lines l JOIN animals a ON a.id = l.animal_id JOIN taxa x ON x.id = a.taxon_id
          WHERE l.transaction_id = t.id ORDER BY l.position LIMIT 1) f ON true
      WHERE NOT EXISTS (SELECT 1 FROM transaction_voids v WHERE v.transaction_id = t.id)
        AND (m.open_marks > 0 OR (t.counterparty_id IS NOT NULL AND m.documents = 0))
      ORDER BY t.happened_at, t.number LIMIT $1`,
    [limit],
  )
}
