import { addDays } from '../time/facility-date.ts'
import type { FacilityDate } from '../time/instant.ts'

/** A licence is said to run out from this many days before its last day. */
export const licenceWarningDays = 60

/**
 * Whether a licence that is valid now ends soon.
 *
 * @param validUntil last day of validity
 * @source project-default: the warning begins 60 days before the end, as that of permits does
 */
export function licenceRunsOut(validUntil: FacilityDate, on: FacilityDate): boolean {
  return on >= addDays(validUntil, -licenceWarningDays)
}
