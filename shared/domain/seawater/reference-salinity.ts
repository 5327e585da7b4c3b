import { ok, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { checkSalinity, mostSalinity } from './check-seawater.ts'
import { seawaterDensity } from './seawater-density.ts'
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

/**
 * The mass of salt in a litre of standard sea water: what a salt is dosed by. It is 2.3 % more than the grams in a
 * kilogram at 25 °C and salinity 35.
 *
 * @param input.salinityPss78 0…42
 * @param input.temperatureC  °C, ITS-90, −2…40
 * @returns g/L: reference salinity × ρ / 1000
 * @refuses not-finite · below-least · above-most
 * @source  teos-10 (reference salinity) · unesco-44 (the density)
 */
export function saltGPerLitre(input: {
  salinityPss78: number
  temperatureC: number
}): Result<number, SeawaterRefusal> {
  const reference = referenceSalinity(input)
  if (!reference.ok) return reference
  const density = seawaterDensity(input)
  return density.ok ? ok((reference.value * density.value) / 1000) : density
}

/**
 * The practical salinity of sea water that holds a mass of salt in a kilogram; the way back from referenceSalinity.
 *
 * @param input.salinityGPerKg 0…42.2
 * @returns practical salinity, no unit: S × 35 / 35.16504
 * @refuses not-finite · below-least · above-most
 * @source  teos-10 · check value sref.01 the other way round
 */
export function practicalOfReference(input: { salinityGPerKg: number }): Result<number, SeawaterRefusal> {
  const max = (mostSalinity * 35.16504) / 35
  const checked = checkNumber(input.salinityGPerKg, { field: 'salinityGPerKg', unit: 'g/kg', min: 0, max })
  // the last binary digit of the limit is not to push it over
  return checked.ok ? ok(Math.min(mostSalinity, (checked.value * 35) / 35.16504)) : checked
}
