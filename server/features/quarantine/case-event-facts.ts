import type { ProtocolContent } from '../../../shared/domain/protocol/protocol-content.ts'
import type { ClockEventBody } from '../../../shared/domain/quarantine/clock-event.ts'

/** The version that a case was changed to; carried along, so that nobody has to ask later what it said. */
export interface ProtocolTaken {
  versionId: string
  code: string
  version: number
  name: string
  content: ProtocolContent
}

export type ProtocolChanged = Extract<ClockEventBody, { kind: 'protocol-changed' }> & {
  protocol: ProtocolTaken
}

/**
 * Bodies that stand in a case though they have no animal of it: nobody could name them, or they were named as an animal
 * that was elsewhere. These wait until somebody explained how it came there.
 */
export type BodiesFound = Extract<ClockEventBody, { kind: 'death' }> & {
  /** The death that they were named as. */
  diedElsewhereId?: string
}

/** What is stored of an event: what the clock reads of it. Deaths and additions of animals come from their ledgers. */
export type CaseEventFacts =
  Exclude<ClockEventBody, { kind: 'protocol-changed' | 'death' }> | ProtocolChanged | BodiesFound
