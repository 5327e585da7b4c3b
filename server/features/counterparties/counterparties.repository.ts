import { insertOnce, updateVersioned } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { CounterpartyRecord } from './counterparty.entity.ts'

export const counterpartyContent = [
  'name',
  'kind',
  'address',
  'registration',
  'email',
  'telephone',
  'note',
] as const
export type CounterpartyContent = Pick<CounterpartyRecord, (typeof counterpartyContent)[number]>

export function insertCounterparty(tx: Tx, row: CounterpartyRecord): Promise<{ created: boolean }> {
  return insertOnce(tx, CounterpartyRecord, row, counterpartyContent)
}

export function findCounterparty(tx: Tx, id: string): Promise<CounterpartyRecord | null> {
  return tx.manager.findOneBy(CounterpartyRecord, { id })
}

export function saveCounterparty(
  tx: Tx,
  key: { id: string; version: number },
  content: CounterpartyContent,
): Promise<void> {
  return updateVersioned(tx, CounterpartyRecord, key, content)
}
