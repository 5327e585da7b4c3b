import { ok, type Result } from '../result.ts'
import { freshWaterOxygen } from './fresh-water-oxygen.ts'
import type { GasRefusal } from './gas-refusal.ts'
import { oxygenPressureFactor, type OxygenPressureFactor } from './oxygen-pressure-factor.ts'
import { oxygenSalinityFactor } from './oxygen-salinity-factor.ts'

/** The water and the air above it that oxygen is in balance between. */
export interface WaterUnderAir {
  /** 0…40 °C. */
  temperatureC: number
  /** Practical salinity, 0…40. */
  salinityPss78: number
  /** Of the air at the tank, not reduced to sea level; 0.5…1.1 atm. */
  pressureKPa: number
}

/** Oxygen at saturation, with the steps that made it. */
export interface OxygenSolubility {
  /** C₀ F_S F_P. */
  mgPerL: number
  /** T, K. */
  kelvin: number
  /** C₀: fresh water at one atmosphere. */
  freshWaterMgPerL: number
  /** F_S. */
  salinityFactor: number
  /** F_P with its own steps. */
  pressure: OxygenPressureFactor
}

/**
 * Oxygen that water holds in balance with moist air: 100 % saturation, C₀ F_S F_P.
 *
 * @returns mg/L
 * @refuses not-finite · below-least · above-most, for temperatureC, salinityPss78, pressureKPa in this order
 * @source  benson-krause-1984, which has a pressure factor of its own and which regulators and most meters follow;
 *          the refit in garcia-gordon-oxygen.ts stays within 0.003 mg/L of it · check values do.*
 */
export function oxygenSolubility(input: WaterUnderAir): Result<OxygenSolubility, GasRefusal> {
  const salt = oxygenSalinityFactor(input)
  if (!salt.ok) return salt
  const pressure = oxygenPressureFactor(input)
  if (!pressure.ok) return pressure
  const fresh = freshWaterOxygen(input)
  if (!fresh.ok) return fresh
  return ok({
    mgPerL: fresh.value * salt.value * pressure.value.factor,
    kelvin: input.temperatureC + 273.15,
    freshWaterMgPerL: fresh.value,
    salinityFactor: salt.value,
    pressure: pressure.value,
  })
}
