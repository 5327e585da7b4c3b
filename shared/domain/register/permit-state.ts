import { addDays } from '../time/facility-date.ts'
import type { FacilityDate } from '../time/instant.ts'

export type PermitState = 'void' | 'not-yet' | 'expired' | 'runs-out' | 'valid'

/** A permit is said to run out from this many days before its last day. */
export const permitWarningDays = 60

/**
 * Where a permit stands on a day. The last day of validity is still valid.
 *
 * @source project-default: the warning begins 60 days before expiry
 */
export function permitState(
  permit: { validFrom: FacilityDate; validUntil: FacilityDate; voided: boolean },
  on: FacilityDate,
): PermitState {
  if (permit.voided) return 'void'
  if (on < permit.validFrom) return 'not-yet'
  if (on > permit.validUntil) return 'expired'
  return on >= addDays(permit.validUntil, -permitWarningDays) ? 'runs-out' : 'valid'
}
