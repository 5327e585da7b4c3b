import { type FacilityDate, MS_PER_DAY, MS_PER_HOUR, MS_PER_MINUTE, type Zone } from '../time/instant.ts'
import { instantToMs, msToInstant } from '../time/instant-arithmetic.ts'
import { startOfFacilityDay } from '../time/local-time.ts'
import type { ClockPause } from './case-clock.ts'
import type { EventOf } from './clock-event.ts'
import type { ClockReason } from './clock-reason.ts'
import { type PreparedCase, eventsOf } from './prepare-cases.ts'
import { type Interval, type Sharing, intersect, unionMs } from './build-sharing.ts'

export interface Pauses {
  pauses: ClockPause[]
  pausedMinutes: number
  pausedDays: number
  isRunning: boolean
  reasons: ClockReason[]
}

interface Spell extends Interval {
  started: EventOf<'pause-started'>
  running: boolean
  counts: boolean
  limitHours: number
}

/**
 * How long the clock of a case stood still (rule K11), by its own faults and by those on water it shared (K12).
 *
 * A life-support failure counts from its first minute; a temperature outside its range only when it lasted longer than
 * the limit, and then as a whole. True minutes from 00:00 of day 0 on are added up, two faults at once counted once,
 * and only the sum is rounded up to whole days.
 */
export function computePauses(
  one: PreparedCase,
  all: readonly PreparedCase[],
  sharing: Sharing,
  day0On: FacilityDate | null,
  zone: Zone,
): Pauses {
  const pauses: ClockPause[] = []
  const reasons: ClockReason[] = []
  const counted: Interval[] = []
  let isRunning = false
  const fromMs = day0On === null ? Infinity : instantToMs(startOfFacilityDay(day0On, zone))

  const count = (spell: Spell, part: Interval, fromCaseId: string | null) => {
    const ends = spell.running && part.untilMs === spell.untilMs ? null : msToInstant(part.untilMs)
    const from = msToInstant(part.fromMs)
    const { cause, pauseId, eventId } = spell.started
    pauses.push({ pauseId, eventId, cause, from, until: ends, fromCaseId })
    counted.push(part)
    isRunning ||= ends === null
    const minutes = Math.floor(Math.max(0, part.untilMs - Math.max(fromMs, part.fromMs)) / MS_PER_MINUTE)
    const base = {
      rule: 'K11',
      eventId,
      at: from,
      standing: true,
      effect: { kind: 'pause', minutes },
    } as const
    if (fromCaseId !== null)
      reasons.push({
        ...base,
        rule: 'K12',
        code: 'paused-shared-water',
        params: { otherCaseId: fromCaseId, fromAt: from, untilAt: msToInstant(part.untilMs), minutes },
      })
    else if (ends === null)
      reasons.push({ ...base, code: 'pause-running', params: { cause, fromAt: from, minutes } })
    else reasons.push({ ...base, code: 'paused', params: { cause, fromAt: from, untilAt: ends, minutes } })
  }

  for (const spell of listSpells(one)) {
    if (spell.counts) count(spell, spell, null)
    else
      reasons.push({
        rule: 'K11',
        eventId: spell.started.eventId,
        at: spell.started.at,
        standing: true,
        effect: { kind: 'none' },
        code: 'no-pause-short',
        params: {
          fromAt: msToInstant(spell.fromMs),
          untilAt: msToInstant(spell.untilMs),
          limitHours: spell.limitHours,
        },
      })
  }
  const asOfMs = instantToMs(one.asOf)
  for (const other of all) {
    if (other === one) continue
    const together = sharing.intervalsBetween(one.given.caseId, other.given.caseId)
    if (together.length === 0) continue
    for (const spell of listSpells(other)) {
      if (!spell.counts) continue
      const until = { fromMs: spell.fromMs, untilMs: Math.min(spell.untilMs, asOfMs) }
      for (const part of intersect(until, together)) count(spell, part, other.given.caseId)
    }
  }
  // Before day 0 there is nothing to pause.
  const ms =
    day0On === null ? 0 : unionMs(counted.map((part) => ({ ...part, fromMs: Math.max(part.fromMs, fromMs) })))
  return {
    pauses,
    reasons,
    isRunning,
    pausedMinutes: ms / MS_PER_MINUTE,
    pausedDays: Math.ceil(ms / MS_PER_DAY),
  }
}

function listSpells(one: PreparedCase): Spell[] {
  const limitHours = one.policy.temperaturePauseHours
  return eventsOf(one.events, 'pause-started').map((started) => {
    const ended = eventsOf(one.events, 'pause-ended').find(
      (event) => event.pauseId === started.pauseId && instantToMs(event.at) >= instantToMs(started.at),
    )
    const fromMs = instantToMs(started.at)
    const untilMs = instantToMs(ended?.at ?? one.asOf)
    const isLong = untilMs - fromMs > limitHours * MS_PER_HOUR
    return {
      started,
      fromMs,
      untilMs,
      running: !ended,
      counts: started.cause === 'life-support-failure' || isLong,
      limitHours,
    }
  })
}
