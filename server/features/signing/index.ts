import { getSigningKey } from '../../../shared/contracts/signing.contract.ts'
import { route } from '../../platform/http/route.ts'
import type { Parts } from '../../platform/parts.ts'
import type { Signer } from '../../platform/signatures/signer.ts'
import type { FacilityService } from '../facility/index.ts'
import type { People } from '../people/index.ts'
import { SignedText } from './signed-text.entity.ts'
import { readSignedText } from './signing.reads.ts'
import { createSigningService } from './signing.service.ts'

export { withFault } from './with-fault.ts'
export type { Signatory, SigningAsked, SigningService } from './signing.service.ts'
export const signingEntities = [SignedText]

export function createSigning(parts: Parts & { signer: Signer; facility: FacilityService; people: People }) {
  const service = createSigningService({
    ...parts,
    signingLicence: parts.people.questions.signingLicence,
    ownPassword: parts.people.ownPassword,
    readSignedText: (id) => readSignedText(parts.dataSource, id),
  })
  const { keyId, publicKeyPem } = parts.signer
  return { service, routes: [route(getSigningKey, async () => ({ keyId, publicKeyPem }))] }
}
