import type { AttachedDocument, CheckedFingerprint } from '../../../shared/contracts/documents.contract.ts'
import type { DocumentReadRow, PrintReadRow } from './documents.reads.ts'
import type { PrintState } from './print-states.ts'

export function presentDocument(row: DocumentReadRow): AttachedDocument {
  return {
    id: row.id,
    title: row.title,
    kind: row.kind,
    fileName: row.file_name,
    mediaType: row.media_type,
    bytes: row.bytes,
    sha256: row.sha256,
    attachedAt: row.recorded_at.toISOString(),
    attachedBy: row.recorded_by_name ?? '',
    voided:
      row.voided_reason !== null && row.voided_at
        ? { reason: row.voided_reason, at: row.voided_at.toISOString(), by: row.voided_by_name ?? '' }
        : null,
  }
}

export function presentPrints(prints: readonly PrintReadRow[], stands: PrintState): CheckedFingerprint {
  return {
    fingerprint: prints[0]?.fingerprint ?? '',
    ...stands,
    prints: prints.map((print) => ({
      kind: print.kind,
      subject: print.subject_label,
      version: print.version,
      printedBy: print.printed_by_name,
      printedAt: print.printed_at.toISOString(),
    })),
  }
}
