import { ok, type Result } from '../result.ts'
import { checkGasWater } from './check-gas-water.ts'
import type { GasRefusal } from './gas-refusal.ts'
import { oxygenMgPerMl } from './oxygen-by-volume.ts'

interface Fit {
  a: readonly number[]
  b: readonly number[]
  c0: number
}

// The fits to the data of Benson and Krause. The same table prints a "combined" fit beside them: the two do not mix.
const molar: Fit = {
  a: [5.80871, 3.20291, 4.17887, 5.10006, -9.86643e-2, 3.80369],
  b: [-7.01577e-3, -7.70028e-3, -1.13864e-2, -9.51519e-3],
  c0: -2.75915e-7,
}
const volumetric: Fit = {
  a: [2.00907, 3.22014, 4.0501, 4.94457, -2.56847e-1, 3.88767],
  b: [-6.24523e-3, -7.37614e-3, -1.0341e-2, -8.17083e-3],
  c0: -4.88682e-7,
}

const series = (factors: readonly number[], ts: number): number =>
  factors.reduce((sum, factor, power) => sum + factor * ts ** power, 0)

/** Oxygen at saturation at one atmosphere, in the units of oceanographers and in that of tanks. */
export interface GarciaGordonOxygen {
  umolPerKg: number
  /** Millilitres of the gas at 0 °C and one atmosphere. */
  mlStpPerL: number
  /** mlStpPerL × 1.42905. */
  mgPerL: number
  /** Ts, the scaled temperature, ln[(298.15 − t)/(273.15 + t)]. */
  ts: number
}

/**
 * A second equation for oxygen at saturation at one atmosphere, as a cross-check of `oxygenSolubility`:
 * ln C = Σ Aᵢ Tsⁱ + S Σ Bᵢ Tsⁱ + C₀ S², Ts = ln[(298.15 − t)/(273.15 + t)].
 * Equation 8 as printed has one term more, which does not belong there.
 * Over 0–40 °C and salinities of 0–40 it stays within 0.003 mg/L of Benson and Krause; the largest difference, 0.0028,
 * is in water of 0 °C and salinity 18.
 *
 * @param input.temperatureC  t, 0…40 °C
 * @param input.salinityPss78 S, practical salinity, 0…40
 * @refuses not-finite · below-least · above-most
 * @source  garcia-gordon-1992; 1.42905 mg/mL: benson-krause-1984 (memorandum 2011.03) · check values do.gg*
 */
export function garciaGordonOxygen(input: {
  temperatureC: number
  salinityPss78: number
}): Result<GarciaGordonOxygen, GasRefusal> {
  const water = checkGasWater(input)
  if (!water.ok) return water
  const { temperatureC, salinityPss78 } = input
  const ts = Math.log((298.15 - temperatureC) / (273.15 + temperatureC))
  const by = ({ a, b, c0 }: Fit) =>
    Math.exp(series(a, ts) + salinityPss78 * series(b, ts) + c0 * salinityPss78 ** 2)
  const mlStpPerL = by(volumetric)
  return ok({ umolPerKg: by(molar), mlStpPerL, mgPerL: mlStpPerL * oxygenMgPerMl, ts })
}
