import { ok, type Result } from '../result.ts'
import { checkGasWater } from './check-gas-water.ts'
import type { GasRefusal } from './gas-refusal.ts'

/**
 * F_S: what salt leaves of the oxygen that fresh water would hold.
 * F_S = exp[−S (0.017674 − 10.754/T + 2140.7/T²)], T = t + 273.15 K.
 *
 * @param input.temperatureC  t, 0…40 °C
 * @param input.salinityPss78 S, practical salinity, 0…40
 * @returns a ratio; 1 in fresh water
 * @refuses not-finite · below-least · above-most
 * @source  benson-krause-1984 · check values do.sal*
 */
export function oxygenSalinityFactor(input: {
  temperatureC: number
  salinityPss78: number
}): Result<number, GasRefusal> {
  const water = checkGasWater(input)
  if (!water.ok) return water
  const kelvin = input.temperatureC + 273.15
  return ok(Math.exp(-input.salinityPss78 * (0.017674 - 10.754 / kelvin + 2140.7 / kelvin ** 2)))
}
