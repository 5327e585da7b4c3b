import type { FacilityDate, Zone } from '../time/instant.ts'
import { addDays, daysBetween, facilityDateOf, laterDate } from '../time/facility-date.ts'
import { instantToMs } from '../time/instant-arithmetic.ts'
import { type Result, ok, refuse } from '../result.ts'
import type { CaseClock, ClearanceBound, ClockExtension, ClockLock, CriterionState } from './case-clock.ts'
import type { ClockReason } from './clock-reason.ts'
import { computeCriteria } from './compute-criteria.ts'
import { computeExtensions } from './compute-extensions.ts'
import { computeLocks } from './compute-locks.ts'
import { computePauses } from './compute-pauses.ts'
import { type DayZero, computeDayZeros, isCriticalPositive } from './compute-day-zeros.ts'
import {
  type ClockQuestion,
  type ClockRefusal,
  type PreparedCase,
  eventsOf,
  prepareCases,
} from './prepare-cases.ts'
import { type Sharing, buildSharing } from './build-sharing.ts'
import { listMilestones } from './list-milestones.ts'
import { listUnmet } from './list-unmet.ts'

/**
 * The clocks of cases that may share water, as of an instant (rules K01 to K16).
 *
 * Pure and total over any set of events: the same events give the same clocks, in whatever order they were entered.
 * Days are calendar dates of the facility; only pauses and the journey of a dead animal are measured in true hours.
 * The earliest clearance is the latest of day 0 + N + paused days, the end of every extension and the day of every
 * criterion that is met; there is none while the batch is open or the case locked.
 *
 * @param question cases, their events, shared water, the instant and the facility's zone
 * @returns one clock per case, in the order given
 * @refuses not-an-instant | unknown-zone | unknown-case (an event of none of the cases) | duplicate-case |
 * policy-not-whole-days | sample-taken-after-report
 * @source quarantine-practice for the 30 days and the restart by the same kind; all else project-default
 */
export function computeClocks(question: ClockQuestion): Result<CaseClock[], ClockRefusal> {
  const prepared = prepareCases(question)
  if (!prepared.ok) return prepared
  const asOfMs = instantToMs(question.asOf)
  const sharing = buildSharing(question.sharedWater ?? [], prepared.value, asOfMs)
  const dayZeros = computeDayZeros(prepared.value, sharing, question.zone)
  return ok(
    prepared.value.map((one) => {
      const zero = dayZeros.get(one.given.caseId) ?? {
        day0On: null,
        lastEntryOn: null,
        legs: [],
        reasons: [],
      }
      return computeOne(one, prepared.value, sharing, zero, asOfMs, question.zone)
    }),
  )
}

/**
 * The clock of one case; the others in the question matter only as far as they share its water.
 *
 * @refuses unknown-case, and as `computeClocks`
 */
export function computeClock(question: ClockQuestion, caseId: string): Result<CaseClock, ClockRefusal> {
  const clocks = computeClocks(question)
  if (!clocks.ok) return clocks
  const clock = clocks.value.find((one) => one.caseId === caseId)
  return clock ? ok(clock) : refuse('unknown-case', 'caseId', { caseId })
}

function computeOne(
  one: PreparedCase,
  all: readonly PreparedCase[],
  sharing: Sharing,
  zero: DayZero,
  asOfMs: number,
  zone: Zone,
): CaseClock {
  const asOfOn = facilityDateOf(one.asOf, zone)
  const day0On = one.closed ? zero.day0On : null
  const legs = one.closed ? zero.legs : []
  const { isRunning, reasons: pauseReasons, ...paused } = computePauses(one, all, sharing, day0On, zone)
  const { locks, reasons: lockReasons } = computeLocks(one, all, sharing, asOfMs, zone)
  const extending = computeExtensions(one, legs, zone)
  const tests = computeCriteria(one, day0On, extending.lastMaskOn, extending.maskRunning, zone)
  const extensions = extending.extensions.map((extension) => endWhenMetAgain(one, extension, tests.criteria))

  const standing = locks.filter((lock) => lock.liftedAt === null)
  const isLocked = standing.length > 0
  const lengthOn = day0On === null ? null : addDays(day0On, one.policy.requiredDays + paused.pausedDays)
  const bounds = lengthOn === null ? [] : listBounds(lengthOn, extensions, tests.criteria)
  const earliestIfUnlockedOn = bounds.find(({ binds }) => binds)?.on ?? null
  const clock: CaseClock = {
    caseId: one.given.caseId,
    asOfOn,
    status: statusOf(one, standing),
    day0On,
    lastEntryOn: zero.lastEntryOn,
    dayNumber: day0On === null ? null : daysBetween(day0On, asOfOn),
    requiredDays: one.policy.requiredDays,
    legs,
    ...paused,
    extensions,
    locks,
    criteria: tests.criteria,
    earliestClearanceOn: isLocked ? null : earliestIfUnlockedOn,
    earliestIfUnlockedOn,
    bounds,
    unmet: [],
    decisionsDue: [...listDecisions(one, standing), ...tests.decisionsDue],
    sharesWaterWith: sharing.partnersAt(one.given.caseId, asOfMs),
    reasons: [
      ...listMilestones(one, zero, zone),
      ...zero.reasons,
      ...pauseReasons,
      ...lockReasons,
      ...extending.reasons.map((reason) => fallWhenMetAgain(reason, extensions)),
      ...tests.reasons,
    ].sort(inHistoryOrder),
  }
  return { ...clock, unmet: listUnmet(clock, isRunning) }
}

/** A lesser positive stops extending once its test's criterion has been met by samples taken after it. */
function endWhenMetAgain(
  one: PreparedCase,
  extension: ClockExtension,
  criteria: readonly CriterionState[],
): ClockExtension {
  if (extension.kind !== 'positive' || extension.state !== 'standing') return extension
  const positive = eventsOf(one.events, 'sample-result').find(({ eventId }) => eventId === extension.eventId)
  const own = one.policy.criteria.filter(
    (criterion) => criterion.kind === 'negatives' && criterion.testKey === positive?.testKey,
  )
  const states = own.map(({ criterionId }) => criteria.find((state) => state.criterionId === criterionId))
  const metOn = states.map((state) => state?.metOn ?? null)
  if (metOn.length === 0 || metOn.some((day) => day === null)) return extension
  return { ...extension, untilOn: metOn.reduce((a, b) => laterDate(a ?? '', b ?? '')), state: 'ended' }
}

function fallWhenMetAgain(reason: ClockReason, extensions: readonly ClockExtension[]): ClockReason {
  if (reason.code !== 'extended-positive') return reason
  const own = extensions.find(({ eventId }) => eventId === reason.eventId)
  return own?.state === 'ended' ? { ...reason, standing: false } : reason
}

/** Every date that the earliest clearance is the latest of; the first of the latest ones binds. */
function listBounds(
  lengthOn: FacilityDate,
  extensions: readonly ClockExtension[],
  criteria: readonly CriterionState[],
): ClearanceBound[] {
  const bounds: ClearanceBound[] = [{ kind: 'length', on: lengthOn, id: '', binds: false }]
  for (const { state, untilOn, eventId } of extensions)
    if (state === 'standing' && untilOn !== null)
      bounds.push({ kind: 'extension', on: untilOn, id: eventId, binds: false })
  for (const { metOn, criterionId } of criteria)
    if (metOn !== null) bounds.push({ kind: 'criterion', on: metOn, id: criterionId, binds: false })
  const latest = bounds.map(({ on }) => on).reduce(laterDate)
  const binding = bounds.find(({ on }) => on === latest)
  return bounds.map((bound) => ({ ...bound, binds: bound === binding }))
}

function statusOf(one: PreparedCase, standing: readonly ClockLock[]): CaseClock['status'] {
  if (one.ended?.kind === 'cleared')
    return standing.some(({ cause }) => cause === 'recall') ? 'recalled' : 'cleared'
  if (one.ended) return 'transferred'
  if (standing.length > 0) return 'locked'
  return one.closed ? 'in-quarantine' : 'open'
}

function listDecisions(one: PreparedCase, standing: readonly ClockLock[]): CaseClock['decisionsDue'] {
  const decided = new Set(
    eventsOf(one.events, 'exposure-decided').map(({ exposureEventId }) => exposureEventId),
  )
  const exposures = eventsOf(one.events, 'cleared-water-joined')
    .filter(({ eventId }) => !decided.has(eventId))
    .map(({ eventId, animalCount }) => ({
      code: 'exposure' as const,
      eventId,
      params: { animalCount: animalCount ?? 0 },
    }))
  const recalls = standing
    .filter(({ cause }) => cause === 'recall')
    .map(({ eventId }) => ({ code: 'recall' as const, eventId, params: {} }))
  const treated = new Set(
    [...eventsOf(one.events, 'treatment-started'), ...eventsOf(one.events, 'treatment-ended')].map(
      ({ forResultEventId }) => forResultEventId,
    ),
  )
  const untreated = eventsOf(one.events, 'sample-result')
    .filter((event) => isCriticalPositive(event) && !treated.has(event.eventId))
    .filter(({ eventId }) => standing.some((lock) => lock.eventId === eventId))
    .map(({ eventId, pathogenName }) => ({
      code: 'positive-untreated' as const,
      eventId,
      params: { pathogenName: pathogenName ?? '' },
    }))
  return [...exposures, ...recalls, ...untreated]
}

function inHistoryOrder(a: ClockReason, b: ClockReason): number {
  return (
    instantToMs(a.at) - instantToMs(b.at) ||
    (a.eventId < b.eventId ? -1 : Number(a.eventId > b.eventId)) ||
    (a.code < b.code ? -1 : Number(a.code > b.code))
  )
}
