import type { EntityTarget, ObjectLiteral } from 'typeorm'
import { insertManyOnce, insertOnce, updateVersioned } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Reading, WaterEvent, WaterRangeRecord } from './measurement.entity.ts'
import { IsolationBody, IsolationEnd, IsolationRecord, IsolationTest } from './volume.entity.ts'
import {
  ConnectionRecord,
  ConnectionStateRecord,
  LifeSupportState,
  LifeSupportUnit,
  WaterVoid,
} from './water.entity.ts'

type Created = Promise<{ created: boolean }>

export function insertConnection(tx: Tx, row: ConnectionRecord): Created {
  return insertOnce(tx, ConnectionRecord, row, ['code', 'name', 'kind', 'fromBodyId', 'toBodyId'])
}

export function insertConnectionState(tx: Tx, row: ConnectionStateRecord): Created {
  return insertOnce(tx, ConnectionStateRecord, row, ['connectionId', 'open', 'happenedAt', 'note'])
}

export function insertLifeSupport(tx: Tx, row: LifeSupportUnit): Created {
  return insertOnce(tx, LifeSupportUnit, row, ['code', 'name', 'kind', 'waterBodyId'])
}

export function insertLifeSupportState(tx: Tx, row: LifeSupportState): Created {
  return insertOnce(tx, LifeSupportState, row, ['unitId', 'isOn', 'happenedAt', 'note'])
}

const locked = <T extends ObjectLiteral>(tx: Tx, target: EntityTarget<T>, id: string): Promise<T | null> =>
  tx.manager.findOne(target, { where: { id } as never, lock: { mode: 'pessimistic_write' } })

/** The valve's or pump's row, locked until the transaction ends; null when there is none. */
export const lockConnection = (tx: Tx, id: string) => locked(tx, ConnectionRecord, id)
export const lockLifeSupport = (tx: Tx, id: string) => locked(tx, LifeSupportUnit, id)

type Correction = { name: string; inUseUntil: Date | null }

export function saveConnection(tx: Tx, key: { id: string; version: number }, patch: Correction) {
  return updateVersioned(tx, ConnectionRecord, key, patch)
}

export function saveLifeSupport(tx: Tx, key: { id: string; version: number }, patch: Correction) {
  return updateVersioned(tx, LifeSupportUnit, key, patch)
}

/** @returns the ids of those that are new */
export function insertReadings(tx: Tx, rows: readonly Reading[]): Promise<Set<string>> {
  return insertManyOnce(tx, Reading, rows, [
    'waterBodyId',
    'parameter',
    'enteredValue',
    'enteredUnit',
    'below',
    'scale',
    'happenedAt',
    'instrument',
    'note',
  ])
}

export function insertRange(tx: Tx, row: WaterRangeRecord): Created {
  return insertOnce(tx, WaterRangeRecord, row, [
    'enclosureId',
    'parameter',
    'enteredUnit',
    'outerLowEntered',
    'innerLowEntered',
    'innerHighEntered',
    'outerHighEntered',
  ])
}

export function insertWaterEvent(tx: Tx, row: WaterEvent): Created {
  return insertOnce(tx, WaterEvent, row, [
    'waterBodyId',
    'kind',
    'amountEnteredValue',
    'amountEnteredUnit',
    'shareEnteredValue',
    'lifeSupportUnitId',
    'happenedAt',
    'note',
  ])
}

export async function insertIsolation(
  tx: Tx,
  row: IsolationRecord,
  waterBodyIds: readonly string[],
): Created {
  const done = await insertOnce(tx, IsolationRecord, row, ['happenedAt', 'note'])
  if (done.created)
    await tx.manager.insert(
      IsolationBody,
      waterBodyIds.map((waterBodyId) => ({ isolationId: row.id, waterBodyId })),
    )
  return done
}

export function insertIsolationTest(tx: Tx, row: IsolationTest): Created {
  return insertOnce(tx, IsolationTest, row, ['isolationId', 'method', 'passed', 'happenedAt'])
}

export function insertIsolationEnd(tx: Tx, row: IsolationEnd): Created {
  return insertOnce(tx, IsolationEnd, row, ['isolationId', 'happenedAt', 'note'])
}

/** Kinds of records that can be struck through, with the column that names them and the table they are in. */
export const voidable = {
  reading: { column: 'readingId', entity: Reading },
  'water-event': { column: 'waterEventId', entity: WaterEvent },
  'connection-state': { column: 'connectionStateId', entity: ConnectionStateRecord },
  'life-support-state': { column: 'lifeSupportStateId', entity: LifeSupportState },
  isolation: { column: 'isolationId', entity: IsolationRecord },
} as const
export type VoidableKind = keyof typeof voidable

const noVoid = {
  readingId: null,
  waterEventId: null,
  connectionStateId: null,
  lifeSupportStateId: null,
  determinationId: null,
  isolationId: null,
}

/** Strikes a record through. The unique constraint of its column refuses a second time. */
export async function insertVoid(
  tx: Tx,
  given: { id: string; reason: string; of: Partial<typeof noVoid> | Record<string, string> },
): Promise<void> {
  await tx.manager.insert(WaterVoid, {
    ...noVoid,
    ...given.of,
    id: given.id,
    reason: given.reason,
    recordedAt: tx.at,
    recordedBy: tx.actor.personId,
  })
}

/** The record that is to be struck through; null when there is none. */
export function findVoidable(tx: Tx, kind: VoidableKind, id: string) {
  return tx.manager.findOneBy(voidable[kind].entity as EntityTarget<Reading>, { id })
}
