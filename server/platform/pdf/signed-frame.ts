import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import type { PdfDocumentModel } from '../../../shared/domain/documents/pdf-document-model.ts'
import { formatFingerprint } from '../../../shared/domain/documents/format-fingerprint.ts'
import { documentWords } from '../../../shared/messages/documents.ts'
import { sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import { signerLine } from './signature-entry.ts'

export interface SignedPaper {
  block: SignatureBlock
  paper: 'a4' | 'letter'
  printedBy: string
  printedAt: string
}

/**
 * What stands on every page of a printed record: who signed, its record check, a state that no page may hide, and by whom
 * and when it was printed.
 *
 * @param notice null where nothing is to be hidden by no page
 * @param zone   by whose clock the print is dated: that of the record
 */
export function signedFrame(
  { block, paper, printedBy, printedAt }: SignedPaper,
  notice: string | null,
  zone: string = block.zone,
): Pick<PdfDocumentModel, 'language' | 'paper' | 'signers' | 'recordCheck' | 'notice' | 'printed'> {
  const short = formatFingerprint(block.hash)
  return {
    language: 'en',
    paper,
    signers: [signerLine(block)],
    ...(short.ok ? { recordCheck: short.value } : {}),
    ...(notice === null ? {} : { notice }),
    printed: {
      by: printedBy,
      at: sayInstantWithOffset(printedAt, zone),
      atIso: printedAt,
      note: documentWords.laterVersion,
    },
  }
}
