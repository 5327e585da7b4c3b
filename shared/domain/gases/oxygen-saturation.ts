import { parameterTable } from '../readings/parameters.ts'
import { ok, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import type { GasRefusal } from './gas-refusal.ts'
import { oxygenSolubility, type OxygenSolubility, type WaterUnderAir } from './oxygen-solubility.ts'

/**
 * Percent of saturation that a measured concentration of oxygen is: 100 C / C_sat.
 * At the pressure of the tank it is percent of local saturation, which is what an animal meets; handed
 * `standardAtmosphereKPa` it is percent of saturation at one atmosphere. The caller says which was meant.
 * It says nothing about the pressure of all gases together.
 *
 * @param input.oxygenMgPerL 0…45 mg/L, as readings are taken
 * @returns percent, with the solubility it was divided by
 * @refuses not-finite · below-least · above-most
 * @source  benson-krause-1984 · check values do.sat*
 */
export function oxygenPercentSaturation(
  input: WaterUnderAir & { oxygenMgPerL: number },
): Result<{ percent: number; solubility: OxygenSolubility }, GasRefusal> {
  const { least: min, most: max } = parameterTable['dissolved-oxygen']
  const oxygen = checkNumber(input.oxygenMgPerL, { field: 'oxygenMgPerL', unit: 'mg/L', min, max })
  if (!oxygen.ok) return oxygen
  const solubility = oxygenSolubility(input)
  if (!solubility.ok) return solubility
  return ok({ percent: (100 * oxygen.value) / solubility.value.mgPerL, solubility: solubility.value })
}

/**
 * The concentration that a percentage of saturation is: C_sat × % / 100. The pressure is the one that the percentage
 * refers to: of the tank, or `standardAtmosphereKPa`.
 *
 * @param input.saturationPercent 0…400 %, as readings are taken
 * @returns mg/L, with the solubility it was taken of
 * @refuses not-finite · below-least · above-most
 * @source  benson-krause-1984 · check value do.inv01
 */
export function oxygenFromPercent(
  input: WaterUnderAir & { saturationPercent: number },
): Result<{ mgPerL: number; solubility: OxygenSolubility }, GasRefusal> {
  const { least: min, most: max } = parameterTable['oxygen-saturation']
  const share = checkNumber(input.saturationPercent, {
    field: 'saturationPercent',
    unit: 'percent',
    min,
    max,
  })
  if (!share.ok) return share
  const solubility = oxygenSolubility(input)
  if (!solubility.ok) return solubility
  return ok({ mgPerL: (solubility.value.mgPerL * share.value) / 100, solubility: solubility.value })
}
