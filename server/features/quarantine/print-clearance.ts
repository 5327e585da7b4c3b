import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import { clearanceWords } from '../../../shared/messages/clearance.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Transactions } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { PdfPool } from '../../platform/pdf/pdf-pool.ts'
import type { AnswerForPrint, DocumentsService } from '../documents/index.ts'
import type { FacilityService } from '../facility/index.ts'
import { clearanceDocument } from './clearance-document.ts'
import type { QuarantineQueries } from './quarantine.queries.ts'

export const clearancePrintKind = 'clearance'

export interface ClearancePrintParts {
  transactions: Transactions
  clock: Clock
  pdf: PdfPool
  facility: FacilityService
  documents: DocumentsService
  queries: QuarantineQueries
}

/** Prints a signed clearance: checked now, noted with its fingerprint so that the paper can be looked up again. */
export function createClearancePrinter(parts: ClearancePrintParts) {
  return async (number: string, { actor, requestId }: RequestContext): Promise<Uint8Array> => {
    const sealed = await parts.queries.sealedClearance(number)
    if (!sealed) throw new Problem('not-found', { detail: clearanceWords.notCleared })
    const { clearance, block, status, caseId } = sealed
    if (!clearance) throw new Problem('broken-record', { detail: clearanceWords.unreadable })
    const bytes = await parts.pdf.renderPdf(
      clearanceDocument({
        content: clearance,
        block,
        recalled: status === 'recalled',
        facility: await parts.facility.valueOf('facility.name'),
        paper: await parts.facility.paper(),
        printedBy: actor.printedName,
        printedAt: parts.clock.now().toISOString(),
      }),
    )
    await parts.transactions.inTransaction({ actor, requestId }, async (tx) => {
      await parts.documents.registerPrint(tx, {
        fingerprint: block.hash,
        kind: clearancePrintKind,
        subjectId: caseId,
        subjectLabel: number,
        version: '1',
      })
      tx.audit({
        action: 'case.print-clearance',
        subject: { kind: 'case', id: caseId, label: number },
        after: { hash: block.hash, state: block.state, status },
      })
    })
    return bytes
  }
}

const stateOfBlock = {
  intact: 'current',
  broken: 'broken',
  'unknown-key': 'unknown',
} as const satisfies Record<SignatureBlock['state'], string>

/** Whether a printed certificate still holds: a recall makes it void. */
export function answerForClearance(queries: QuarantineQueries): AnswerForPrint {
  return async (print) => {
    const sealed = await queries.sealedClearance(print.subject_label)
    if (!sealed || sealed.block.hash !== print.fingerprint) return { state: 'broken', now: null }
    const state = stateOfBlock[sealed.block.state]
    return { state: state === 'current' && sealed.status === 'recalled' ? 'void' : state, now: null }
  }
}
