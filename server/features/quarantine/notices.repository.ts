import { insertOnce } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { NoticeActRow, NoticeDeliveryRow, NoticeRow } from './notice.entity.ts'

export async function insertNotice(tx: Tx, row: NoticeRow): Promise<void> {
  await tx.manager.insert(NoticeRow, row)
}

export function findNotice(tx: Tx, id: string): Promise<NoticeRow | null> {
  return tx.manager.findOneBy(NoticeRow, { id })
}

export async function insertDelivery(tx: Tx, row: NoticeDeliveryRow): Promise<void> {
  await tx.manager.insert(NoticeDeliveryRow, row)
}

export function insertAct(tx: Tx, row: NoticeActRow): Promise<{ created: boolean }> {
  return insertOnce(tx, NoticeActRow, row, ['noticeId', 'kind', 'whom'])
}
