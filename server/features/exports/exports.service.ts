import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type { exportHistory } from '../../../shared/contracts/exports.contract.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Transactions } from '../../platform/database/transactions.ts'
import type { FileStore } from '../../platform/files/file-store.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { PdfPool } from '../../platform/pdf/pdf-pool.ts'
import * as repository from './exports.repository.ts'
import { makeHistoryFile } from './make-file.ts'
import { fingerprintOfHistory, readHistory } from './read-history.ts'
import type { HistoryParts } from './read-history.ts'

/** Kind of document under which prints of histories are found again. */
export const historyPrintKind = 'acquisition-history'

export interface ExportsParts extends HistoryParts {
  transactions: Transactions
  clock: Clock
  files: FileStore
  pdf: PdfPool
}

export function createExportsService(parts: ExportsParts) {
  return {
    /**
     * Makes the file, keeps it under its hash, and notes who took it out, when and for what. The same export sent
     * again is the same file.
     */
    async exportHistory(
      context: RequestContext,
      accession: string,
      given: BodyOf<typeof exportHistory>,
    ): Promise<void> {
      const earlier = await parts.transactions.inTransaction(context, async (tx) => {
        const row = await repository.findExport(tx, given.id)
        return row ? { accession: row.subjectLabel, format: row.format } : null
      })
      if (earlier) {
        if (earlier.accession !== accession || earlier.format !== given.format)
          throw new Problem('id-already-used')
        return
      }
      const printedAt = parts.clock.now().toISOString()
      const content = await readHistory(parts, accession, given, printedAt)
      const fingerprint = fingerprintOfHistory(content)
      const { facility } = parts
      const file = await makeHistoryFile(
        content,
        given.format,
        {
          facility: await facility.valueOf('facility.name'),
          zone: await facility.zone(),
          paper: await facility.paper(),
          printedBy: context.actor.printedName,
          printedAt,
          fingerprint,
        },
        parts.pdf,
      )
      const kept = await parts.files.keep(file.content)
      await parts.transactions.inTransaction(context, async (tx) => {
        const { created } = await repository.insertExport(tx, {
          id: given.id,
          kind: 'acquisition-history',
          subjectId: content.animalId,
          subjectLabel: content.accession,
          format: given.format,
          periodFrom: given.from ?? null,
          periodUntil: given.until ?? null,
          reason: given.reason ?? null,
          fileName: file.fileName,
          mediaType: file.mediaType,
          bytes: kept.bytes,
          sha256: kept.sha256,
          fingerprint,
          exportedAt: tx.at,
          exportedBy: tx.actor.personId,
        })
        if (!created) return
        await parts.documents.service.registerPrint(tx, {
          fingerprint,
          kind: historyPrintKind,
          subjectId: JSON.stringify({
            accession: content.accession,
            from: given.from ?? null,
            until: given.until ?? null,
          }),
          subjectLabel: content.accession,
          version: String(content.events.length),
        })
        tx.audit({
          action: 'history.export',
          subject: { kind: 'animal', id: content.animalId, label: content.accession },
          after: {
            format: given.format,
            fileName: file.fileName,
            ...kept,
            fingerprint,
            reason: given.reason ?? undefined,
          },
        })
      })
    },
  }
}

export type ExportsService = ReturnType<typeof createExportsService>
