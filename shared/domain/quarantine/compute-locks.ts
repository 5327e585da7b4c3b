import type { Zone } from '../time/instant.ts'
import { facilityDateOf } from '../time/facility-date.ts'
import { instantToMs, msToInstant } from '../time/instant-arithmetic.ts'
import type { ClockLock, LockCause } from './case-clock.ts'
import type { ClockReason } from './clock-reason.ts'
import { isCriticalPositive, listTreatedPositives } from './compute-day-zeros.ts'
import { type PreparedCase, eventsOf } from './prepare-cases.ts'
import { type Sharing, intersect } from './build-sharing.ts'

export interface Locks {
  locks: ClockLock[]
  reasons: ClockReason[]
}

type OwnLock = Omit<ClockLock, 'fromCaseId'> & { reason: ClockReason }

/**
 * The locks of a case (rules K07, K08), those that came over shared water (K12), and recalls.
 *
 * A positive of a listed or facility-critical pathogen locks from its report until its treatment ends, and untreated
 * until a vet lifts it. A suspicion, a vet's lock and a hold stand until a vet lifts them. A lock that met a case over
 * shared water stays with it until the lock itself is lifted, also after the valve is shut again: shutting it does not
 * take back the water. A vet may lift it for that case alone. A hold is the case's own and is not shared.
 */
export function computeLocks(
  one: PreparedCase,
  all: readonly PreparedCase[],
  sharing: Sharing,
  asOfMs: number,
  zone: Zone,
): Locks {
  const locks: ClockLock[] = []
  const reasons: ClockReason[] = []
  const unlocked = eventsOf(one.events, 'unlocked')
  const liftedBy = (eventId: string) => unlocked.find((event) => event.lockEventId === eventId)

  const add = (lock: ClockLock, reason: ClockReason) => {
    locks.push(lock)
    reasons.push({ ...reason, standing: lock.liftedAt === null })
    const lifting = liftedBy(lock.eventId)
    if (!lifting) return
    reasons.push({
      rule: 'K08',
      eventId: lifting.eventId,
      at: lifting.at,
      standing: true,
      code: 'unlocked',
      effect: { kind: 'lock' },
      params: { happenedOn: facilityDateOf(lifting.at, zone) },
    })
  }

  for (const { reason, ...lock } of [...listOwnLocks(one, zone), ...listRecalls(one, zone)])
    add({ ...lock, fromCaseId: null }, reason)

  for (const other of all) {
    if (other === one) continue
    const together = sharing.intervalsBetween(one.given.caseId, other.given.caseId)
    if (together.length === 0) continue
    for (const lock of listOwnLocks(other, zone)) {
      if (lock.cause === 'held') continue
      const untilMs = lock.liftedAt === null ? asOfMs + 1 : instantToMs(lock.liftedAt)
      const met = intersect({ fromMs: instantToMs(lock.from), untilMs }, together)[0]
      if (!met) continue
      const from = msToInstant(met.fromMs)
      const lifting = liftedBy(lock.eventId)
      const liftedHere = lifting && instantToMs(lifting.at) >= met.fromMs ? lifting.at : null
      const liftedAt =
        lock.liftedAt === null || liftedHere === null
          ? (lock.liftedAt ?? liftedHere)
          : [lock.liftedAt, liftedHere].sort((a, b) => instantToMs(a) - instantToMs(b))[0]
      add(
        {
          eventId: lock.eventId,
          cause: lock.cause,
          from,
          liftedAt: liftedAt ?? null,
          fromCaseId: other.given.caseId,
        },
        {
          rule: 'K12',
          eventId: lock.eventId,
          at: from,
          standing: true,
          code: 'locked-shared-water',
          effect: { kind: 'lock' },
          params: { happenedOn: facilityDateOf(from, zone), otherCaseId: other.given.caseId },
        },
      )
    }
  }
  return { locks, reasons }
}

function listOwnLocks(one: PreparedCase, zone: Zone): OwnLock[] {
  const found: OwnLock[] = []
  const unlocked = eventsOf(one.events, 'unlocked')
  const add = (eventId: string, from: string, cause: LockCause, treatedAt: string | null, words: Words) => {
    const byVet = unlocked.find(
      (event) => event.lockEventId === eventId && instantToMs(event.at) >= instantToMs(from),
    )
    const ends = [byVet?.at ?? null, treatedAt].filter((at) => at !== null)
    const liftedAt = ends.sort((a, b) => instantToMs(a) - instantToMs(b))[0] ?? null
    const base = { eventId, at: from, standing: true, effect: { kind: 'lock' } } as const
    found.push({ eventId, cause, from, liftedAt, reason: { ...base, ...words } as ClockReason })
  }
  for (const event of eventsOf(one.events, 'locked')) {
    const code = {
      'notifiable-suspicion': 'locked-suspicion',
      veterinarian: 'locked-by-vet',
      held: 'held',
    } as const
    add(event.eventId, event.at, event.cause, null, {
      rule: 'K08',
      code: code[event.cause],
      params: { happenedOn: facilityDateOf(event.at, zone) },
    })
  }
  for (const event of eventsOf(one.events, 'sample-result').filter(isCriticalPositive)) {
    const ends = listTreatedPositives(one).filter(({ positive }) => positive.eventId === event.eventId)
    const endedIds = new Set(ends.map(({ ended }) => ended.treatmentId))
    const stillRuns = eventsOf(one.events, 'treatment-started').some(
      (started) => started.forResultEventId === event.eventId && !endedIds.has(started.treatmentId),
    )
    const treatedAt = stillRuns ? null : (ends.at(-1)?.ended.at ?? null)
    add(event.eventId, event.at, 'positive', treatedAt, {
      rule: 'K07',
      code: 'locked-positive',
      params: { pathogenName: event.pathogenName ?? '', reportedOn: facilityDateOf(event.at, zone) },
    })
  }
  return found
}

type Words = Pick<Extract<ClockReason, { effect: unknown }>, 'rule' | 'code' | 'params'>

/** Positives of samples taken before clearance and reported after it: the case is recalled until a vet decides. */
function listRecalls(one: PreparedCase, zone: Zone): OwnLock[] {
  return one.resultsAfterClearance
    .filter((event) => event.result === 'positive')
    .map((event) => {
      const lifted = eventsOf(one.events, 'unlocked').find(({ lockEventId }) => lockEventId === event.eventId)
      return {
        eventId: event.eventId,
        cause: 'recall',
        from: event.at,
        liftedAt: lifted?.at ?? null,
        reason: {
          rule: 'clearance',
          eventId: event.eventId,
          at: event.at,
          standing: true,
          code: 'recalled',
          effect: { kind: 'status' },
          params: {
            pathogenName: event.pathogenName ?? '',
            takenOn: facilityDateOf(event.takenAt, zone),
            reportedOn: facilityDateOf(event.at, zone),
          },
        },
      } as const
    })
}
