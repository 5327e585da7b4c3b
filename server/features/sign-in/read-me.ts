import type { Me } from '../../../shared/contracts/sign-in.contract.ts'
import type { SignedIn } from '../../platform/http/guard.ts'
import type { FacilityService } from '../facility/index.ts'
import type { People } from '../people/index.ts'

export type MeReader = (person: SignedIn) => Promise<Me>

const gallonOf = (value: string): 'us' | 'imperial' | null =>
  value === 'us' || value === 'imperial' ? value : null

/** What the client's shell needs to know of the person who is signed in. */
export function createMeReader(parts: {
  people: People
  facility: FacilityService
  demo: boolean
}): MeReader {
  return async (signedIn) => {
    const { people, facility } = parts
    const person = await people.personAsSignedIn(signedIn.personId)
    const licences = person.licences.filter(({ state }) => state !== 'void' && state !== 'superseded')
    return {
      id: person.id,
      email: person.email,
      printedName: person.printedName,
      roles: person.roles,
      mustChangePassword: signedIn.mustChangePassword,
      licences: licences.map((licence) => ({
        id: licence.id,
        class: licence.class,
        jurisdiction: licence.jurisdiction,
        number: licence.number,
        validFrom: licence.validFrom,
        validUntil: licence.validUntil,
        lastDay: licence.lastDay,
        state: licence.state,
        warning: licence.warning,
        validToday: licence.state === 'valid',
      })),
      mayPractise: person.roles.includes('veterinarian') && person.licenceState === 'valid',
      signingLockedUntil: person.signingLockedUntil,
      preferences: await people.readPreferences(person.id),
      facility: {
        name: await facility.valueOf('facility.name'),
        zone: await facility.zone(),
        gallon: gallonOf(await facility.valueOf('facility.gallon')),
        demo: parts.demo,
      },
    }
  }
}
