import { type Instant, MS_PER_HOUR, MS_PER_MINUTE, isInstant } from './instant.ts'

/**
 * Milliseconds since 1970-01-01T00:00Z.
 *
 * @throws RangeError when the text is no instant (a bug: check with `isInstant` first)
 */
export function instantToMs(instant: Instant): number {
  if (!isInstant(instant)) throw new RangeError(`not an instant: ${instant}`)
  return Date.parse(instant)
}

/** The instant at so many milliseconds since 1970, written in UTC. */
export function msToInstant(ms: number): Instant {
  return new Date(ms).toISOString()
}

/** Order of two instants in time, whatever offset each is written with: negative, 0 or positive. */
export function compareInstants(a: Instant, b: Instant): number {
  return instantToMs(a) - instantToMs(b)
}

/** True minutes from `a` to `b`; negative when `b` is earlier. Clock changes do not count. */
export function minutesBetween(a: Instant, b: Instant): number {
  return (instantToMs(b) - instantToMs(a)) / MS_PER_MINUTE
}

/** True hours from `a` to `b`; negative when `b` is earlier. A night of a clock change has 23 or 25. */
export function hoursBetween(a: Instant, b: Instant): number {
  return (instantToMs(b) - instantToMs(a)) / MS_PER_HOUR
}

/** The instant so many true hours later (or earlier, when negative), written in UTC. */
export function addHours(instant: Instant, hours: number): Instant {
  return msToInstant(instantToMs(instant) + hours * MS_PER_HOUR)
}
