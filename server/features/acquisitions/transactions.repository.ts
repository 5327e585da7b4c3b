import { insertOnce } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { TransactionLine, TransactionRecord, TransactionVoid } from './transaction.entity.ts'

export function findTransaction(tx: Tx, id: string): Promise<TransactionRecord | null> {
  return tx.manager.findOneBy(TransactionRecord, { id })
}

export function findTransactionByNumber(tx: Tx, number: string): Promise<TransactionRecord | null> {
  return tx.manager.findOneBy(TransactionRecord, { number })
}

export function insertTransaction(tx: Tx, row: TransactionRecord): Promise<{ created: boolean }> {
  return insertOnce(tx, TransactionRecord, row, ['way', 'contentHash'])
}

export async function insertLine(tx: Tx, row: TransactionLine): Promise<void> {
  await tx.manager.insert(TransactionLine, row)
}

export function linesOf(tx: Tx, transactionId: string): Promise<TransactionLine[]> {
  return tx.manager.find(TransactionLine, { where: { transactionId }, order: { position: 'ASC' } })
}

export function isVoided(tx: Tx, transactionId: string): Promise<boolean> {
  return tx.manager.existsBy(TransactionVoid, { transactionId })
}

export async function insertTransactionVoid(tx: Tx, row: TransactionVoid): Promise<void> {
  await tx.manager.insert(TransactionVoid, row)
}

/** The first line of an animal's count ledger: the one its accession wrote. */
export async function firstEntryOf(tx: Tx, animalId: string): Promise<string> {
  const [row]: [{ id: string }] = await tx.manager.query(
    `SELECT e.id FROM count_entries e WHERE e.animal_id = $1 ORDER BY e.recorded_at, e.id LIMIT 1`,
    [animalId],
  )
  return row.id
}
