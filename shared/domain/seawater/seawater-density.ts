import { ok, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { checkSalinity, checkTemperature, firstRefused } from './check-seawater.ts'
import type { SeawaterRefusal } from './seawater-refusal.ts'
import { temperature68 } from './temperature-68.ts'

/**
 * ρw: the density of pure water at one atmosphere, kg/m³.
 *
 * @param temperature68C °C, IPTS-68, −2…40
 * @source unesco-44 eq. 14
 */
export function pureWaterDensity68(temperature68C: number): number {
  const t = temperature68C
  return (
    999.842594 +
    t * (6.793952e-2 + t * (-9.09529e-3 + t * (1.001685e-4 + t * (-1.120083e-6 + t * 6.536332e-9))))
  )
}

/**
 * A: what each unit of salinity adds to the density, kg/m³.
 *
 * @param temperature68C °C, IPTS-68, −2…40
 * @source unesco-44 eq. 13
 */
export function densityPerSalinity68(temperature68C: number): number {
  const t = temperature68C
  return 8.24493e-1 + t * (-4.0899e-3 + t * (7.6438e-5 + t * (-8.2467e-7 + t * 5.3875e-9)))
}

/**
 * B: the factor of S^1.5, kg/m³. Some public code has 1.0277E−4 in it: a misprint.
 *
 * @param temperature68C °C, IPTS-68, −2…40
 * @source unesco-44 eq. 13
 */
export function densityPerSalinityAndHalf68(temperature68C: number): number {
  const t = temperature68C
  return -5.72466e-3 + t * (1.0227e-4 + t * -1.6546e-6)
}

/**
 * Density of sea water at one atmosphere (EOS-80) where the temperature is on the scale of 1968. It checks nothing:
 * the engines around it do.
 *
 * @param salinityPss78  0…42
 * @param temperature68C °C, IPTS-68, −2…40
 * @returns kg/m³: ρw + A S + B S^1.5 + 4.8314E−4 S²
 * @source  unesco-44 eqs 13 and 14 · check values dens.01 to dens.16
 */
export function seawaterDensity68(salinityPss78: number, temperature68C: number): number {
  const s = salinityPss78
  return (
    pureWaterDensity68(temperature68C) +
    densityPerSalinity68(temperature68C) * s +
    densityPerSalinityAndHalf68(temperature68C) * s * Math.sqrt(s) +
    4.8314e-4 * s * s
  )
}

/**
 * Density of sea water at one atmosphere (EOS-80). The equation of 2010 differs by less than 0.01 kg/m³.
 *
 * @param input.salinityPss78 0…42
 * @param input.temperatureC  °C, ITS-90, −2…40
 * @returns kg/m³
 * @refuses not-finite · below-least · above-most
 * @source  unesco-44 · check values dens.01 to dens.16
 */
export function seawaterDensity(input: {
  salinityPss78: number
  temperatureC: number
}): Result<number, SeawaterRefusal> {
  const { salinityPss78, temperatureC } = input
  const refused = firstRefused(checkSalinity(salinityPss78), checkTemperature(temperatureC))
  return refused ?? ok(seawaterDensity68(salinityPss78, temperature68(temperatureC)))
}

/**
 * A content by mass (ppm w/w, mg per kg of water) as a concentration by volume, by the density of the water it is in:
 * 2.3 % more in sea water at 25 °C. What is dissolved is taken not to change the density.
 *
 * @param input.mgPerKg       mg per kg of water, 0…1,000,000
 * @param input.salinityPss78 0…42
 * @param input.temperatureC  °C, ITS-90, −2…40
 * @returns mg/L: mg/kg × ρ / 1000
 * @refuses not-finite · below-least · above-most
 * @source  unesco-44 · check value bath.18
 */
export function mgPerLitreFromMgPerKg(input: {
  mgPerKg: number
  salinityPss78: number
  temperatureC: number
}): Result<number, SeawaterRefusal> {
  const { mgPerKg, ...water } = input
  const refused = firstRefused(
    checkNumber(mgPerKg, { field: 'mgPerKg', unit: 'mg/kg_w_w', min: 0, max: 1_000_000 }),
  )
  if (refused) return refused
  const density = seawaterDensity(water)
  return density.ok ? ok((mgPerKg * density.value) / 1000) : density
}
