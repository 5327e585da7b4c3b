import { ok, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { gasLimits } from './gas-limits.ts'
import type { GasRefusal } from './gas-refusal.ts'

/** Asks whether the equations of dissolved oxygen hold at this temperature. @refuses not-finite · below-least · above-most */
export function checkGasTemperature(temperatureC: number): Result<number, GasRefusal> {
  const { leastTemperatureC: min, mostTemperatureC: max } = gasLimits
  return checkNumber(temperatureC, { field: 'temperatureC', unit: 'degC', min, max })
}

/** Asks whether they hold at this temperature and salinity; in this order. @refuses as above */
export function checkGasWater(input: {
  temperatureC: number
  salinityPss78: number
}): Result<true, GasRefusal> {
  const temperature = checkGasTemperature(input.temperatureC)
  if (!temperature.ok) return temperature
  const { leastSalinityPss78: min, mostSalinityPss78: max } = gasLimits
  const salinity = checkNumber(input.salinityPss78, { field: 'salinityPss78', unit: 'PSS-78', min, max })
  return salinity.ok ? ok(true) : salinity
}
