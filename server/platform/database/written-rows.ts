import { EventSubscriber } from 'typeorm'
import type { EntityManager, EntitySubscriberInterface, InsertEvent, QueryRunner } from 'typeorm'
import { isMarked } from '../audit/marked-tables.ts'

/** Primary keys by table. */
export type Written = ReadonlyMap<string, ReadonlySet<string>>

interface Notes {
  /** Since the last act took its own. */
  fresh: Map<string, Set<string>>
  /** `table key` of everything that the transaction wrote. */
  all: Set<string>
}

const notes = new WeakMap<QueryRunner, Notes>()

function notesOf(runner: QueryRunner): Notes {
  const found = notes.get(runner) ?? { fresh: new Map(), all: new Set() }
  notes.set(runner, found)
  return found
}

/** Notes a row that a query of its own wrote; rows put in through their entity are noted by themselves. */
export function noteWritten(runner: QueryRunner | undefined, table: string, key: string): void {
  if (!runner || !isMarked(table)) return
  const { fresh, all } = notesOf(runner)
  fresh.set(table, (fresh.get(table) ?? new Set()).add(key))
  all.add(`${table} ${key}`)
}

/** What the transaction of a manager wrote since this was asked last. */
export function takeWritten(manager: EntityManager): Written {
  if (!manager.queryRunner) return new Map()
  const found = notesOf(manager.queryRunner)
  const { fresh } = found
  found.fresh = new Map()
  return fresh
}

/**
 * Notes a row that is about to be changed. One that another hand changed before gets no new mark: what an act does with
 * it afterwards does not make it what somebody entered.
 */
export async function noteChange(manager: EntityManager, table: string, key: string): Promise<void> {
  const runner = manager.queryRunner
  if (!runner || !isMarked(table)) return
  if (!notesOf(runner).all.has(`${table} ${key}`)) {
    const [row]: { is_as_written: boolean }[] = await manager.query(
      'SELECT row_is_as_written($1::regclass, $2) AS is_as_written',
      [table, key],
    )
    if (!row?.is_as_written) return
  }
  noteWritten(runner, table, key)
}

/** Hears of every row that is put in through its entity, by whatever feature. */
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
