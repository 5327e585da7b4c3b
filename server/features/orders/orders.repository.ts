import { insertOnce, updateVersioned } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import {
  AgentExperience,
  OrderEventRow,
  OrderHead,
  OrderVersion,
  OrderVersionAnimal,
} from './order.entity.ts'

/** The head of an order, locked until the transaction ends; null when there is none. */
export function lockOrder(tx: Tx, number: string): Promise<OrderHead | null> {
  return tx.manager.findOne(OrderHead, { where: { number }, lock: { mode: 'pessimistic_write' } })
}

export function findOrderById(tx: Tx, id: string): Promise<OrderHead | null> {
  return tx.manager.findOneBy(OrderHead, { id })
}

export async function insertOrder(tx: Tx, row: OrderHead): Promise<void> {
  await tx.manager.insert(OrderHead, row)
}

export function saveOrder(
  tx: Tx,
  key: { id: string; version: number },
  patch: Partial<OrderHead>,
): Promise<void> {
  return updateVersioned(tx, OrderHead, key, patch)
}

export async function insertVersion(
  tx: Tx,
  row: OrderVersion,
  animals: readonly { animalId: string; taxonId: string }[],
): Promise<void> {
  await tx.manager.insert(OrderVersion, row)
  await tx.manager.insert(
    OrderVersionAnimal,
    animals.map((animal) => ({ orderVersionId: row.id, ...animal })),
  )
}

export async function newestVersion(tx: Tx, orderId: string): Promise<OrderVersion | null> {
  return tx.manager.findOne(OrderVersion, { where: { orderId }, order: { versionNo: 'DESC' } })
}

export function insertEvent(tx: Tx, row: OrderEventRow): Promise<{ created: boolean }> {
  // the time is not compared: of a device whose clock goes ahead it is the server's, and another on every attempt
  return insertOnce(tx, OrderEventRow, row, ['orderId', 'kind', 'reason'])
}

/**
 * Every event of an order, in the order of entry: a hold that comes in late from a phone without a signal, or whose clock
 * is behind, holds from then on, though a lift has a later time.
 */
export function eventsOf(tx: Tx, orderId: string): Promise<OrderEventRow[]> {
  return tx.manager.find(OrderEventRow, {
    where: { orderId },
    order: { recordedAt: 'ASC', happenedAt: 'ASC' },
  })
}

export async function insertExperience(tx: Tx, rows: readonly AgentExperience[]): Promise<void> {
  if (rows.length > 0) await tx.manager.insert(AgentExperience, [...rows])
}
