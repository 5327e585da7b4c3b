import type { askQuarantineClock } from '../../../shared/contracts/bench-questions.contract.ts'
import type { BodyOf, ReplyOf } from '../../../shared/contracts/contract.ts'
import type { CaseClock } from '../../../shared/domain/quarantine/case-clock.ts'
import type { ClockEvent } from '../../../shared/domain/quarantine/clock-event.ts'
import { defaultClockPolicy, type ClockPolicy } from '../../../shared/domain/quarantine/clock-policy.ts'
import { computeClock } from '../../../shared/domain/quarantine/compute-clocks.ts'
import { addDays, isZone } from '../../../shared/domain/time/facility-date.ts'
import { instantToMs, msToInstant } from '../../../shared/domain/time/instant-arithmetic.ts'
import { startOfFacilityDay } from '../../../shared/domain/time/local-time.ts'
import { benchQuestionWords } from '../../../shared/messages/bench-questions.ts'
import { sayClockReason, type ClockWords } from '../../../shared/messages/say-clock-reason.ts'
import { sayDate, sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import { sayUnmet } from '../../../shared/messages/say-unmet.ts'
import { refused } from './refused.ts'

type Asked = BodyOf<typeof askQuarantineClock>

const caseId = 'batch'

/**
 * The clock of one batch, from what is said about it and nothing else.
 *
 * @throws Problem not-computable: unknown-zone, duplicate-event, unknown-event, unknown-pause, unknown-criterion,
 *         sample-taken-after-report
 */
export function answerQuarantineClock(asked: Asked): ReplyOf<typeof askQuarantineClock> {
  const { zone, quarantineKind } = asked
  if (!isZone(zone)) throw refused('/zone', 'unknown-zone', benchQuestionWords.unknownZone)
  const policy: ClockPolicy = { ...defaultClockPolicy, ...asked.policy }
  const events = asked.events.map((event, index) => ({
    ...event,
    caseId,
    eventId: event.eventId ?? String(index + 1),
  })) as ClockEvent[]
  const names = new Set<string>()
  for (const [index, { eventId }] of events.entries()) {
    if (names.has(eventId))
      throw refused(`/events/${index}/eventId`, 'duplicate-event', benchQuestionWords.duplicateEvent)
    names.add(eventId)
  }
  refuseUnknownReferences(events, policy)
  const question = {
    cases: [{ caseId, quarantineKind, policy }],
    events,
    asOf: asked.asOf.includes('T') ? asked.asOf : endOfDay(asked.asOf, zone),
    zone,
  }
  const clock = computeClock(question, caseId)
  if (clock.ok) return presentClock(clock.value, zone, policy)
  const { code, field, params } = clock.refusal
  const at = events.findIndex(({ eventId }) => eventId === params?.eventId)
  const pointer = at < 0 ? `/${field ?? ''}` : `/events/${at}`
  throw refused(
    pointer,
    code,
    code === 'sample-taken-after-report'
      ? benchQuestionWords.sampleTakenAfterReport
      : benchQuestionWords.notUnderstood,
  )
}

/** Which of an event's fields names another event. */
const references = [
  'voidsEventId',
  'deathEventId',
  'extensionEventId',
  'lockEventId',
  'exposureEventId',
  'forResultEventId',
] as const

/** A slip in a name would leave a lock lifted or a death unexplained without a word: every name has to lead somewhere. */
function refuseUnknownReferences(events: readonly ClockEvent[], policy: ClockPolicy): void {
  const names = new Set(events.map(({ eventId }) => eventId))
  const pauses = new Set(events.map((event) => (event.kind === 'pause-started' ? event.pauseId : '')))
  const policies = events.flatMap((event) => (event.kind === 'protocol-changed' ? [event.policy] : []))
  const criteria = new Set(
    [policy, ...policies].flatMap((one) => one.criteria.map(({ criterionId }) => criterionId)),
  )
  for (const [index, event] of events.entries()) {
    const fields: Partial<Record<string, unknown>> = { ...event }
    const named = references.find((field) => {
      const name = fields[field]
      return typeof name === 'string' && (name === event.eventId || !names.has(name))
    })
    if (named) throw refused(`/events/${index}/${named}`, 'unknown-event', benchQuestionWords.unknownEvent)
    if (event.kind === 'pause-ended' && !pauses.has(event.pauseId))
      throw refused(`/events/${index}/pauseId`, 'unknown-pause', benchQuestionWords.unknownPause)
    if (event.kind === 'criterion-declared' && !criteria.has(event.criterionId))
      throw refused(`/events/${index}/criterionId`, 'unknown-criterion', benchQuestionWords.unknownCriterion)
  }
}

const endOfDay = (date: string, zone: string) =>
  msToInstant(instantToMs(startOfFacilityDay(addDays(date, 1), zone)) - 1)

function presentClock(
  clock: CaseClock,
  zone: string,
  policy: ClockPolicy,
): ReplyOf<typeof askQuarantineClock> {
  const words: ClockWords = {
    date: sayDate,
    instant: (at) => sayInstantWithOffset(at, zone),
    caseName: (id) => id,
    criterionName: (id) => id,
    testName: (key) => key,
  }
  const { legs, locks, pauses, extensions, unmet, reasons } = clock
  return {
    status: clock.status,
    asOfOn: clock.asOfOn,
    day0On: clock.day0On,
    dayNumber: clock.dayNumber,
    requiredDays: clock.requiredDays,
    pausedMinutes: clock.pausedMinutes,
    pausedDays: clock.pausedDays,
    earliestClearanceOn: clock.earliestClearanceOn,
    earliestIfUnlockedOn: clock.earliestIfUnlockedOn,
    legs: legs.map(({ day0On, startedByEventId, endedByEventId, endedOn, daysRun }) => ({
      day0On,
      startedByEventId,
      endedByEventId,
      endedOn,
      daysRun,
    })),
    holds: [
      ...locks
        .filter(({ liftedAt }) => liftedAt === null)
        .map(({ eventId, cause, from }) => ({ eventId, kind: 'lock' as const, cause, from })),
      ...pauses
        .filter(({ until }) => until === null)
        .map(({ eventId, cause, from }) => ({ eventId, kind: 'pause' as const, cause, from })),
    ],
    extensions: extensions.map(({ eventId, kind, fromOn, untilOn, provisional, state }) => ({
      eventId,
      kind,
      fromOn,
      untilOn,
      provisional,
      state,
    })),
    unmet: unmet.map(({ code, params, overridable }) => ({
      code,
      params,
      overridable,
      text: sayUnmet({ code, params }, words),
    })),
    reasons: reasons.map((reason) => ({
      code: reason.code,
      eventId: reason.eventId,
      at: reason.at,
      standing: reason.standing,
      params: { ...reason.params },
      text: sayClockReason(reason, words),
    })),
    policy: { ...policy, criteria: [...policy.criteria] },
  }
}
