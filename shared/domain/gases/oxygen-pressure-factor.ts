import { ok, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { convert } from '../units/convert.ts'
import { checkGasTemperature } from './check-gas-water.ts'
import { gasLimits } from './gas-limits.ts'
import type { GasRefusal } from './gas-refusal.ts'

/** The pressure factor with what it was made from. */
export interface OxygenPressureFactor {
  /** P, atm. */
  pressureAtm: number
  /** u, pressure of water vapour over fresh water, atm. */
  vapourPressureAtm: number
  /** θ, second virial coefficient of oxygen, per atm. */
  theta: number
  /** F_P, a ratio; 1 at one atmosphere. */
  factor: number
}

/**
 * F_P: what another air pressure than one atmosphere makes of the oxygen that water holds.
 * F_P = (P − u)(1 − θP) / [(1 − u)(1 − θ)], u = exp(11.8571 − 3840.70/T − 216961/T²),
 * θ = 0.000975 − 1.426E−5 t + 6.436E−8 t², P and u in atm, T = t + 273.15 K.
 *
 * @param input.temperatureC t, 0…40 °C
 * @param input.pressureKPa  P, of the air at the tank, never reduced to sea level as in a weather report; 0.5…1.1 atm
 * @refuses not-finite · below-least · above-most
 * @source  benson-krause-1984; u: benson-krause-vapour, from memory · check values do.pr*
 */
export function oxygenPressureFactor(input: {
  temperatureC: number
  pressureKPa: number
}): Result<OxygenPressureFactor, GasRefusal> {
  const { temperatureC, pressureKPa } = input
  const temperature = checkGasTemperature(temperatureC)
  if (!temperature.ok) return temperature
  const { leastPressureKPa: min, mostPressureKPa: max } = gasLimits
  const pressure = checkNumber(pressureKPa, { field: 'pressureKPa', unit: 'kPa', min, max })
  if (!pressure.ok) return pressure
  const inAtmospheres = convert(pressureKPa, 'kPa', 'atm')
  if (!inAtmospheres.ok) throw new Error('a checked pressure converts')
  const pressureAtm = inAtmospheres.value
  const kelvin = temperatureC + 273.15
  const vapourPressureAtm = Math.exp(11.8571 - 3840.7 / kelvin - 216961 / kelvin ** 2)
  const theta = 0.000975 - 1.426e-5 * temperatureC + 6.436e-8 * temperatureC ** 2
  const factor =
    ((pressureAtm - vapourPressureAtm) * (1 - theta * pressureAtm)) / ((1 - vapourPressureAtm) * (1 - theta))
  return ok({ pressureAtm, vapourPressureAtm, theta, factor })
}
