import type { Me } from '../../../shared/contracts/sign-in.contract.ts'
import type { ControlledSchedule } from '../../../shared/domain/licences/controlled-agents.ts'
import type { HeldLicence } from '../../../shared/domain/licences/licence-classes.ts'
import { signingLicence } from '../../../shared/domain/licences/signing-licence.ts'
import type { SigningLack } from '../../../shared/domain/licences/signing-licence.ts'
import { facilityNow } from '../../lib/facility-time.ts'
import type { FacilityNow } from '../../lib/facility-time.ts'

export type OwnLicence = Me['licences'][number]

/** A licence as the screen knows it, in the terms of the engine. */
export interface ShownLicence extends HeldLicence {
  of: OwnLicence
}

const held = (of: OwnLicence): ShownLicence => ({
  id: of.id,
  class: of.class,
  jurisdiction: of.jurisdiction,
  number: of.number,
  validFrom: of.validFrom,
  validUntil: of.lastDay,
  endedOn: null,
  void: false,
  superseded: false,
  of,
})

/** What is accepted here, as far as the licences of one person tell: of the others nothing has to be known. */
function acceptedOf(licences: readonly OwnLicence[]): string[] {
  const refused = licences
    .filter(({ state }) => state === 'not-accepted-here')
    .map(({ jurisdiction }) => jurisdiction)
  return licences.map(({ jurisdiction }) => jurisdiction).filter((one) => !refused.includes(one))
}

/** Under which licence somebody is about to sign, and what they lack. The server judges it again. */
export interface Signing {
  /** The licences that may sign today; of several none is chosen for the signer. */
  choices: ShownLicence[]
  /** The only one, or the one that was chosen; null while none stands. */
  licence: ShownLicence | null
  registration: ShownLicence | null
  /** What lacks besides the choice of one of several. */
  lacks: SigningLack[]
  /** One of several still has to be chosen. */
  isToChoose: boolean
}

/**
 * @param asked.on       date of the facility
 * @param asked.chosenId what the signer chose; one that is valid no more counts as nothing chosen
 * @param asked.schedule schedule of the controlled drug that is signed for; null of everything else
 */
export function signingOf(
  licences: readonly OwnLicence[],
  asked: { on: string; chosenId: string | null; schedule: ControlledSchedule | null },
): Signing {
  const question = {
    licences: licences.map(held),
    on: asked.on,
    accepted: acceptedOf(licences),
    controlledSchedule: asked.schedule,
  }
  const { choices } = signingLicence({ ...question, chosenId: null })
  const licence =
    choices.length === 1 ? choices[0] : choices.find(({ id }) => id === asked.chosenId && choices.length > 1)
  const { registration, lacks } = signingLicence({ ...question, chosenId: licence?.id ?? null })
  return {
    choices,
    licence: licence ?? null,
    registration,
    lacks: lacks.filter(({ code }) => code !== 'licence-not-chosen'),
    isToChoose: choices.length > 1 && licence === undefined,
  }
}

/** Whether a lock of signing still holds, to the minute of the facility's clock. */
export function isLocked(until: string | null, now: FacilityNow, zone: string): boolean {
  if (until === null) return false
  const end = facilityNow(new Date(until), zone)
  return now.date < end.date || (now.date === end.date && now.minute < end.minute)
}
