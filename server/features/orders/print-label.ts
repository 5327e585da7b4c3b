import { orderProblemWords } from '../../../shared/messages/orders.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { drawable } from '../../platform/pdf/drawable.ts'
import { orderLabelDocument } from './order-label-document.ts'
import type { PrintParts } from './print-order.ts'

export const labelPrintKind = 'order-label'

/**
 * Prints the label of the version in force. A label goes onto a bottle and is read without its order beside it: there is
 * none of a record that is not what was signed. It tells no amount, so nobody learns one by it.
 */
export function createLabelPrinter(parts: Omit<PrintParts, 'noteAmountsSeen'>) {
  return async (context: RequestContext, number: string): Promise<Uint8Array> => {
    const sealed = await parts.queries.sealed(number, undefined)
    const { content, block, row, versionNo } = sealed
    if (!content || block.state !== 'intact')
      throw new Problem('broken-record', { detail: orderProblemWords.noLabel })
    const model = orderLabelDocument({
      content: drawable(content),
      block,
      row,
      superseded: false,
      address: drawable(await parts.facility.valueOf('facility.address')),
      facility: await parts.facility.valueOf('facility.name'),
      publicUrl: parts.publicUrl,
      paper: await parts.facility.paper(),
      printedBy: context.actor.printedName,
      printedAt: parts.clock.now().toISOString(),
    })
    const bytes = await parts.pdf.renderPdf(model)
    await parts.transactions.inTransaction(context, async (tx) => {
      await parts.documents.registerPrint(tx, {
        fingerprint: block.hash,
        kind: labelPrintKind,
        subjectId: row.id,
        subjectLabel: number,
        version: String(versionNo),
      })
      tx.audit({
        action: 'order.print-label',
        subject: { kind: 'order', id: row.id, label: number },
        after: { version: versionNo, hash: block.hash },
      })
    })
    return bytes
  }
}

export type LabelPrinter = ReturnType<typeof createLabelPrinter>
