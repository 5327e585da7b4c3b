import type { FacilityDate } from '../time/instant.ts'

export type LotState =
  'usable' | 'expired' | 'recalled' | 'set-aside' | 'stored-cold' | 'precipitate' | 'used-up'

/**
 * Whether a lot may be used on a day, and if not, why.
 *
 * @param expiresOn last day of use, itself included
 * @param lastEvent the gravest of what keeps it out of use; null once somebody has put it back
 * @param on        facility date
 */
export function lotState(expiresOn: FacilityDate, lastEvent: string | null, on: FacilityDate): LotState {
  if (lastEvent !== null && lastEvent !== 'returned-to-use') return lastEvent as LotState
  return on > expiresOn ? 'expired' : 'usable'
}
