import { insertOnce } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { BathStopRow, DoseCalculation, DoseRow } from './dose.entity.ts'

export function insertCalculation(tx: Tx, row: DoseCalculation): Promise<{ created: boolean }> {
  return insertOnce(tx, DoseCalculation, row, ['orderVersionId', 'doseKey', 'part', 'lotRead', 'recordedBy'])
}

export function insertDose(tx: Tx, row: DoseRow): Promise<{ created: boolean }> {
  return insertOnce(tx, DoseRow, row, ['orderVersionId', 'doseKey', 'kind', 'lotId', 'amountEnteredUnit'])
}

export function findDose(tx: Tx, id: string): Promise<DoseRow | null> {
  return tx.manager.findOneBy(DoseRow, { id })
}

export function insertStop(tx: Tx, row: BathStopRow): Promise<{ created: boolean }> {
  // the time is not compared: of a device whose clock goes ahead it is the server's, and another on every attempt
  return insertOnce(tx, BathStopRow, row, ['doseId', 'cause'])
}

/** The newest calculation of a part for one dose; null when there is none. */
export function newestCalculation(
  tx: Tx,
  orderVersionId: string,
  doseKey: string,
  part: 'first' | 'second',
): Promise<DoseCalculation | null> {
  return tx.manager.findOne(DoseCalculation, {
    where: { orderVersionId, doseKey, part },
    order: { recordedAt: 'DESC' },
  })
}

/** The order's head is locked, so that two people at one tank are judged one after the other. */
export async function lockOrderHead(tx: Tx, number: string): Promise<string | null> {
  const [row]: { id: string }[] = await tx.manager.query(
    'SELECT o.id FROM orders o WHERE o.number = $1 FOR UPDATE',
    [number],
  )
  return row?.id ?? null
}

/** The same by one of its signed versions. */
export async function lockOrderOfVersion(tx: Tx, versionId: string): Promise<string | null> {
  const [row]: { id: string }[] = await tx.manager.query(
    'SELECT o.id FROM orders o WHERE o.id = (SELECT v.order_id FROM order_versions v WHERE v.id = $1) FOR UPDATE',
    [versionId],
  )
  return row?.id ?? null
}
