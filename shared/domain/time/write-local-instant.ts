import { wallClockOf } from './facility-date.ts'
import { type Instant, MS_PER_MINUTE, type Zone } from './instant.ts'
import { instantToMs, msToInstant } from './instant-arithmetic.ts'

/** Minutes by which the zone's wall clock is ahead of UTC at an instant; negative west of Greenwich. */
export function offsetMinutesAt(at: Instant, zone: Zone): number {
  const seconds = Math.floor(instantToMs(at) / 1000) * 1000
  const wall = wallClockOf(msToInstant(seconds), zone)
  return Math.round((Date.parse(`${wall.date}T${wall.time}Z`) - seconds) / MS_PER_MINUTE)
}

/**
 * An instant as the facility's wall clock showed it, with its offset, so that it reads as local time and still names
 * one instant everywhere.
 *
 * @returns ISO 8601 to the second: `2026-03-14T13:25:00-03:00`; `+00:00` at Greenwich
 */
export function writeLocalInstant(at: Instant, zone: Zone): string {
  const { date, time } = wallClockOf(at, zone)
  const offset = offsetMinutesAt(at, zone)
  const two = (n: number) => String(n).padStart(2, '0')
  const size = Math.abs(offset)
  return `${date}T${time}${offset < 0 ? '-' : '+'}${two(Math.floor(size / 60))}:${two(size % 60)}`
}
