import type { DataSource } from 'typeorm'
import type { Clock } from './clock.ts'
import type { Transactions } from './database/transactions.ts'
import type { Ids } from './ids.ts'
import type { Log } from './log.ts'

/** What every feature is made from. */
export interface Parts {
  dataSource: DataSource
  transactions: Transactions
  clock: Clock
  ids: Ids
  log: Log
}
