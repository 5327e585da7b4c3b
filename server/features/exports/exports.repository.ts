import { insertOnce } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { ExportRecord } from './export.entity.ts'

export function insertExport(tx: Tx, row: ExportRecord): Promise<{ created: boolean }> {
  return insertOnce(tx, ExportRecord, row, ['subjectId', 'format', 'periodFrom', 'periodUntil', 'reason'])
}

export function findExport(tx: Tx, id: string): Promise<ExportRecord | null> {
  return tx.manager.findOneBy(ExportRecord, { id })
}
