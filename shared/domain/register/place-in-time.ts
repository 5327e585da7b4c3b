import { ok, refuse, type Result } from '../result.ts'
import { addDays } from '../time/facility-date.ts'
import { type Instant, isInstant, type Zone } from '../time/instant.ts'
import { compareInstants, instantToMs, msToInstant } from '../time/instant-arithmetic.ts'
import { instantOfLocalTime, startOfFacilityDay } from '../time/local-time.ts'
import { type DatePeriod, type PartialDate, readPartialDate } from './partial-date.ts'

export interface PlacedEvent extends DatePeriod {
  /** Where the event stands in the ledgers. Exact only with a time of day. */
  at: Instant
}

/** How far ahead of the server's clock a person's own may be. */
const clockSkewMinutes = 5

/**
 * The instant at which an event of the register stands in the ledgers.
 *
 * A date without a time of day is placed so that it can never contradict what is known better: arrivals at the first
 * instant of the day, month or year, departures at its last instant that has already passed. A time of day is for a
 * full date only.
 *
 * @param on   date, month or year of the event
 * @param time local time of day `HH:MM`, where it is known
 * @param way  `in` for arrivals and births, `out` for departures and deaths
 * @param now  the present instant
 * @refuses not-a-date | time-needs-a-day | not-a-time | in-the-future (the first possible instant is more than 5 min
 * ahead), each naming the argument
 * @source project-default: placement at the open end is ours; the printed date always shows what was entered
 */
export function placeInTime(
  given: { on: PartialDate; time?: string | undefined; way: 'in' | 'out' },
  zone: Zone,
  now: Instant,
): Result<PlacedEvent, 'not-a-date' | 'time-needs-a-day' | 'not-a-time' | 'in-the-future'> {
  const read = readPartialDate(given.on)
  if (!read.ok) return refuse('not-a-date', 'on')
  const period = read.value
  const latest = msToInstant(instantToMs(now) + clockSkewMinutes * 60_000)
  if (given.time !== undefined) {
    if (period.precision !== 'day') return refuse('time-needs-a-day', 'time')
    if (!/^([01]\d|2[0-3]):[0-5]\d$/.test(given.time)) return refuse('not-a-time', 'time')
    const at = instantOfLocalTime(period.first, given.time, zone)
    return compareInstants(at, latest) > 0 ? refuse('in-the-future', 'time') : ok({ ...period, at })
  }
  const start = startOfFacilityDay(period.first, zone)
  if (compareInstants(start, latest) > 0) return refuse('in-the-future', 'on')
  if (given.way === 'in') return ok({ ...period, at: start })
  const end = msToInstant(instantToMs(startOfFacilityDay(addDays(period.last, 1), zone)) - 1)
  return ok({ ...period, at: compareInstants(end, now) > 0 ? now : end })
}

/** Whether a text names an instant that is not more than 5 minutes ahead. */
export function hasPassed(at: Instant, now: Instant): boolean {
  return isInstant(at) && instantToMs(at) <= instantToMs(now) + clockSkewMinutes * 60_000
}
