import type { DataSource, EntityManager } from 'typeorm'

/** Something to read from: the pool, or the transaction under way. */
export type Db = DataSource | EntityManager
