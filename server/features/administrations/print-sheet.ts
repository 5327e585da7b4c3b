import type { Clock } from '../../platform/clock.ts'
import type { Transactions } from '../../platform/database/transactions.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { drawable } from '../../platform/pdf/drawable.ts'
import type { PdfPool } from '../../platform/pdf/pdf-pool.ts'
import type { DocumentsService } from '../documents/index.ts'
import type { FacilityService } from '../facility/index.ts'
import { orderNotice } from '../orders/index.ts'
import { bathSheetDocument } from './bath-sheet-document.ts'
import type { DoseSituation } from './dose-situation.ts'

export const sheetPrintKind = 'bath-sheet'

export interface SheetPrintParts {
  transactions: Transactions
  clock: Clock
  pdf: PdfPool
  facility: FacilityService
  documents: DocumentsService
  publicUrl: string
  sheetFor(
    context: RequestContext,
    number: string,
    key: string,
    blind: boolean,
  ): Promise<{ situation: DoseSituation; sheet: BathSheet }>
}

/** Prints the bath sheet of a dose: judged now, noted under the fingerprint of the signed order it belongs to. */
export function createSheetPrinter(parts: SheetPrintParts) {
  return async (context: RequestContext, number: string, key: string): Promise<Uint8Array> => {
    const printedAt = parts.clock.now().toISOString()
    const { situation, sheet } = await parts.sheetFor(context, number, key, false)
    const { block, row, content } = situation
    if (!situation.readable) throw new Problem('broken-record', { detail: doseWords.unreadable })
    const model = bathSheetDocument({
      sheet: drawable(sheet),
      content: drawable(content),
      block,
      notice: orderNotice({ block, row, superseded: false, versionNo: content.versionNo }),
      facility: await parts.facility.valueOf('facility.name'),
      paper: await parts.facility.paper(),
      publicUrl: parts.publicUrl,
      printedBy: context.actor.printedName,
      printedAt,
    })
    const bytes = await parts.pdf.renderPdf(model)
    await parts.transactions.inTransaction(context, async (tx) => {
      await parts.documents.registerPrint(tx, {
        fingerprint: block.hash,
        kind: sheetPrintKind,
        subjectId: row.id,
        subjectLabel: number,
        version: String(content.versionNo),
      })
      tx.audit({
        action: 'dose.print',
        subject: { kind: 'order', id: row.id, label: number },
        after: { key, hash: block.hash, state: block.state, inTheWay: sheet.why.length },
      })
    })
    return bytes
  }
}

export type SheetPrinter = ReturnType<typeof createSheetPrinter>
