import { AsyncLocalStorage } from 'node:async_hooks'
import type pg from 'pg'
import { DataSource } from 'typeorm'
import type { EntityTarget, ObjectLiteral, QueryRunner, Repository } from 'typeorm'

const current = new AsyncLocalStorage<QueryRunner>()

/** Runs the work of a transaction: until it ends, everything it asks goes over this connection. */
export const withinTransaction = <T>(runner: QueryRunner, work: () => Promise<T>): Promise<T> =>
  current.run(runner, work)

export const isWithinTransaction = (): boolean => current.getStore() !== undefined

/**
 * The pool, but for what a transaction reads through it: that goes over the transaction's own connection. Over another
 * it would be read outside the transaction's locks and without its changes; worse, as many transactions as there are
 * connections would wait for one another without end, and with them everybody.
 */
export class OneConnectionSource extends DataSource {
  override query<T = unknown>(
    text: string,
    values?: unknown[] | ObjectLiteral,
    runner: QueryRunner | undefined = current.getStore(),
  ): Promise<T> {
    return super.query(text, values as unknown[], runner)
  }

  override getRepository<Entity extends ObjectLiteral>(target: EntityTarget<Entity>): Repository<Entity> {
    return (current.getStore()?.manager ?? this.manager).getRepository(target)
  }
}

/** Refuses a transaction a second connection, so that what still asks for one is found by its first test. */
export function guardPool(pool: pg.Pool): void {
  const connect = pool.connect.bind(pool) as (...args: unknown[]) => unknown
  pool.connect = ((...args: unknown[]) => {
    if (isWithinTransaction()) throw new Error('A transaction asked for a second connection.')
    return connect(...args)
  }) as typeof pool.connect
}
