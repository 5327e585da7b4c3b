import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Action } from '../../../shared/domain/permissions/table.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import type { Ids } from '../../platform/ids.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { OwnPassword } from '../../platform/sign-in/own-password.ts'
import type { Signer } from '../../platform/signatures/signer.ts'
import type { FacilityService } from '../facility/index.ts'
import type { ValidLicence } from '../people/index.ts'
import { insertSignedText } from './signing.repository.ts'
import type { SignedText } from './signed-text.entity.ts'

export interface SigningParts {
  ids: Ids
  signer: Signer
  ownPassword: OwnPassword
  facility: FacilityService
  validLicence(personId: string, at: Date): Promise<ValidLicence | null>
  readSignedText(id: string): Promise<SignedText | null>
}

/** Somebody who has just shown that they are themselves and may sign on this day. */
export interface Signatory {
  personId: string
  printedName: string
  licence: ValidLicence
}

export interface SealRequest {
  signatory: Signatory
  subject: { kind: string; id: string; label: string }
  /** What the signature means, in words as printed: "author of this order" */
  meaning: string
  /** Everything that is signed. */
  content: Json
}

/** The part of every signed text that says who signed it. */
interface SignedBy {
  printedName: string
  role: string
  licence: { jurisdiction: string; number: string; validUntil: string }
  meaning: string
  signedAt: string
  signedOn: string
  zone: string
}

export function createSigningService(parts: SigningParts) {
  return {
    signer: parts.signer,

    /**
     * Checks, before any lock is taken, that the person at the keyboard is the signer (password again; wrong tries count
     * towards the lock) and holds a licence valid today for a jurisdiction the facility accepts.
     */
    async confirmSignatory(
      context: RequestContext,
      action: Action,
      password: string,
      at: Date,
    ): Promise<Signatory> {
      const { personId, printedName, roles } = context.actor
      if (personId === null) throw new Problem('not-signed-in')
      const licence = await parts.validLicence(personId, at)
      const decision = decide(action, roles, { 'valid-licence': licence !== null })
      if (!decision.allowed || !licence)
        throw new Problem(decision.why === 'role' ? 'may-not' : 'licence-not-valid', {
          detail:
            'You can write, hold and stop. To sign, ask the administrator to enter a licence valid today.',
        })
      await parts.ownPassword.confirm(personId, password, {
        pointer: '/password',
        detail: 'Nothing was signed. Type your own password.',
      })
      return { personId, printedName, licence }
    },

    /**
     * Seals a content: freezes its canonical text together with name, licence, day, zone and meaning, signs the text's
     * hash with the installation's key, and puts the hash into the audit chain. Sealed rows are never changed.
     */
    async seal(tx: Tx, request: SealRequest): Promise<{ id: string; hash: string; text: string }> {
      const { signatory, subject, meaning } = request
      const zone = await parts.facility.zone(tx)
      const signedBy: SignedBy = {
        printedName: signatory.printedName,
        role: 'veterinarian',
        licence: { ...signatory.licence },
        meaning,
        signedAt: tx.at.toISOString(),
        signedOn: await parts.facility.dateOf(tx.at, tx),
        zone,
      }
      const text = canonicalJson({ content: request.content, signedBy: signedBy as unknown as Json, subject })
      const seal = parts.signer.seal(text)
      const id = parts.ids.next()
      await insertSignedText(tx, {
        id,
        subjectKind: subject.kind,
        subjectId: subject.id,
        subjectLabel: subject.label,
        meaning,
        text,
        ...seal,
        signerId: signatory.personId,
        signedAt: tx.at,
      })
      tx.audit({
        action: 'signature.make',
        subject,
        after: { signedTextId: id, hash: seal.hash, meaning },
        clinical: true,
      })
      return { id, hash: seal.hash, text }
    },

    /** What stands under a record whose signed text is gone. */
    goneBlock: (recordedAt: Date): SignatureBlock => goneSealed(recordedAt).block,

    /**
     * A signed text read back and checked now: its content, and the block to show under it. One that is gone is shown as
     * broken, under the time of the record that points at it.
     */
    async readSealed(id: string, recordedAt: Date): Promise<Sealed> {
      const row = await parts.readSignedText(id)
      return row ? presentSealed(row, parts.signer) : goneSealed(recordedAt)
    },
  }
}

export interface Sealed {
  content: Json
  block: SignatureBlock
  text: string
}

const goneSealed = (recordedAt: Date): Sealed => ({
  content: null,
  text: '',
  block: {
    printedName: '',
    role: '',
    licence: null,
    meaning: '',
    signedAt: recordedAt.toISOString(),
    signedOn: recordedAt.toISOString().slice(0, 10),
    zone: 'UTC',
    hash: '',
    keyId: '',
    state: 'broken',
    fault: { what: 'text', entries: [] },
  },
})

/** The content and signature block of a stored signed text. A text that is no longer JSON is shown as broken, not as an error. */
export function presentSealed(row: SignedText, signer: Signer): Sealed {
  const state = signer.check(row.text, row)
  const said = readText(row.text)
  const by = said?.signedBy
  return {
    content: said?.content ?? null,
    text: row.text,
    block: {
      printedName: by?.printedName ?? '',
      role: by?.role ?? '',
      licence: by?.licence ?? null,
      meaning: by?.meaning ?? row.meaning,
      signedAt: by?.signedAt ?? row.signedAt.toISOString(),
      signedOn: by?.signedOn ?? row.signedAt.toISOString().slice(0, 10),
      zone: by?.zone ?? 'UTC',
      hash: row.hash,
      keyId: row.keyId,
      state,
      fault: state === 'broken' ? { what: 'text', entries: [] } : null,
    },
  }
}

function readText(text: string): { content: Json; signedBy: SignedBy } | null {
  try {
    return JSON.parse(text) as { content: Json; signedBy: SignedBy }
  } catch {
    return null
  }
}

export type SigningService = ReturnType<typeof createSigningService>
