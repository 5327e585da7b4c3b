import type { FacilityDate } from '../time/instant.ts'
import { isAcceptedHere, lastDayOf } from './licence-classes.ts'
import type { HeldLicence } from './licence-classes.ts'

/**
 * - `valid`             counts on the day
 * - `not-yet`           its first day is still to come
 * - `expired`           its last day as printed is over
 * - `ended`             was ended before its last day, and that day is over
 * - `void`              entered wrongly or withdrawn
 * - `superseded`        corrected: another entry stands in its place
 * - `not-accepted-here` of a jurisdiction that is not on the facility's list
 */
export const licenceStateNames = [
  'valid',
  'not-yet',
  'expired',
  'ended',
  'void',
  'superseded',
  'not-accepted-here',
] as const
export type LicenceState = (typeof licenceStateNames)[number]

/**
 * What a licence is worth on a day at this facility.
 *
 * @param licence  its period, both days included, and what became of it
 * @param on       facility date of the act
 * @param accepted jurisdictions the facility accepts, compared without regard to case
 */
export function licenceState(
  licence: Pick<HeldLicence, 'jurisdiction' | 'validFrom' | 'validUntil' | 'endedOn' | 'void' | 'superseded'>,
  on: FacilityDate,
  accepted: readonly string[],
): LicenceState {
  if (licence.void) return 'void'
  if (licence.superseded) return 'superseded'
  if (on > licence.validUntil) return 'expired'
  if (on > lastDayOf(licence)) return 'ended'
  if (on < licence.validFrom) return 'not-yet'
  return isAcceptedHere(licence.jurisdiction, accepted) ? 'valid' : 'not-accepted-here'
}
