import { EventSubscriber } from 'typeorm'
import type { EntityManager, EntitySubscriberInterface, InsertEvent, QueryRunner } from 'typeorm'
import { tableKinds } from './table-kinds.ts'

/** Primary keys by table, of append-only tables. */
export type Written = ReadonlyMap<string, ReadonlySet<string>>

const written = new WeakMap<QueryRunner, Map<string, Set<string>>>()

/** Rows of these tables are never changed, so that what was written can be compared with what stands, for ever. */
const isKept = (table: string) => tableKinds[table] === 'ledger' || tableKinds[table] === 'sealed'

/** Notes a row that a query of its own wrote; rows written through their entity are noted by themselves. */
export function noteWritten(runner: QueryRunner | undefined, table: string, key: string): void {
  if (!runner || !isKept(table)) return
  const tables = written.get(runner) ?? new Map<string, Set<string>>()
  const keys = tables.get(table) ?? new Set<string>()
  written.set(runner, tables.set(table, keys.add(key)))
}

/** What the transaction of a manager has written into append-only tables so far. */
export function writtenBy(manager: EntityManager): Written {
  return (manager.queryRunner && written.get(manager.queryRunner)) ?? new Map()
}

/** Hears of every row that is written through its entity, by whatever feature. */
@EventSubscriber()
export class WrittenRows implements EntitySubscriberInterface<Record<string, unknown>> {
  afterInsert({ queryRunner, metadata, entity }: InsertEvent<Record<string, unknown>>): void {
    // the columns of the key by name, as the database puts them together
    const columns = [...metadata.primaryColumns].sort((a, b) => (a.databaseName < b.databaseName ? -1 : 1))
    const values = columns.map(({ propertyName }) => entity[propertyName])
    if (values.every((value) => typeof value === 'string'))
      noteWritten(queryRunner, metadata.tableName, values.join('/'))
  }
}
