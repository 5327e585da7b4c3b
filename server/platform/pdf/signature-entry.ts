import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import type { SignatureEntry } from '../../../shared/domain/documents/pdf-document-model.ts'
import { documentWords } from '../../../shared/messages/documents.ts'
import { sayFaultUnderSignature } from '../../../shared/messages/record-fault.ts'
import { sayDate, sayInstantWithOffset } from '../../../shared/messages/say-date.ts'

function checkWordsOf({ state, fault }: SignatureBlock): string {
  if (state === 'intact') return documentWords.recordIntact
  return fault ? sayFaultUnderSignature(fault) : documentWords.recordUnknownKey
}

/** The signature and licence block as paper shows it, with the outcome of the check made now. */
export function signatureEntry(block: SignatureBlock): SignatureEntry {
  const { licence, registration } = block
  return {
    name: block.printedName,
    role: documentWords.signerRole,
    licence: licence
      ? documentWords.licence({ number: licence.number, until: sayDate(licence.validUntil) })
      : documentWords.licenceUnreadable,
    ...(licence ? { jurisdiction: licence.jurisdiction } : {}),
    ...(registration
      ? {
          registration: documentWords.registration({
            number: registration.number,
            until: sayDate(registration.validUntil),
          }),
        }
      : {}),
    meaning: documentWords.signedAs({ meaning: block.meaning }),
    signedAt: sayInstantWithOffset(block.signedAt, block.zone, 'second'),
    check: block.state === 'intact' ? 'intact' : 'broken',
    checkWords: checkWordsOf(block),
  }
}

/** The line for each page that says who signed and when. */
export function signerLine(block: SignatureBlock): string {
  return documentWords.signedBy({
    name: block.printedName,
    at: sayInstantWithOffset(block.signedAt, block.zone, 'second'),
  })
}
