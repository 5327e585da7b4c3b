import type { NumberRules } from '../units/check-number.ts'
import { waterLimits } from '../water/water-limits.ts'

/**
 * Where chlorine is reckoned with at all; beyond, a figure is taken for a slip.
 *
 * @source project-default: disinfecting solutions hold a few thousand mg/L, and liquid bleach at most about 18 % w/v
 */
export const neutralisationLimits = { mostChlorineMgPerL: 100_000, mostBleachPercentWv: 20 } as const

export const chlorineRules = (field: string): NumberRules => ({
  field,
  unit: 'mg/L',
  min: 0,
  max: neutralisationLimits.mostChlorineMgPerL,
})
export const treatedVolumeRules: NumberRules = {
  field: 'volumeLitres',
  unit: 'L',
  above: 0,
  max: waterLimits.mostLitres,
}
