import { type Instant, type Zone, isInstant } from '../time/instant.ts'
import { instantToMs, msToInstant } from '../time/instant-arithmetic.ts'
import { facilityDateOf, isZone } from '../time/facility-date.ts'
import { type Result, ok, refuse } from '../result.ts'
import type { CaseForClock, SharedWaterSpell } from './case-clock.ts'
import type { ClockEvent, ClockEventKind, EventOf } from './clock-event.ts'
import type { ClockPolicy } from './clock-policy.ts'

/** What the clock is asked: cases that may share water, all their events, and an instant. */
export interface ClockQuestion {
  cases: readonly CaseForClock[]
  /** Of all the cases, in any order; events after `asOf` have not happened yet. */
  events: readonly ClockEvent[]
  sharedWater?: readonly SharedWaterSpell[]
  asOf: Instant
  /** The facility's zone, by whose calendar days are counted. */
  zone: Zone
}

export type ClockRefusal =
  | 'not-an-instant'
  | 'unknown-zone'
  | 'unknown-case'
  | 'duplicate-case'
  | 'policy-not-whole-days'
  | 'sample-taken-after-report'

/** A case with the events that count for it, in time order. */
export interface PreparedCase {
  given: CaseForClock
  policy: ClockPolicy
  events: readonly ClockEvent[]
  /** Results reported after clearance: the only thing that still concerns a cleared case. */
  resultsAfterClearance: readonly EventOf<'sample-result'>[]
  closed: EventOf<'closed'> | null
  /** The clearance, or the transfer of the whole batch, whichever was first. */
  ended: EventOf<'cleared'> | EventOf<'transferred-out'> | null
  /** The asked instant, or the end of the case if that was earlier. */
  asOf: Instant
}

/** Events of one kind, in time order. */
export function eventsOf<K extends ClockEventKind>(events: readonly ClockEvent[], kind: K): EventOf<K>[] {
  return events.filter((event): event is ClockEvent & EventOf<K> => event.kind === kind)
}

/**
 * Takes out what is voided, given twice or not yet happened, puts the rest in time order and deals it to the cases.
 * After this nothing depends on the order in which events were entered.
 */
export function prepareCases(question: ClockQuestion): Result<PreparedCase[], ClockRefusal> {
  const { cases, events, sharedWater = [], asOf, zone } = question
  if (!isInstant(asOf)) return refuse('not-an-instant', 'asOf')
  if (!isZone(zone)) return refuse('unknown-zone', 'zone', { zone })
  const ids = new Set(cases.map((one) => one.caseId))
  if (ids.size !== cases.length) return refuse('duplicate-case', 'cases')
  for (const spell of sharedWater) {
    if (!isInstant(spell.from) || (spell.until !== null && !isInstant(spell.until)))
      return refuse('not-an-instant', 'sharedWater', { spellId: spell.spellId })
  }

  const byId = new Map<string, ClockEvent>()
  for (const event of events) {
    const { eventId } = event
    if (!isInstant(event.at)) return refuse('not-an-instant', 'events', { eventId })
    if (!ids.has(event.caseId)) return refuse('unknown-case', 'events', { eventId, caseId: event.caseId })
    if (event.kind === 'sample-result') {
      if (!isInstant(event.takenAt)) return refuse('not-an-instant', 'events', { eventId })
      if (instantToMs(event.takenAt) > instantToMs(event.at))
        return refuse('sample-taken-after-report', 'events', { eventId })
    }
    byId.set(eventId, event)
  }
  // Voids themselves cannot be voided, so that it does not matter which of two is read first.
  const voidedIds = new Set(eventsOf([...byId.values()], 'voided').map(({ voidsEventId }) => voidsEventId))
  const live = [...byId.values()]
    .filter(({ eventId, kind }) => kind !== 'voided' && !voidedIds.has(eventId))
    .filter(({ at }) => instantToMs(at) <= instantToMs(asOf))
    .sort(inClockOrder)

  const prepared: PreparedCase[] = []
  for (const given of cases) {
    const own = live.filter((event) => event.caseId === given.caseId)
    const policy = eventsOf(own, 'protocol-changed').at(-1)?.policy ?? given.policy
    const fault = findPolicyFault(policy)
    if (fault) return refuse('policy-not-whole-days', fault, { caseId: given.caseId })
    const ended =
      own.find(
        (event): event is EventOf<'cleared'> | EventOf<'transferred-out'> =>
          event.kind === 'cleared' || event.kind === 'transferred-out',
      ) ?? null
    const endMs = ended ? instantToMs(ended.at) : Infinity
    prepared.push({
      given,
      policy,
      events: own.filter((event) => instantToMs(event.at) <= endMs || isAfterword(event)),
      resultsAfterClearance: eventsOf(own, 'sample-result').filter(
        (event) =>
          ended?.kind === 'cleared' && instantToMs(event.at) > endMs && instantToMs(event.takenAt) <= endMs,
      ),
      closed: eventsOf(own, 'closed')[0] ?? null,
      ended,
      asOf: ended ? ended.at : msToInstant(instantToMs(asOf)),
    })
  }
  return ok(prepared)
}

/** Decisions may still be taken about a case that has ended. */
function isAfterword(event: ClockEvent): boolean {
  return event.kind === 'unlocked' || event.kind === 'exposure-decided'
}

/** Time order, and at one instant by id, so that equal sets of events are always read alike. */
export function inClockOrder(
  a: { at: Instant; eventId: string },
  b: { at: Instant; eventId: string },
): number {
  return instantToMs(a.at) - instantToMs(b.at) || (a.eventId < b.eventId ? -1 : Number(a.eventId > b.eventId))
}

function findPolicyFault(policy: ClockPolicy): string | null {
  const whole = ['requiredDays', 'deathExtensionDays', 'signsExtensionDays', 'maskingWindowDays'] as const
  for (const key of whole) if (!Number.isSafeInteger(policy[key]) || policy[key] < 0) return key
  for (const key of ['transportDeathHours', 'temperaturePauseHours'] as const)
    if (!Number.isFinite(policy[key]) || policy[key] < 0) return key
  for (const one of policy.criteria) {
    if (one.kind !== 'negatives') continue
    const figures = [one.count, one.daysApart, one.daysAfterMasking]
    if (figures.some((figure) => !Number.isSafeInteger(figure) || figure < 0) || one.count < 1)
      return 'criteria'
  }
  return null
}

/** The facility date of an event. */
export function dateOf(event: { at: Instant }, zone: Zone): string {
  return facilityDateOf(event.at, zone)
}
