import { type Instant, type Zone, isInstant } from '../time/instant.ts'
import { addHours } from '../time/instant-arithmetic.ts'
import { addDays, isZone, wallClockOf } from '../time/facility-date.ts'
import { instantOfLocalTime } from '../time/local-time.ts'
import { type Result, ok, refuse } from '../result.ts'
import { doseWindow } from './dose-window.ts'
import type { OrderFrequency } from './order-frequency.ts'

/** A dose as the order foresees it. */
export interface PlannedDose {
  /** Names the dose within its order version, for ever: `1`, `2`, … */
  key: string
  dueAt: Instant
  /** First and last instant at which it is on time, both included. */
  opensAt: Instant
  closesAt: Instant
}

export type PlanRefusal =
  | 'not-an-instant'
  | 'unknown-zone'
  | 'interval-not-positive'
  | 'dose-count-not-whole'
  | 'too-many-doses'
  | 'days-not-rising'

/** More than this is a slip: a year of doses every eight hours is 1,095. */
const mostDoses = 1200

const hoursPerDay = 24

/**
 * The doses that an order line foresees, with their windows.
 *
 * The window is 6 h either way of a daily dose and a fifth of the interval of any other, in true hours around the
 * planned instant. A single dose has the window of a daily one; the first of several that of the interval after it.
 *
 * @param frequency how often
 * @param firstAt   planned instant of the first dose
 * @param zone      the facility's zone, whose wall clock whole days keep
 * @returns in time order; empty for a reading-driven line
 * @refuses not-an-instant | unknown-zone | interval-not-positive | dose-count-not-whole | too-many-doses |
 * days-not-rising (whole, from 0, each later than the one before)
 * @source project-default (windows)
 */
export function planDoses(
  frequency: OrderFrequency,
  firstAt: Instant,
  zone: Zone,
): Result<PlannedDose[], PlanRefusal> {
  if (!isInstant(firstAt)) return refuse('not-an-instant', 'firstAt')
  if (!isZone(zone)) return refuse('unknown-zone', 'zone')
  if (frequency.kind === 'reading-driven') return ok([])
  const offsets = offsetsOf(frequency)
  if (!offsets.ok) return offsets
  const hours = offsets.value
  const keepsTimeOfDay = frequency.kind !== 'every-hours' || frequency.intervalHours % hoursPerDay === 0
  const doses = hours.map((offset, i): PlannedDose => {
    const before = hours[i - 1]
    const after = hours[i + 1]
    const interval =
      before !== undefined ? offset - before : after !== undefined ? after - offset : hoursPerDay
    const { earlyHours, lateHours } = doseWindow(interval)
    const dueAt = keepsTimeOfDay ? sameTimeLater(firstAt, offset, zone) : addHours(firstAt, offset)
    return {
      key: String(i + 1),
      dueAt,
      opensAt: addHours(dueAt, -earlyHours),
      closesAt: addHours(dueAt, lateHours),
    }
  })
  return ok(doses)
}

/** Hours after the first dose, in order. */
function offsetsOf(
  frequency: Exclude<OrderFrequency, { kind: 'reading-driven' }>,
): Result<number[], PlanRefusal> {
  if (frequency.kind === 'once') return ok([0])
  if (frequency.kind === 'on-days') {
    const { days } = frequency
    if (days.length > mostDoses) return refuse('too-many-doses', 'days')
    const areRising = days.every(
      (day, i) => Number.isSafeInteger(day) && day >= 0 && (i === 0 || day > (days[i - 1] ?? day)),
    )
    if (days.length === 0 || !areRising) return refuse('days-not-rising', 'days')
    return ok(days.map((day) => day * hoursPerDay))
  }
  const { intervalHours, doseCount } = frequency
  if (!Number.isFinite(intervalHours) || intervalHours <= 0)
    return refuse('interval-not-positive', 'intervalHours')
  if (!Number.isSafeInteger(doseCount) || doseCount < 1) return refuse('dose-count-not-whole', 'doseCount')
  if (doseCount > mostDoses) return refuse('too-many-doses', 'doseCount')
  return ok(Array.from({ length: doseCount }, (_, i) => i * intervalHours))
}

/** Whole days later at the same time of day; the first dose itself stays where it was put. */
function sameTimeLater(firstAt: Instant, hours: number, zone: Zone): Instant {
  if (hours === 0) return addHours(firstAt, 0)
  const { date, time } = wallClockOf(firstAt, zone)
  return instantOfLocalTime(addDays(date, hours / hoursPerDay), time, zone)
}
