import { parameterTable } from '../readings/parameters.ts'
import { ok, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import type { GasRefusal } from './gas-refusal.ts'

/** Milligrams of oxygen in a millilitre of it at 0 °C and one atmosphere. @source benson-krause-1984 (memorandum 2011.03) */
export const oxygenMgPerMl = 1.42905

/**
 * Oxygen given by the volume of the gas, as a mass.
 *
 * @param input.oxygenMlPerL mL of the gas at 0 °C and one atmosphere in a litre of water, 0…31 (45 mg/L)
 * @returns mg/L: mL/L × 1.42905
 * @refuses not-finite · below-least · above-most
 * @source  benson-krause-1984
 */
export function oxygenByMass(input: { oxygenMlPerL: number }): Result<number, GasRefusal> {
  const max = parameterTable['dissolved-oxygen'].most / oxygenMgPerMl
  const checked = checkNumber(input.oxygenMlPerL, { field: 'oxygenMlPerL', unit: 'mL/L', min: 0, max })
  return checked.ok ? ok(checked.value * oxygenMgPerMl) : checked
}

/**
 * Oxygen given by mass, as the volume of the gas.
 *
 * @param input.oxygenMgPerL 0…45 mg/L
 * @returns mL of the gas at 0 °C and one atmosphere in a litre of water: mg/L ÷ 1.42905
 * @refuses not-finite · below-least · above-most
 * @source  benson-krause-1984
 */
export function oxygenByVolume(input: { oxygenMgPerL: number }): Result<number, GasRefusal> {
  const { least: min, most: max } = parameterTable['dissolved-oxygen']
  const checked = checkNumber(input.oxygenMgPerL, { field: 'oxygenMgPerL', unit: 'mg/L', min, max })
  return checked.ok ? ok(checked.value / oxygenMgPerMl) : checked
}
