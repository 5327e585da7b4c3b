import { ok, refuse, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { seawaterDensity } from './seawater-density.ts'
import type { SeawaterRefusal } from './seawater-refusal.ts'

/**
 * What a volume of sea water weighs, at the surface.
 *
 * @param input.volumeLitres  above 0, L
 * @param input.salinityPss78 0…42
 * @param input.temperatureC  °C, ITS-90, −2…40
 * @returns kg: L × ρ / 1000
 * @refuses not-finite (also what overflows) · not-above-zero · below-least · above-most
 * @source  unesco-44 (the density)
 */
export function waterMass(input: {
  volumeLitres: number
  salinityPss78: number
  temperatureC: number
}): Result<number, SeawaterRefusal> {
  const { volumeLitres, ...water } = input
  const volume = checkNumber(volumeLitres, { field: 'volumeLitres', unit: 'L', above: 0 })
  if (!volume.ok) return volume
  const density = seawaterDensity(water)
  if (!density.ok) return density
  const kg = (volumeLitres * density.value) / 1000
  return Number.isFinite(kg) ? ok(kg) : refuse('not-finite', 'volumeLitres', { unit: 'L' })
}
