import { ok, refuse, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { gasLimits, standardAtmosphereKPa } from './gas-limits.ts'
import type { GasRefusal } from './gas-refusal.ts'
import { standardPressure } from './standard-pressure.ts'

/**
 * What the air has by the sea, with room to spare for the deepest storm and the coldest winter.
 *
 * @source project-default
 */
export const seaLevelLimits = { leastKPa: 85, mostKPa: 110 } as const

/**
 * The pressure at the tank, from one that a weather report or an airport gives reduced to sea level.
 *
 * It is scaled as the standard atmosphere is: P = P₀ (1 − 2.25577E−5 h)^5.25588. A weather service reduces by the warmth
 * of the air of the day, which is left out here: 15 °C from the standard move the answer by 1 % at 1,500 m.
 *
 * @param input.seaLevelPressureKPa P₀, 85…110 kPa
 * @param input.altitudeM           h above the sea, −500…11,000 m
 * @returns kPa
 * @refuses not-finite · below-least · above-most
 * @source  standard-atmosphere; the scaling and the limits project-default
 */
export function stationPressure(input: {
  seaLevelPressureKPa: number
  altitudeM: number
}): Result<number, GasRefusal> {
  const { leastKPa: min, mostKPa: max } = seaLevelLimits
  const given = checkNumber(input.seaLevelPressureKPa, {
    field: 'seaLevelPressureKPa',
    unit: 'kPa',
    min,
    max,
  })
  if (!given.ok) return given
  const standard = standardPressure(input)
  return standard.ok ? ok(given.value * (standard.value / standardAtmosphereKPa)) : standard
}

/**
 * A barometer's own reading reduced to sea level, for holding it against a weather report.
 *
 * @param input.stationPressureKPa as the barometer shows it, 0.5…1.1 atm
 * @param input.altitudeM          above the sea, −500…11,000 m
 * @returns kPa, as `stationPressure` scales it
 * @refuses not-finite · below-least · above-most · pressure-not-of-altitude where it would make a pressure by the sea
 *          that there is not: the reading is already reduced, is in another unit, or is of another altitude
 * @source  standard-atmosphere; the scaling and the limits project-default
 */
export function seaLevelPressure(input: {
  stationPressureKPa: number
  altitudeM: number
}): Result<number, GasRefusal> {
  const { leastPressureKPa: min, mostPressureKPa: max } = gasLimits
  const field = 'stationPressureKPa'
  const read = checkNumber(input.stationPressureKPa, { field, unit: 'kPa', min, max })
  if (!read.ok) return read
  const standard = standardPressure(input)
  if (!standard.ok) return standard
  const reduced = read.value / (standard.value / standardAtmosphereKPa)
  if (reduced < seaLevelLimits.leastKPa || reduced > seaLevelLimits.mostKPa)
    return refuse('pressure-not-of-altitude', field)
  return ok(reduced)
}
