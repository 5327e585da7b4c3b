import { ok, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { gasLimits, standardAtmosphereKPa } from './gas-limits.ts'
import type { GasRefusal } from './gas-refusal.ts'

/**
 * Air pressure that an altitude has in the standard atmosphere; only where no barometer was read, for the weather moves
 * the true one by several per cent. P = 101.325 (1 − 2.25577E−5 h)^5.25588 kPa.
 * Above about 5,500 m it is less than the 0.5 atm down to which oxygen is computed.
 *
 * @param input.altitudeM h above the sea, −500…11,000 m
 * @returns kPa
 * @refuses not-finite · below-least · above-most
 * @source  standard-atmosphere; below the sea project-default · check values baro.*
 */
export function standardPressure(input: { altitudeM: number }): Result<number, GasRefusal> {
  const { leastAltitudeM: min, mostAltitudeM: max } = gasLimits
  const altitude = checkNumber(input.altitudeM, { field: 'altitudeM', unit: 'm', min, max })
  if (!altitude.ok) return altitude
  return ok(standardAtmosphereKPa * (1 - 2.25577e-5 * altitude.value) ** 5.25588)
}
