import { compareInstants } from '../time/instant-arithmetic.ts'
import type { FacilityDate, Instant } from '../time/instant.ts'

export type WindowState = 'coming' | 'due' | 'late'

/**
 * Where a piece of work with an hour stands. The last instant of its window is still on time.
 *
 * @param dueAt    when it is due
 * @param latestAt last instant at which it is on time
 */
export function judgeHours(window: { dueAt: Instant; latestAt: Instant }, now: Instant): WindowState {
  if (compareInstants(now, window.latestAt) > 0) return 'late'
  return compareInstants(now, window.dueAt) < 0 ? 'coming' : 'due'
}

/** Where a piece of work with days stands. Its last day is on time to the end. */
export function judgeDays(
  window: { dueOn: FacilityDate; latestOn: FacilityDate },
  today: FacilityDate,
): WindowState {
  if (today > window.latestOn) return 'late'
  return today < window.dueOn ? 'coming' : 'due'
}
