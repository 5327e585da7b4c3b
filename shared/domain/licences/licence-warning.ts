import { daysBetween } from '../time/facility-date.ts'
import type { FacilityDate } from '../time/instant.ts'

/**
 * How near the end of a licence is: not near, past the first, second or last warning, or over.
 */
export const licenceWarningLevels = ['none', 'first', 'second', 'last', 'ended'] as const
export type LicenceWarningLevel = (typeof licenceWarningLevels)[number]

/** From how many days before the last day each warning stands. */
export interface WarningDays {
  first: number
  second: number
  last: number
}

/**
 * The warning about the end of a licence. On its last day it is still valid, with no days left.
 *
 * @param lastDay last day on which it is valid
 * @param on      facility date of today
 * @param days    facility settings; a shorter one that is set longer begins earlier
 * @returns daysLeft: whole days of the facility from `on` to the last day, negative after it
 * @source project-default: 60, 30 and 7 days before the end
 */
export function licenceWarning(
  lastDay: FacilityDate,
  on: FacilityDate,
  days: WarningDays,
): { level: LicenceWarningLevel; daysLeft: number } {
  const daysLeft = daysBetween(on, lastDay)
  const level =
    daysLeft < 0
      ? 'ended'
      : daysLeft <= days.last
        ? 'last'
        : daysLeft <= days.second
          ? 'second'
          : daysLeft <= days.first
            ? 'first'
            : 'none'
  return { level, daysLeft }
}
