import { type FacilityDate, type Instant, MS_PER_DAY, type Zone } from './instant.ts'
import { msToInstant } from './instant-arithmetic.ts'
import { wallClockOf } from './facility-date.ts'

/** How far the zone's wall clock is ahead of UTC at an instant, in milliseconds. */
function offsetMs(atMs: number, zone: Zone): number {
  const wall = wallClockOf(msToInstant(atMs), zone)
  return Date.parse(`${wall.date}T${wall.time}Z`) - Math.floor(atMs / 1000) * 1000
}

/**
 * The instant at which the facility's wall clock shows a date and time.
 *
 * A time that a clock change skips (02:30 in spring) becomes the same distance after the change (03:30); a time that
 * happens twice (01:30 in autumn) is the first of the two. Both are what people at the tank mean.
 *
 * @param date facility date
 * @param time `HH:MM` or `HH:MM:SS`
 * @param zone IANA zone
 */
export function instantOfLocalTime(date: FacilityDate, time: string, zone: Zone): Instant {
  const wallMs = Date.parse(`${date}T${time.length === 5 ? `${time}:00` : time}Z`)
  if (!Number.isFinite(wallMs)) throw new RangeError(`not a local time: ${date} ${time}`)
  const before = offsetMs(wallMs - MS_PER_DAY, zone)
  const after = offsetMs(wallMs + MS_PER_DAY, zone)
  const shown = [wallMs - before, wallMs - after]
    .filter((ms) => ms + offsetMs(ms, zone) === wallMs)
    .sort((a, b) => a - b)[0]
  return msToInstant(shown ?? wallMs - before)
}

/** The first instant of a facility date: local midnight, or the end of the gap where a clock change skips midnight. */
export function startOfFacilityDay(date: FacilityDate, zone: Zone): Instant {
  return instantOfLocalTime(date, '00:00:00', zone)
}
