import { insertOnce } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { DoseOverrideRow } from './dose-override.entity.ts'
import { BathStopRow, DoseCalculation, DoseRow, DoseVoidRow } from './dose.entity.ts'

export function insertCalculation(tx: Tx, row: DoseCalculation): Promise<{ created: boolean }> {
  return insertOnce(tx, DoseCalculation, row, ['orderVersionId', 'doseKey', 'part', 'lotRead', 'recordedBy'])
}

export function insertDose(tx: Tx, row: DoseRow): Promise<{ created: boolean }> {
  return insertOnce(tx, DoseRow, row, ['orderVersionId', 'doseKey', 'kind', 'lotId', 'amountEnteredUnit'])
}

export function findDose(tx: Tx, id: string): Promise<DoseRow | null> {
  return tx.manager.findOneBy(DoseRow, { id })
}

export function findStop(tx: Tx, id: string): Promise<BathStopRow | null> {
  return tx.manager.findOneBy(BathStopRow, { id })
}

/** The void of a dose or of a stop; null while it stands. */
export function findVoid(tx: Tx, of: { doseId: string } | { stopId: string }): Promise<DoseVoidRow | null> {
  return tx.manager.findOneBy(DoseVoidRow, of)
}

export async function insertOverride(tx: Tx, row: DoseOverrideRow): Promise<void> {
  await tx.manager.insert(DoseOverrideRow, row)
}

export async function insertVoid(tx: Tx, row: DoseVoidRow): Promise<void> {
  await tx.manager.insert(DoseVoidRow, row)
}

export function insertStop(tx: Tx, row: BathStopRow): Promise<{ created: boolean }> {
  // the time is not compared: of a device whose clock goes ahead it is the server's, and another on every attempt
  return insertOnce(tx, BathStopRow, row, ['doseId', 'cause'])
}

/** Whether an end of the bath stands already. */
export async function hasEnded(tx: Tx, doseId: string): Promise<boolean> {
  const rows: unknown[] = await tx.manager.query(
    'SELECT 1 FROM live_bath_stops s WHERE s.dose_id = $1 LIMIT 1',
    [doseId],
  )
  return rows.length > 0
}

/** Whether an end that lies before its dose still waits for somebody to strike it out. */
export async function hasEarlyEnd(tx: Tx, doseId: string): Promise<boolean> {
  const rows: unknown[] = await tx.manager.query(
    'SELECT 1 FROM recorded_bath_stops s WHERE s.dose_id = $1 AND s.before_start LIMIT 1',
    [doseId],
  )
  return rows.length > 0
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

/** The same by one of its doses. */
export async function lockOrderOfDose(tx: Tx, doseId: string): Promise<string | null> {
  const [row]: { id: string }[] = await tx.manager.query(
    'SELECT o.id FROM orders o WHERE o.id = (SELECT w.order_id FROM orders_of_doses w WHERE w.dose_id = $1) FOR UPDATE',
    [doseId],
  )
  return row?.id ?? null
}
