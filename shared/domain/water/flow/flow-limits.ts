import type { NumberRules } from '../../units/check-number.ts'
import { waterLimits } from '../water-limits.ts'

/** Where the formulas of flow and exchange are asked at all; beyond, a figure is taken for a slip. */
export const volumeRules = (field: string): NumberRules => ({
  field,
  unit: 'L',
  above: 0,
  max: waterLimits.mostLitres,
})
export const flowRules = (field: string): NumberRules => ({
  field,
  unit: 'L/min',
  min: 0,
  max: waterLimits.mostLitres,
})
export const concentrationRules = (field: string): NumberRules => ({
  field,
  unit: 'mg/L',
  min: 0,
  max: 1_000_000,
})
export const timeRules = (field: string): NumberRules => ({ field, unit: 'min', min: 0, max: 100_000_000 })
