import { ok, type Result } from '../result.ts'
import { checkSalinity } from './check-seawater.ts'
import type { SeawaterRefusal } from './seawater-refusal.ts'

/**
 * Reference salinity: the mass of salt in a kilogram of standard sea water of a practical salinity, 0.47 % more than
 * its number. Practical salinity has no unit; grams per litre are a third figure.
 *
 * @param input.salinityPss78 0…42
 * @returns g/kg: S × 35.16504 / 35
 * @refuses not-finite · below-least · above-most
 * @source  teos-10 · check value sref.01
 */
export function referenceSalinity(input: { salinityPss78: number }): Result<number, SeawaterRefusal> {
  const checked = checkSalinity(input.salinityPss78)
  return checked.ok ? ok((checked.value * 35.16504) / 35) : checked
}
