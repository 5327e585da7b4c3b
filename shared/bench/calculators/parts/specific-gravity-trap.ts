import { ok, refuse, type Result } from '../../../domain/result.ts'
import { readsAsSpecificGravity } from '../../../domain/seawater/specific-gravity.ts'

/** The words of the refusal below. */
export const specificGravityWords = {
  'refusal.specific-gravity-as-salinity':
    'This looks like a specific gravity. A salinity of sea water is about 35. If a salinity of 1 is meant, type 0.98 or 1.06.',
} as const

/** @refuses specific-gravity-as-salinity for the reading of a hydrometer in a field of salinity */
export function refuseSpecificGravity(salinity: { value: number }, field = 'salinity'): Result<true> {
  return readsAsSpecificGravity(salinity.value) ? refuse('specific-gravity-as-salinity', field) : ok(true)
}
