import { insertOnce, updateVersioned } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Enclosure, WaterBodyRecord } from './enclosure.entity.ts'

/** What makes the description of an enclosure; the code is not among it, since it never changes. */
export type EnclosureDescription = Omit<
  Enclosure,
  'id' | 'code' | 'inUseFrom' | 'inUseUntil' | 'recordedAt' | 'recordedBy' | 'version'
>

export function insertEnclosure(tx: Tx, row: Enclosure): Promise<{ created: boolean }> {
  return insertOnce(tx, Enclosure, row, [
    'code',
    'name',
    'kind',
    'area',
    'boundary',
    'airSpace',
    'treatmentVessel',
  ])
}

/** The enclosure's row, locked until the transaction ends; null when there is none. */
export function lockEnclosure(tx: Tx, code: string): Promise<Enclosure | null> {
  return tx.manager.findOne(Enclosure, { where: { code }, lock: { mode: 'pessimistic_write' } })
}

export function saveEnclosure(
  tx: Tx,
  key: { id: string; version: number },
  patch: Partial<EnclosureDescription>,
): Promise<void> {
  return updateVersioned(tx, Enclosure, key, patch)
}

export function insertWaterBody(tx: Tx, row: WaterBodyRecord): Promise<{ created: boolean }> {
  return insertOnce(tx, WaterBodyRecord, row, ['code', 'name', 'kind', 'enclosureId'])
}

/** Rows of bodies, locked in the order of their ids until the transaction ends, so that the map stands still. */
export async function lockWaterBodies(tx: Tx, ids: readonly string[]): Promise<WaterBodyRecord[]> {
  if (ids.length === 0) return []
  return tx.manager
    .createQueryBuilder(WaterBodyRecord, 'b')
    .where('b.id IN (:...ids)', { ids })
    .orderBy('b.id')
    .setLock('pessimistic_write')
    .getMany()
}

export function saveWaterBody(
  tx: Tx,
  key: { id: string; version: number },
  patch: Partial<Pick<WaterBodyRecord, 'name' | 'inUseUntil'>>,
): Promise<void> {
  return updateVersioned(tx, WaterBodyRecord, key, patch)
}
