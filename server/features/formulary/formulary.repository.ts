import { standingLotEvents } from './formulary.reads.ts'
import { insertOnce, updateVersioned } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { DoseLineConfirmation, DoseLineRow, LotEventRow, LotRow, ProductRow } from './formulary.entity.ts'

export function insertProduct(tx: Tx, row: ProductRow) {
  return insertOnce(tx, ProductRow, row, [
    'agent',
    'productName',
    'form',
    'strengthEnteredUnit',
    'strengthBasis',
  ])
}

export function lockProduct(tx: Tx, id: string): Promise<ProductRow | null> {
  return tx.manager.findOne(ProductRow, { where: { id }, lock: { mode: 'pessimistic_write' } })
}

export function saveProduct(
  tx: Tx,
  key: { id: string; version: number },
  patch: Partial<ProductRow>,
): Promise<void> {
  return updateVersioned(tx, ProductRow, key, patch)
}

export function insertLot(tx: Tx, row: LotRow) {
  return insertOnce(tx, LotRow, row, ['productId', 'lotNumber', 'expiresOn', 'receivedOn'])
}

export function findLot(tx: Tx, id: string): Promise<LotRow | null> {
  return tx.manager.findOneBy(LotRow, { id })
}

export function insertLotEvent(tx: Tx, row: LotEventRow) {
  return insertOnce(tx, LotEventRow, row, ['lotId', 'kind', 'happenedAt', 'note'])
}

/** What keeps a lot out of use, and who noted it. */
export function findStandingEvents(
  tx: Tx,
  lotId: string,
): Promise<{ kind: string; recorded_by: string | null }[]> {
  return tx.manager.query(`SELECT e.kind, e.recorded_by FROM (${standingLotEvents}) e WHERE e.lot_id = $1`, [
    lotId,
  ])
}

export function hasLotEvent(tx: Tx, id: string): Promise<boolean> {
  return tx.manager.existsBy(LotEventRow, { id })
}

export function findDoseLine(tx: Tx, id: string): Promise<DoseLineRow | null> {
  return tx.manager.findOneBy(DoseLineRow, { id })
}

export function insertDoseLine(tx: Tx, row: DoseLineRow) {
  return insertOnce(tx, DoseLineRow, row, ['supersedesId', 'low', 'high', 'longestContactMinutes', 'reason'])
}

export async function isConfirmed(tx: Tx, doseLineId: string): Promise<boolean> {
  return tx.manager.existsBy(DoseLineConfirmation, { doseLineId })
}

export async function insertDoseLineConfirmation(tx: Tx, row: DoseLineConfirmation): Promise<void> {
  await tx.manager.insert(DoseLineConfirmation, row)
}
