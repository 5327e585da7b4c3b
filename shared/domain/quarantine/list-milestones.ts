import type { Zone } from '../time/instant.ts'
import { facilityDateOf } from '../time/facility-date.ts'
import type { ClockReason } from './clock-reason.ts'
import type { DayZero } from './compute-day-zeros.ts'
import { type PreparedCase, eventsOf } from './prepare-cases.ts'

/** The events of a case that every history shows: closing, change of protocol, exposure of others, and the end. */
export function listMilestones(one: PreparedCase, zero: DayZero, zone: Zone): ClockReason[] {
  const found: ClockReason[] = []
  const first = zero.legs[0]
  if (one.closed && first) {
    const { eventId, at } = one.closed
    found.push({
      code: 'started',
      rule: 'K02',
      eventId,
      at,
      standing: true,
      effect: { kind: 'day-zero', fromOn: null, toOn: first.day0On },
      params: { day0On: first.day0On, closedOn: facilityDateOf(at, zone) },
    })
  }
  let fromDays = one.given.policy.requiredDays
  for (const event of one.events) {
    const { eventId, at } = event
    const happenedOn = facilityDateOf(at, zone)
    const base = { eventId, at, standing: true } as const
    if (event.kind === 'protocol-changed') {
      const toDays = event.policy.requiredDays
      found.push({
        ...base,
        rule: 'protocol',
        code: 'protocol-changed',
        effect: { kind: 'length', fromDays, toDays },
        params: { happenedOn, fromDays, toDays },
      })
      fromDays = toDays
    }
    if (event.kind === 'cleared-water-joined')
      found.push({
        ...base,
        rule: 'K13',
        standing: !eventsOf(one.events, 'exposure-decided').some((d) => d.exposureEventId === eventId),
        code: 'cleared-animals-exposed',
        effect: { kind: 'none' },
        params: { happenedOn, animalCount: event.animalCount ?? 0 },
      })
    if (event.kind === 'exposure-decided') {
      const params = { happenedOn, decision: event.decision }
      found.push({ ...base, rule: 'K13', code: 'exposure-decided', effect: { kind: 'none' }, params })
    }
    if (event === one.ended) {
      const code = event.kind === 'cleared' ? 'cleared' : 'transferred-out'
      const rule = event.kind === 'cleared' ? 'clearance' : 'K05'
      found.push({ ...base, rule, code, effect: { kind: 'status' }, params: { happenedOn } })
    }
  }
  return found
}
