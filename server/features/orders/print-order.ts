import type { Clock } from '../../platform/clock.ts'
import type { Transactions } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import { drawable } from '../../platform/pdf/drawable.ts'
import type { PdfPool } from '../../platform/pdf/pdf-pool.ts'
import type { DocumentsService } from '../documents/index.ts'
import type { FacilityService } from '../facility/index.ts'
import type { NoteAmountsSeen } from './amounts-seen.service.ts'
import { orderDocument } from './order-document.ts'
import type { OrderQueries } from './orders.queries.ts'

export const orderPrintKind = 'treatment-order'

export interface PrintParts {
  transactions: Transactions
  clock: Clock
  pdf: PdfPool
  facility: FacilityService
  documents: DocumentsService
  queries: OrderQueries
  noteAmountsSeen: NoteAmountsSeen
  publicUrl: string
}

/** Prints a signed version: checked now, noted with its fingerprint so that the paper can be looked up again. */
export function createOrderPrinter(parts: PrintParts) {
  return async (number: string, version: number | undefined, actor: Actor, requestId: string) => {
    const sealed = await parts.queries.sealed(number, version)
    const content = sealed.content ?? (sealed.isChanged ? sealed.standIn : null)
    if (!content)
      throw new Problem('broken-record', {
        detail: 'The signed text of this order cannot be read any more. Tell the administrator; do not dose.',
      })
    const model = orderDocument({
      content: drawable(content),
      block: sealed.block,
      row: sealed.row,
      recorded: sealed.recorded,
      superseded: sealed.superseded,
      facility: await parts.facility.valueOf('facility.name'),
      paper: await parts.facility.paper(),
      publicUrl: parts.publicUrl,
      printedBy: actor.printedName,
      printedAt: parts.clock.now().toISOString(),
    })
    const bytes = await parts.pdf.renderPdf(model)
    await parts.noteAmountsSeen({ actor, requestId }, number)
    await parts.transactions.inTransaction({ actor, requestId }, async (tx) => {
      await parts.documents.registerPrint(tx, {
        fingerprint: sealed.block.hash,
        kind: orderPrintKind,
        subjectId: sealed.row.id,
        subjectLabel: number,
        version: String(sealed.versionNo),
      })
      tx.audit({
        action: 'order.print',
        subject: { kind: 'order', id: sealed.row.id, label: number },
        after: { version: sealed.versionNo, hash: sealed.block.hash, state: sealed.block.state },
      })
    })
    return bytes
  }
}
