import type { ControlledSchedule } from '../../../shared/domain/licences/controlled-agents.ts'
import type { SigningLack } from '../../../shared/domain/licences/signing-licence.ts'
import { sayLacks } from '../../../shared/messages/signing.ts'
import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import { decide, rolesThatMay } from '../../../shared/domain/permissions/decide.ts'
import { permissionWords } from '../../../shared/messages/permissions.ts'
import type { Action } from '../../../shared/domain/permissions/table.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import type { Ids } from '../../platform/ids.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { OwnPassword } from '../../platform/sign-in/own-password.ts'
import type { Signer } from '../../platform/signatures/signer.ts'
import type { FacilityService } from '../facility/index.ts'
import { asSigned } from '../people/index.ts'
import type { PeopleQuestions, ValidLicence } from '../people/index.ts'
import { insertSignedText } from './signing.repository.ts'
import type { SignedText } from './signed-text.entity.ts'

export interface SigningParts {
  ids: Ids
  signer: Signer
  ownPassword: OwnPassword
  facility: FacilityService
  signingLicence: PeopleQuestions['signingLicence']
  readSignedText(id: string): Promise<SignedText | null>
}

/** Somebody who has just shown that they are themselves and may sign on this day. */
export interface Signatory {
  personId: string
  printedName: string
  licence: ValidLicence
  /** The registration that a controlled drug is signed under; null of everything else. */
  registration: ValidLicence | null
}

/** What is asked of a signer beyond the password. */
export interface SigningAsked {
  /** The licence the signer chose; where only one is valid it need not be named. */
  licenceId?: string | undefined
  /** Schedule of the controlled drug that is signed for: it wants a registration of the signer besides the licence. */
  controlledSchedule?: ControlledSchedule | null
}

/** How what lacks is refused: what is wrong with the licence comes before what is wrong with the registration. */
function refuseLacking(lacks: readonly SigningLack[]): never {
  const [first] = lacks
  const detail = sayLacks(lacks)
  const codes = lacks.map(({ code }) => code)
  if (first?.code === 'licence-not-chosen' || first?.code === 'chosen-licence-not-valid')
    throw new Problem(first.code === 'licence-not-chosen' ? 'licence-not-chosen' : 'licence-not-valid', {
      detail,
      errors: [{ pointer: '/licenceId', detail, code: first.code }],
      extra: { lacks: codes },
    })
  throw new Problem(first?.code.includes('registration') ? 'registration-needed' : 'licence-not-valid', {
    detail,
    extra: { lacks: codes },
  })
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
  licence: ValidLicence
  /** Of a controlled drug only. */
  registration?: ValidLicence
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
     * towards the lock) and holds a licence valid today for a jurisdiction the facility accepts: the only one, or the one
     * they chose of several. For a controlled drug also a registration valid today for the jurisdiction of that licence.
     *
     * @refuses may-not | licence-not-valid | licence-not-chosen | registration-needed | password-wrong | sign-in-locked
     */
    async confirmSignatory(
      context: RequestContext,
      action: Action,
      password: string,
      at: Date,
      asked: SigningAsked = {},
    ): Promise<Signatory> {
      const { personId, printedName, roles } = context.actor
      if (personId === null) throw new Problem('not-signed-in')
      if (!decide(action, roles).allowed)
        throw new Problem('may-not', { detail: permissionWords.whoMay({ roles: rolesThatMay(action) }) })
      const { licence, registration, lacks } = await parts.signingLicence(personId, at, {
        chosenId: asked.licenceId ?? null,
        controlledSchedule: asked.controlledSchedule ?? null,
      })
      if (!decide(action, roles, { 'valid-licence': licence !== null }).allowed || !licence)
        return refuseLacking(lacks)
      await parts.ownPassword.confirm(context, password, {
        pointer: '/password',
        detail: 'Nothing was signed. Type your own password.',
      })
      return {
        personId,
        printedName,
        licence: asSigned(licence),
        registration: registration && asSigned(registration),
      }
    },

    /**
     * What the person at the keyboard lacks to sign, before they do: for a screen or a preview. Asks for no password.
     *
     * @param asked as for {@link confirmSignatory}
     */
    async lacksToSign(context: RequestContext, at: Date, asked: SigningAsked = {}): Promise<SigningLack[]> {
      const { personId } = context.actor
      if (personId === null) throw new Problem('not-signed-in')
      const { lacks } = await parts.signingLicence(personId, at, {
        chosenId: asked.licenceId ?? null,
        controlledSchedule: asked.controlledSchedule ?? null,
      })
      return lacks
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
        ...(signatory.registration ? { registration: { ...signatory.registration } } : {}),
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
    registration: null,
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
      registration: by?.registration ?? null,
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
