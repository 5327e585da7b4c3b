import type { FacilityDate } from '../time/instant.ts'
import type { CaseClock } from './case-clock.ts'
import type { ClockReason } from './clock-reason.ts'

/** What an event changed: shown before it is recorded, kept with it afterwards, and shown again when it is voided. */
export interface ClockChange {
  caseId: string
  day0On: { before: FacilityDate | null; after: FacilityDate | null } | null
  earliestClearanceOn: { before: FacilityDate | null; after: FacilityDate | null } | null
  status: { before: CaseClock['status']; after: CaseClock['status'] } | null
  /** Reasons that only the later clock has, or that count in only one of them. */
  newReasons: ClockReason[]
  goneReasons: ClockReason[]
}

/**
 * The difference between two clocks of one case. Null where a thing stayed the same.
 *
 * @param before without the event (or before it was voided)
 * @param after  with it, as of the same instant
 */
export function compareClocks(before: CaseClock, after: CaseClock): ClockChange {
  const changed = <T>(a: T, b: T) => (a === b ? null : { before: a, after: b })
  const keyOf = (reason: ClockReason) =>
    JSON.stringify([reason.eventId, reason.code, reason.standing, reason.params])
  const had = new Set(before.reasons.map(keyOf))
  const has = new Set(after.reasons.map(keyOf))
  return {
    caseId: after.caseId,
    day0On: changed(before.day0On, after.day0On),
    earliestClearanceOn: changed(before.earliestClearanceOn, after.earliestClearanceOn),
    status: changed(before.status, after.status),
    newReasons: after.reasons.filter((reason) => !had.has(keyOf(reason))),
    goneReasons: before.reasons.filter((reason) => !has.has(keyOf(reason))),
  }
}
