import { ok, type Result } from '../result.ts'
import { checkGasTemperature } from './check-gas-water.ts'
import type { GasRefusal } from './gas-refusal.ts'

/**
 * C₀: oxygen in fresh water in balance with moist air at one atmosphere.
 * ln C₀ = −139.34411 + 1.575701E5/T − 6.642308E7/T² + 1.2438E10/T³ − 8.621949E11/T⁴, T = t + 273.15 K.
 *
 * @param input.temperatureC t, 0…40 °C
 * @returns mg/L
 * @refuses not-finite · below-least · above-most
 * @source  benson-krause-1984 · check values do.iso*, do.apha*
 */
export function freshWaterOxygen(input: { temperatureC: number }): Result<number, GasRefusal> {
  const temperature = checkGasTemperature(input.temperatureC)
  if (!temperature.ok) return temperature
  const kelvin = input.temperatureC + 273.15
  return ok(
    Math.exp(
      -139.34411 +
        1.575701e5 / kelvin -
        6.642308e7 / kelvin ** 2 +
        1.2438e10 / kelvin ** 3 -
        8.621949e11 / kelvin ** 4,
    ),
  )
}
