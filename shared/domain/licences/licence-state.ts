import type { FacilityDate } from '../time/instant.ts'

export type LicenceState = 'valid' | 'not-yet' | 'expired' | 'void' | 'not-accepted-here'

/**
 * What a licence to practise is worth on a day at this facility.
 *
 * @param licence        its period, both days included, and whether it was voided
 * @param on             facility date of the act
 * @param accepted       jurisdictions the facility accepts, compared without regard to case
 */
export function licenceState(
  licence: { jurisdiction: string; validFrom: FacilityDate; validUntil: FacilityDate; void: boolean },
  on: FacilityDate,
  accepted: readonly string[],
): LicenceState {
  if (licence.void) return 'void'
  if (on < licence.validFrom) return 'not-yet'
  if (on > licence.validUntil) return 'expired'
  const same = (name: string) => name.trim().toLowerCase() === licence.jurisdiction.trim().toLowerCase()
  return accepted.some(same) ? 'valid' : 'not-accepted-here'
}
