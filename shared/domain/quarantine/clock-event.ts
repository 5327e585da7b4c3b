import type { FacilityDate, Instant } from '../time/instant.ts'
import type { ClockPolicy } from './clock-policy.ts'
import type { QuarantineKind } from './quarantine-kind.ts'

/**
 * What can happen to a quarantine case. The clock is computed from these alone, in any order of entry; a correction is
 * a `voided` event and a new one.
 */
export type ClockEvent = ClockEventBase & ClockEventBody

interface ClockEventBase {
  eventId: string
  caseId: string
  /** When it happened. For a result: when it was reported. */
  at: Instant
}

/** Animals as words for a sentence; nothing is computed from it. `heldAfter` = how many there were afterwards. */
interface WhoCame {
  animalCount?: number
  /** One animal's common name in lower case, e.g. `ray`. */
  animalName?: string
  heldAfter?: number
}

interface Treatment {
  treatmentId: string
  agentName: string
  /** Whether it hides what the protocol's tests look for (K14). */
  masks: boolean
  /** Replaces the policy's window for this treatment. */
  windowDays?: number
  /** A vet declared prophylaxis that runs on past clearance; it then delays nothing. */
  continues?: boolean
  /** The positive result that it treats. */
  forResultEventId?: string
}

export type ClockEventBody =
  /** A box, crate or animal of the batch came in. After closing it is an addition. */
  | ({ kind: 'arrival'; quarantineKind: QuarantineKind } & WhoCame)
  /** The last of the batch is in (K02). */
  | { kind: 'closed' }
  /** Something entered after closing (K06 a, b). */
  | ({
      kind: 'addition'
      what: 'animals' | 'wet-material' | 'undisinfected-gear'
      /** Of the animals; null for material and gear. */
      quarantineKind: QuarantineKind | null
      into: 'same-water' | 'connected-water' | 'same-room'
    } & WhoCame)
  /** Contact with another unit (K06 c). */
  | {
      kind: 'breach'
      how: 'escape' | 'splash' | 'net' | 'other'
      otherUnitStatus: 'lower' | 'same-or-higher'
    }
  /** `arrivedAt`: of the dead animal itself, when it did not come with the batch's last box. */
  | { kind: 'death'; deathCount?: number; arrivedAt?: Instant }
  | {
      kind: 'death-cause-signed'
      deathEventId: string
      finding: 'explained-not-transmissible' | 'explained-transmissible' | 'unexplained'
      cause?: string
    }
  /** A vet says that a death soon after arrival extends all the same. */
  | { kind: 'transport-death-extends'; deathEventId: string }
  | { kind: 'clinical-signs'; signs?: string }
  /** `subject`: the animal, or the group as a whole. */
  | { kind: 'not-feeding'; subject: string }
  | { kind: 'feeding'; subject: string }
  /** A vet ends an extension. */
  | { kind: 'extension-ended'; extensionEventId: string }
  | ({ kind: 'treatment-started'; plannedEndOn?: FacilityDate } & Treatment)
  /** The agent is out of the water or the last dose given, whichever is later. */
  | ({ kind: 'treatment-ended' } & Treatment)
  | { kind: 'pause-started'; pauseId: string; cause: 'life-support-failure' | 'temperature-out-of-range' }
  | { kind: 'pause-ended'; pauseId: string }
  | {
      kind: 'sample-result'
      sampleId: string
      testKey: string
      takenAt: Instant
      result: 'negative' | 'positive' | 'inconclusive' | 'insufficient'
      /** Of a positive: what was found, and whether it is on the notifiable list or critical to this facility. */
      pathogenName?: string
      pathogenStatus?: 'listed' | 'facility-critical' | 'other'
    }
  /** `held`: anyone at the tank may hold a case; it is not shared over the water. */
  | { kind: 'locked'; cause: 'notifiable-suspicion' | 'veterinarian' | 'held' }
  /** A vet lifts a lock or hold; also a lock that came over shared water, for this case only. */
  | { kind: 'unlocked'; lockEventId: string }
  | { kind: 'criterion-declared'; criterionId: string; met: boolean }
  | { kind: 'protocol-changed'; policy: ClockPolicy }
  /** Water of this case became connected to water of cleared animals (K13). */
  | { kind: 'cleared-water-joined'; animalCount?: number }
  | { kind: 'exposure-decided'; exposureEventId: string; decision: 'new-case' | 'no-case' }
  /** The vet's signed end of quarantine. */
  | { kind: 'cleared' }
  /** The whole batch left for another quarantine (K05). */
  | { kind: 'transferred-out' }
  /** As if the other event had never been (K16). A void cannot itself be voided: the event is entered again. */
  | { kind: 'voided'; voidsEventId: string }

export type ClockEventKind = ClockEventBody['kind']

export type EventOf<K extends ClockEventKind> = ClockEventBase & Extract<ClockEventBody, { kind: K }>
