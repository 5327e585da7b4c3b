import { EventSubscriber } from 'typeorm'
import type { EntityManager, EntitySubscriberInterface, InsertEvent, QueryRunner } from 'typeorm'
import { tableKinds } from './table-kinds.ts'

/** Ids by table, of append-only tables. */
export type Written = ReadonlyMap<string, ReadonlySet<string>>

const written = new WeakMap<QueryRunner, Map<string, Set<string>>>()

/** Rows of these tables are never changed, so that what was written can be compared with what stands, for ever. */
const isKept = (table: string) => tableKinds[table] === 'ledger' || tableKinds[table] === 'sealed'

/** Notes a row that a query of its own wrote; rows written through their entity are noted by themselves. */
export function noteWritten(runner: QueryRunner | undefined, table: string, id: string): void {
  if (!runner || !isKept(table)) return
  const tables = written.get(runner) ?? new Map<string, Set<string>>()
  const ids = tables.get(table) ?? new Set<string>()
  written.set(runner, tables.set(table, ids.add(id)))
}

/** What the transaction of a manager has written into append-only tables so far. */
export function writtenBy(manager: EntityManager): Written {
  return (manager.queryRunner && written.get(manager.queryRunner)) ?? new Map()
}

/** Hears of every row that is written through its entity, by whatever feature. */
@EventSubscriber()
export class WrittenRows implements EntitySubscriberInterface<{ id?: unknown }> {
  afterInsert({ queryRunner, metadata, entity }: InsertEvent<{ id?: unknown }>): void {
    if (typeof entity.id === 'string') noteWritten(queryRunner, metadata.tableName, entity.id)
  }
}
