import { OctagonX } from 'lucide-react'
import { formatFingerprint } from '../../../shared/domain/documents/format-fingerprint.ts'
import type { SignatureBlock as Block } from '../../../shared/contracts/signing.contract.ts'
import { documentWords } from '../../../shared/messages/documents.ts'
import { orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { relationshipWords } from '../../../shared/messages/orders.ts'
import { faultWords, sayFault } from '../../../shared/messages/record-fault.ts'
import { signingWords } from '../../../shared/messages/signing.ts'
import { sayDate, sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import { Icon } from '../../ui/icon.tsx'
import { SignatureBlock } from '../../ui/signature-block.tsx'

/** Said loudly, first on the sheet: the text on it is not what was signed, or nobody can tell. */
export function BrokenRecord({
  state,
  fault,
  unreadable,
}: Pick<Block, 'state' | 'fault'> & { unreadable: boolean }) {
  if (state === 'intact' && !unreadable) return null
  const unknownKey = state === 'unknown-key'
  const found = sayFault(fault ?? { what: 'text', entries: [] })
  return (
    <div className="broken-record" role="alert">
      <Icon of={OctagonX} size={26} />
      <div>
        <h2 className="t-head">{unknownKey ? words.unknownKeyTitle : words.brokenTitle}</h2>
        <p>{unknownKey ? words.unknownKey : words.broken({ found })}</p>
        {unreadable ? <p>{faultWords.noFigures}</p> : null}
      </div>
    </div>
  )
}

/** Who signed, with which licence, when, as what; and whether the text is still what was signed. */
export function OrderSignature({
  signature,
  stated = null,
}: {
  signature: Block
  /** What the signer stated besides, as it was signed. */
  stated?: string | null
}) {
  const { licence, registration, state } = signature
  const fingerprint = formatFingerprint(signature.hash)
  return (
    <SignatureBlock
      meaning={words.signature({ meaning: signature.meaning })}
      who={
        <>
          <b>{signature.printedName}</b>
          <span className="block">
            {licence === null
              ? documentWords.licenceUnreadable
              : words.licence({
                  jurisdiction: licence.jurisdiction,
                  number: licence.number,
                  until: sayDate(licence.validUntil),
                })}
          </span>
          {registration === null ? null : (
            <span className="block">
              {signingWords.registration({
                jurisdiction: registration.jurisdiction,
                number: registration.number,
                until: sayDate(registration.validUntil),
              })}
            </span>
          )}
        </>
      }
    >
      {stated ? (
        <p className="signature-text">
          <b>{relationshipWords.heading}.</b> {stated}
        </p>
      ) : null}
      <p className="signature-text">
        {words.signedAt({ at: sayInstantWithOffset(signature.signedAt, signature.zone) })}
      </p>
      <p className={state === 'intact' ? 'signature-text' : 'text-magenta t-strong'}>
        {state === 'intact' ? words.intact : state === 'broken' ? words.brokenTitle : words.unknownKeyTitle}
      </p>
      {fingerprint.ok ? (
        <p className="signature-text num">{words.check({ fingerprint: fingerprint.value })}</p>
      ) : null}
    </SignatureBlock>
  )
}
