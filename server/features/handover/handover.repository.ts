import { insertOnce } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { HandoverNoteRow, HandoverReadRow } from './handover.entity.ts'

export function insertNote(tx: Tx, row: HandoverNoteRow): Promise<{ created: boolean }> {
  return insertOnce(tx, HandoverNoteRow, row, ['about', 'words', 'recordedBy'])
}

export function findNote(tx: Tx, id: string): Promise<HandoverNoteRow | null> {
  return tx.manager.findOneBy(HandoverNoteRow, { id })
}

export function insertRead(tx: Tx, row: HandoverReadRow): Promise<{ created: boolean }> {
  return insertOnce(tx, HandoverReadRow, row, ['noteId', 'recordedBy'])
}
