import type { FacilityDate, Instant } from '../time/instant.ts'

/** Rules of the clock, as named in docs/domain.md. For code and tests; never shown on screen. */
export type ClockRule =
  | 'K02'
  | 'K05'
  | 'K06'
  | 'K07'
  | 'K08'
  | 'K09'
  | 'K10'
  | 'K11'
  | 'K12'
  | 'K13'
  | 'K14'
  | 'K15'
  | 'protocol'
  | 'clearance'

/**
 * What each reason says, for its sentence. Names ending in `On` are facility dates and in `At` instants, so that one
 * renderer can write them out; `''` and 0 stand for "not told".
 */
export interface ClockReasonParams {
  started: { day0On: FacilityDate; closedOn: FacilityDate }
  'restarted-animals': WhoCameParams & { happenedOn: FacilityDate; water: 'same-water' | 'connected-water' }
  'restarted-wet-material': { happenedOn: FacilityDate }
  'restarted-same-room': WhoCameParams & { happenedOn: FacilityDate }
  'restarted-gear': { happenedOn: FacilityDate }
  'restarted-breach': { happenedOn: FacilityDate; how: 'escape' | 'splash' | 'net' | 'other' }
  'restarted-after-positive': { pathogenName: string; endedOn: FacilityDate }
  'restarted-shared-water': { happenedOn: FacilityDate; otherCaseId: string; day0On: FacilityDate }
  'no-restart-other-kind': WhoCameParams & { happenedOn: FacilityDate }
  'no-restart-other-water': { happenedOn: FacilityDate }
  'no-restart-status': { happenedOn: FacilityDate }
  'no-restart-counted': { happenedOn: FacilityDate; day0On: FacilityDate }
  'shared-water': { happenedOn: FacilityDate; otherCaseId: string }
  'extended-death': { happenedOn: FacilityDate; days: number; untilOn: FacilityDate; deathCount: number }
  'extended-transmissible-death': {
    happenedOn: FacilityDate
    days: number
    untilOn: FacilityDate
    cause: string
  }
  'death-explained': { happenedOn: FacilityDate; signedOn: FacilityDate; cause: string }
  'transport-death': { happenedOn: FacilityDate; hours: number; limitHours: number }
  'extended-signs': { happenedOn: FacilityDate; days: number; untilOn: FacilityDate; signs: string }
  'extended-masking': { agentName: string; endedOn: FacilityDate; days: number; untilOn: FacilityDate }
  'extended-masking-running': {
    agentName: string
    startedOn: FacilityDate
    days: number
    untilOn: FacilityDate
  }
  'not-masking': { agentName: string; happenedOn: FacilityDate }
  'masking-continues': { agentName: string; happenedOn: FacilityDate }
  'extended-not-feeding': { subject: string; happenedOn: FacilityDate; halfWayOn: FacilityDate }
  'extended-positive': { pathogenName: string; takenOn: FacilityDate }
  'extension-ended': { endedOn: FacilityDate }
  paused: {
    cause: 'life-support-failure' | 'temperature-out-of-range'
    fromAt: Instant
    untilAt: Instant
    minutes: number
  }
  'pause-running': {
    cause: 'life-support-failure' | 'temperature-out-of-range'
    fromAt: Instant
    minutes: number
  }
  'paused-shared-water': { otherCaseId: string; fromAt: Instant; untilAt: Instant; minutes: number }
  'no-pause-short': { fromAt: Instant; untilAt: Instant; limitHours: number }
  'locked-positive': { pathogenName: string; reportedOn: FacilityDate }
  'locked-suspicion': { happenedOn: FacilityDate }
  'locked-by-vet': { happenedOn: FacilityDate }
  held: { happenedOn: FacilityDate }
  'locked-shared-water': { happenedOn: FacilityDate; otherCaseId: string }
  recalled: { pathogenName: string; takenOn: FacilityDate; reportedOn: FacilityDate }
  unlocked: { happenedOn: FacilityDate }
  'negatives-counted': { testKey: string; takenOn: FacilityDate; count: number; wanted: number }
  'negative-not-counted': { testKey: string; takenOn: FacilityDate; daysApart: number }
  'negative-before-day0': { testKey: string; takenOn: FacilityDate; day0On: FacilityDate }
  'negatives-reset': { testKey: string; takenOn: FacilityDate }
  'repeat-due': { testKey: string; takenOn: FacilityDate; result: 'inconclusive' | 'insufficient' }
  'criterion-met': { criterionId: string; metOn: FacilityDate }
  'criterion-not-met': { criterionId: string; happenedOn: FacilityDate }
  'cleared-animals-exposed': { happenedOn: FacilityDate; animalCount: number }
  'exposure-decided': { happenedOn: FacilityDate; decision: 'new-case' | 'no-case' }
  'protocol-changed': { happenedOn: FacilityDate; fromDays: number; toDays: number }
  cleared: { happenedOn: FacilityDate }
  'transferred-out': { happenedOn: FacilityDate }
}

interface WhoCameParams {
  animalCount: number
  animalName: string
  heldAfter: number
}

export type ClockReasonCode = keyof ClockReasonParams

/** What the event did to the clock. */
export type ClockEffect =
  | { kind: 'day-zero'; fromOn: FacilityDate | null; toOn: FacilityDate }
  | { kind: 'extension'; untilOn: FacilityDate | null }
  | { kind: 'pause'; minutes: number }
  | { kind: 'lock' }
  | { kind: 'criterion' }
  | { kind: 'length'; fromDays: number; toDays: number }
  | { kind: 'status' }
  | { kind: 'none' }

/** One entry of a case's history of its clock: which event, by which rule, did what. */
export type ClockReason = {
  [Code in ClockReasonCode]: {
    code: Code
    rule: ClockRule
    eventId: string
    at: Instant
    /** False when it no longer counts (a withdrawn extension, a lifted lock); history shows it all the same. */
    standing: boolean
    effect: ClockEffect
    params: ClockReasonParams[Code]
  }
}[ClockReasonCode]
