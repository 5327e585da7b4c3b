import { ok, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import type { GasRefusal } from './gas-refusal.ts'
import { standardPressure } from './standard-pressure.ts'

/** A pressure outside these shares of the standard one of its altitude is hardly the weather. @source project-default */
const leastShare = 0.92
const mostShare = 1.04

/**
 * Whether an air pressure is one that the weather makes at an altitude. What is not was mostly reduced to sea level by a
 * weather report, or typed in another unit.
 *
 * @param input.pressureKPa as it was read
 * @param input.altitudeM   above the sea, −500…11,000 m
 * @returns the standard pressure there, kPa, and whether the reading is 0.92…1.04 of it
 * @refuses not-finite · not-above-zero · below-least · above-most
 * @source  standard-atmosphere; the shares project-default
 */
export function pressureForAltitude(input: {
  pressureKPa: number
  altitudeM: number
}): Result<{ standardKPa: number; isUsual: boolean }, GasRefusal> {
  const read = checkNumber(input.pressureKPa, { field: 'pressureKPa', unit: 'kPa', above: 0 })
  if (!read.ok) return read
  const standard = standardPressure(input)
  if (!standard.ok) return standard
  const share = read.value / standard.value
  return ok({ standardKPa: standard.value, isUsual: share >= leastShare && share <= mostShare })
}
