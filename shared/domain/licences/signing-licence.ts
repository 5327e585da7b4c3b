import type { FacilityDate } from '../time/instant.ts'
import type { ControlledSchedule } from './controlled-agents.ts'
import { isSameJurisdiction, lastDayOf } from './licence-classes.ts'
import type { HeldLicence, LicenceClass } from './licence-classes.ts'
import { licenceState } from './licence-state.ts'
import type { LicenceState } from './licence-state.ts'

/**
 * What somebody lacks who is about to sign.
 *
 * - `no-licence`                none was ever entered
 * - `licence-not-yet` · `licence-ended` · `licence-not-accepted-here`  none is valid; this is what there is
 * - `licence-not-chosen`        several are valid, and nobody said which one signs
 * - `chosen-licence-not-valid`  the one that was chosen is not valid on the day
 * - `no-registration`           a controlled drug, and no registration of the signer
 * - `registration-not-yet` · `registration-ended`  there is one for this jurisdiction, not for this day
 * - `registration-elsewhere`    one is valid, for another jurisdiction than that of the licence that signs
 */
export type SigningLackCode =
  | 'no-licence'
  | 'licence-not-yet'
  | 'licence-ended'
  | 'licence-not-accepted-here'
  | 'licence-not-chosen'
  | 'chosen-licence-not-valid'
  | 'no-registration'
  | 'registration-not-yet'
  | 'registration-ended'
  | 'registration-elsewhere'

export interface SigningLack {
  code: SigningLackCode
  params: {
    number?: string
    jurisdiction?: string
    /** First day of what is not valid yet, last day of what has ended. */
    on?: FacilityDate
    count?: number
    schedule?: ControlledSchedule
  }
}

export interface SigningQuestion<L extends HeldLicence> {
  licences: readonly L[]
  /** Facility date of the signature. */
  on: FacilityDate
  /** Jurisdictions the facility accepts. */
  accepted: readonly string[]
  /** Id of the licence the signer chose; null when nobody chose one. */
  chosenId: string | null
  /** Schedule of the drug that is signed for; null of a drug in none, and of everything that is no drug. */
  controlledSchedule: ControlledSchedule | null
}

export interface SigningAnswer<L extends HeldLicence> {
  /** The licences that may sign on the day; where there are several the signer chooses. */
  choices: L[]
  /** The one that signs; null while something lacks. */
  licence: L | null
  /** The registration that a controlled drug is signed under; null where none is asked for or none is valid. */
  registration: L | null
  /** Empty when it may be signed. */
  lacks: SigningLack[]
}

/**
 * Which licence signs, and what the signer lacks. One valid licence is used by itself; of several none is chosen for the
 * signer. A controlled drug asks for a registration besides, valid on the same day for the jurisdiction of that licence.
 *
 * @source product invariant 5; that the registration is for the same jurisdiction is project-default
 */
export function signingLicence<L extends HeldLicence>(question: SigningQuestion<L>): SigningAnswer<L> {
  const { licences, on, accepted, chosenId, controlledSchedule: schedule } = question
  const stateOf = (one: L) => licenceState(one, on, accepted)
  const ofClass = (wanted: LicenceClass) => licences.filter((one) => one.class === wanted)
  const choices = ofClass('veterinary').filter((one) => stateOf(one) === 'valid')
  const licence =
    chosenId === null
      ? choices.length === 1
        ? (choices[0] ?? null)
        : null
      : (choices.find(({ id }) => id === chosenId) ?? null)
  const lacks: SigningLack[] = []
  if (choices.length === 0) lacks.push(whyNoLicence(ofClass('veterinary'), stateOf))
  else if (licence === null)
    lacks.push(
      chosenId === null
        ? { code: 'licence-not-chosen', params: { count: choices.length } }
        : { code: 'chosen-licence-not-valid', params: {} },
    )
  let registration: L | null = null
  if (schedule !== null) {
    const held = ofClass('controlled-substance')
    const isFor = (one: L) => (licence ? isSameJurisdiction(one.jurisdiction, licence.jurisdiction) : true)
    const valid = held.filter((one) => stateOf(one) === 'valid')
    const fitting = valid.filter(isFor)
    if (fitting.length === 0)
      lacks.push(whyNoRegistration({ held, valid, isFor, stateOf, schedule, licence }))
    // with the licence still to be chosen it is not known for which jurisdiction it has to be
    else if (licence !== null) registration = longest(fitting)
  }
  return { choices, licence: lacks.length === 0 ? licence : null, registration, lacks }
}

const longest = <L extends HeldLicence>(some: readonly L[]): L | null =>
  some.reduce<L | null>((best, one) => (best === null || lastDayOf(one) > lastDayOf(best) ? one : best), null)

const told = (one: HeldLicence, on?: FacilityDate): SigningLack['params'] => ({
  number: one.number,
  jurisdiction: one.jurisdiction,
  ...(on === undefined ? {} : { on }),
})

function whyNoLicence<L extends HeldLicence>(
  held: readonly L[],
  stateOf: (one: L) => LicenceState,
): SigningLack {
  const elsewhere = longest(held.filter((one) => stateOf(one) === 'not-accepted-here'))
  if (elsewhere) return { code: 'licence-not-accepted-here', params: told(elsewhere) }
  const coming = longest(held.filter((one) => stateOf(one) === 'not-yet'))
  if (coming) return { code: 'licence-not-yet', params: told(coming, coming.validFrom) }
  const over = longest(held.filter((one) => ['expired', 'ended'].includes(stateOf(one))))
  if (over) return { code: 'licence-ended', params: told(over, lastDayOf(over)) }
  return { code: 'no-licence', params: {} }
}

function whyNoRegistration<L extends HeldLicence>(found: {
  held: readonly L[]
  valid: readonly L[]
  isFor: (one: L) => boolean
  stateOf: (one: L) => LicenceState
  schedule: ControlledSchedule
  licence: L | null
}): SigningLack {
  const { held, valid, isFor, stateOf, schedule } = found
  const here = held.filter(isFor)
  const coming = longest(here.filter((one) => stateOf(one) === 'not-yet'))
  if (coming) return { code: 'registration-not-yet', params: { ...told(coming, coming.validFrom), schedule } }
  const over = longest(here.filter((one) => ['expired', 'ended'].includes(stateOf(one))))
  if (over) return { code: 'registration-ended', params: { ...told(over, lastDayOf(over)), schedule } }
  const other = longest(valid) ?? longest(held.filter((one) => stateOf(one) === 'not-accepted-here'))
  if (other) return { code: 'registration-elsewhere', params: { ...told(other), schedule } }
  return { code: 'no-registration', params: { schedule } }
}
