import type { FacilityDate, Instant, Zone } from '../time/instant.ts'
import { addDays, facilityDateOf, laterDate } from '../time/facility-date.ts'
import { hoursBetween, instantToMs } from '../time/instant-arithmetic.ts'
import type { ClockExtension, ClockLeg } from './case-clock.ts'
import type { ClockEvent, EventOf } from './clock-event.ts'
import type { ClockReason } from './clock-reason.ts'
import { isCriticalPositive } from './compute-day-zeros.ts'
import { type PreparedCase, eventsOf } from './prepare-cases.ts'

export interface Extensions {
  extensions: ClockExtension[]
  reasons: ClockReason[]
  /** End of the last masking treatment; null when there was none. */
  lastMaskOn: FacilityDate | null
  maskRunning: boolean
}

/** The extension before a vet's ending it is considered, with the reason that tells of it. */
interface Found {
  extension: Omit<ClockExtension, 'state'>
  reason: ClockReason
}

/**
 * Everything that makes a case wait longer without moving day 0 (rules K09, K10, K14; K07 for lesser positives).
 * Extensions are not added up, and those of earlier legs survive a restart: the caller takes the latest.
 *
 * @param legs the case's legs, for the question whether an animal fed by half way of one
 */
export function computeExtensions(one: PreparedCase, legs: readonly ClockLeg[], zone: Zone): Extensions {
  const history: ClockReason[] = []
  const masking = findMasking(one, zone, history)
  const found = [
    ...findDeaths(one, zone, history),
    ...findSigns(one, zone),
    ...masking.found,
    ...findNotFeeding(one, legs, zone),
    ...findLesserPositives(one, zone),
  ]
  const endings = eventsOf(one.events, 'extension-ended')
  const extensions = found.map(({ extension, reason }): ClockExtension => {
    const ending = endings.find(({ extensionEventId }) => extensionEventId === extension.eventId)
    history.push({ ...reason, standing: !ending })
    if (ending)
      history.push({
        ...baseOf(ending, 'K09'),
        code: 'extension-ended',
        effect: { kind: 'none' },
        params: { endedOn: facilityDateOf(ending.at, zone) },
      })
    return { ...extension, state: ending ? 'ended' : 'standing' }
  })
  for (const { extension, reason } of findWithdrawnDeaths(one, zone, history)) {
    extensions.push({ ...extension, state: 'withdrawn' })
    history.push({ ...reason, standing: false })
  }
  return { extensions, reasons: history, lastMaskOn: masking.lastMaskOn, maskRunning: masking.maskRunning }
}

function baseOf(event: { eventId: string; at: Instant }, rule: ClockReason['rule']) {
  return { rule, eventId: event.eventId, at: event.at, standing: true }
}

function dated(
  event: ClockEvent | EventOf<'death'>,
  kind: ClockExtension['kind'],
  fromOn: FacilityDate,
  untilOn: FacilityDate | null,
): Found['extension'] {
  return { eventId: event.eventId, kind, fromOn, untilOn, provisional: false }
}

/** True hours from the last box of the batch (or the animal's own arrival) to the death; null when not known. */
function hoursSinceArrival(one: PreparedCase, death: EventOf<'death'>): number | null {
  const closedMs = one.closed ? instantToMs(one.closed.at) : Infinity
  const box = eventsOf(one.events, 'arrival').findLast(
    ({ at }) => instantToMs(at) <= closedMs && instantToMs(at) <= instantToMs(death.at),
  )
  const arrivedAt = death.arrivedAt ?? box?.at
  return arrivedAt === undefined ? null : hoursBetween(arrivedAt, death.at)
}

function judgeDeath(one: PreparedCase, death: EventOf<'death'>) {
  const signed = eventsOf(one.events, 'death-cause-signed').findLast(
    ({ deathEventId }) => deathEventId === death.eventId,
  )
  const hours = hoursSinceArrival(one, death)
  const isOfTransport = hours !== null && hours <= one.policy.transportDeathHours
  const extendsAllTheSame = eventsOf(one.events, 'transport-death-extends').some(
    ({ deathEventId }) => deathEventId === death.eventId,
  )
  return {
    signed,
    hours,
    isExplained: signed?.finding === 'explained-not-transmissible',
    isTransmissible: signed?.finding === 'explained-transmissible',
    isOfTransport: isOfTransport && !extendsAllTheSame && signed?.finding !== 'explained-transmissible',
  }
}

/** A death extends from its own day, until the day the policy's extension has run. */
function deathExtension(one: PreparedCase, death: EventOf<'death'>, zone: Zone): Found {
  const happenedOn = facilityDateOf(death.at, zone)
  const days = one.policy.deathExtensionDays
  const untilOn = addDays(happenedOn, days)
  const base = { ...baseOf(death, 'K09'), effect: { kind: 'extension', untilOn } } as const
  const { isTransmissible, signed } = judgeDeath(one, death)
  const reason: ClockReason = isTransmissible
    ? {
        ...base,
        code: 'extended-transmissible-death',
        params: { happenedOn, days, untilOn, cause: signed?.cause ?? '' },
      }
    : {
        ...base,
        code: 'extended-death',
        params: { happenedOn, days, untilOn, deathCount: death.deathCount ?? 1 },
      }
  return { extension: dated(death, 'death', happenedOn, untilOn), reason }
}

function findDeaths(one: PreparedCase, zone: Zone, history: ClockReason[]): Found[] {
  return eventsOf(one.events, 'death').flatMap((death) => {
    const verdict = judgeDeath(one, death)
    if (verdict.isExplained) return []
    if (!verdict.isOfTransport) return [deathExtension(one, death, zone)]
    history.push({
      ...baseOf(death, 'K10'),
      code: 'transport-death',
      effect: { kind: 'none' },
      params: {
        happenedOn: facilityDateOf(death.at, zone),
        hours: Math.floor(verdict.hours ?? 0),
        limitHours: one.policy.transportDeathHours,
      },
    })
    return []
  })
}

/** Deaths that a vet explained: their extension is withdrawn, and history shows both. */
function findWithdrawnDeaths(one: PreparedCase, zone: Zone, history: ClockReason[]): Found[] {
  return eventsOf(one.events, 'death').flatMap((death) => {
    const { isExplained, isOfTransport, signed } = judgeDeath(one, death)
    if (!isExplained || !signed) return []
    history.push({
      ...baseOf(signed, 'K10'),
      code: 'death-explained',
      effect: { kind: 'none' },
      params: {
        happenedOn: facilityDateOf(death.at, zone),
        signedOn: facilityDateOf(signed.at, zone),
        cause: signed.cause ?? '',
      },
    })
    return isOfTransport ? [] : [deathExtension(one, death, zone)]
  })
}

function findSigns(one: PreparedCase, zone: Zone): Found[] {
  return eventsOf(one.events, 'clinical-signs').map((event) => {
    const happenedOn = facilityDateOf(event.at, zone)
    const days = one.policy.signsExtensionDays
    const untilOn = addDays(happenedOn, days)
    return {
      extension: dated(event, 'signs', happenedOn, untilOn),
      reason: {
        ...baseOf(event, 'K09'),
        code: 'extended-signs',
        effect: { kind: 'extension', untilOn },
        params: { happenedOn, days, untilOn, signs: event.signs ?? '' },
      },
    }
  })
}

function findMasking(one: PreparedCase, zone: Zone, history: ClockReason[]) {
  const found: Found[] = []
  let lastMaskOn: FacilityDate | null = null
  let maskRunning = false
  const ended = eventsOf(one.events, 'treatment-ended')
  for (const event of ended) {
    const { agentName } = event
    const endedOn = facilityDateOf(event.at, zone)
    if (!event.masks || event.continues) {
      const code = event.masks ? 'masking-continues' : 'not-masking'
      history.push({
        ...baseOf(event, 'K14'),
        code,
        effect: { kind: 'none' },
        params: { agentName, happenedOn: endedOn },
      })
      continue
    }
    const days = event.windowDays ?? one.policy.maskingWindowDays
    const untilOn = addDays(endedOn, days)
    lastMaskOn = laterDate(lastMaskOn ?? endedOn, endedOn)
    found.push({
      extension: dated(event, 'masking', endedOn, untilOn),
      reason: {
        ...baseOf(event, 'K14'),
        code: 'extended-masking',
        effect: { kind: 'extension', untilOn },
        params: { agentName, endedOn, days, untilOn },
      },
    })
  }
  const asOfOn = facilityDateOf(one.asOf, zone)
  for (const event of eventsOf(one.events, 'treatment-started')) {
    if (!event.masks || ended.some(({ treatmentId }) => treatmentId === event.treatmentId)) continue
    const { agentName } = event
    const startedOn = facilityDateOf(event.at, zone)
    const base = baseOf(event, 'K14')
    if (event.continues) {
      const params = { agentName, happenedOn: startedOn }
      history.push({ ...base, code: 'masking-continues', effect: { kind: 'none' }, params })
      continue
    }
    maskRunning = true
    const days = event.windowDays ?? one.policy.maskingWindowDays
    const untilOn = addDays(laterDate(event.plannedEndOn ?? asOfOn, asOfOn), days)
    found.push({
      extension: { ...dated(event, 'masking', startedOn, untilOn), provisional: true },
      reason: {
        ...base,
        code: 'extended-masking-running',
        effect: { kind: 'extension', untilOn },
        params: { agentName, startedOn, days, untilOn },
      },
    })
  }
  return { found, lastMaskOn, maskRunning }
}

/** An animal that had not begun to feed by half way of a leg: a vet ends the wait, nobody else. */
function findNotFeeding(one: PreparedCase, legs: readonly ClockLeg[], zone: Zone): Found[] {
  const asOfOn = facilityDateOf(one.asOf, zone)
  return eventsOf(one.events, 'not-feeding').flatMap((event) => {
    const happenedOn = facilityDateOf(event.at, zone)
    const fed = eventsOf(one.events, 'feeding').find(
      (other) => other.subject === event.subject && instantToMs(other.at) >= instantToMs(event.at),
    )
    const untilOn = fed ? facilityDateOf(fed.at, zone) : null
    const halfWays = legs.flatMap((leg) => {
      const halfWayOn = addDays(leg.day0On, Math.ceil(one.policy.requiredDays / 2))
      const legEnd = leg.endedOn ?? asOfOn
      const reached = halfWayOn <= legEnd && happenedOn <= legEnd
      return reached && (untilOn === null || untilOn > halfWayOn) ? [halfWayOn] : []
    })
    const halfWayOn = halfWays[0]
    if (halfWayOn === undefined) return []
    return [
      {
        extension: dated(event, 'not-feeding', laterDate(halfWayOn, happenedOn), null),
        reason: {
          ...baseOf(event, 'K09'),
          code: 'extended-not-feeding',
          effect: { kind: 'extension', untilOn: null },
          params: { subject: event.subject, happenedOn, halfWayOn },
        },
      } as const,
    ]
  })
}

/** A positive of something neither listed nor critical: waits until its criterion is met again, or a vet ends it. */
function findLesserPositives(one: PreparedCase, zone: Zone): Found[] {
  return eventsOf(one.events, 'sample-result')
    .filter((event) => event.result === 'positive' && !isCriticalPositive(event))
    .map((event) => {
      const takenOn = facilityDateOf(event.takenAt, zone)
      return {
        extension: dated(event, 'positive', takenOn, null),
        reason: {
          ...baseOf(event, 'K07'),
          code: 'extended-positive',
          effect: { kind: 'extension', untilOn: null },
          params: { pathogenName: event.pathogenName ?? '', takenOn },
        },
      }
    })
}
