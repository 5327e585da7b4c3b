import type { Counterparty } from '../../../shared/contracts/counterparties.contract.ts'
import type { CounterpartyReadRow } from './counterparties.reads.ts'

export function presentCounterparty(row: CounterpartyReadRow): Counterparty {
  return { ...row, transactions: Number(row.transactions) }
}
