import { doseLimits } from '../dose/dose-limits.ts'
import type { NumberRules } from '../units/check-number.ts'
import { waterLimits } from '../water/water-limits.ts'

/** Where a stock and its bath are asked at all; beyond, a figure is taken for a slip. @source project-default */
export const stockStrengthRules: NumberRules = {
  field: 'stockGPerL',
  unit: 'g/L',
  above: 0,
  max: doseLimits.mostStrengthMgPerMl,
}
export const bathTargetRules: NumberRules = {
  field: 'targetMgPerL',
  unit: 'mg/L',
  above: 0,
  max: doseLimits.mostTargetMgPerL,
}
export const bathLitresRules = (field: string): NumberRules => ({
  field,
  unit: 'L',
  above: 0,
  max: waterLimits.mostLitres,
})
