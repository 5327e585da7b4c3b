import type { ExportRow } from '../../../shared/contracts/exports.contract.ts'
import type { ExportReadRow } from './exports.reads.ts'

export function presentExport(row: ExportReadRow): ExportRow {
  return {
    id: row.id,
    accession: row.subject_label,
    format: row.format,
    from: row.period_from,
    until: row.period_until,
    reason: row.reason,
    fileName: row.file_name,
    bytes: row.bytes,
    sha256: row.sha256,
    fingerprint: row.fingerprint,
    exportedAt: row.exported_at.toISOString(),
    exportedBy: row.exported_by_name ?? '',
  }
}
