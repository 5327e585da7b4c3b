import type { NumberRules } from '../units/check-number.ts'

/**
 * Where the formulas of medicated feed are asked at all; beyond, a figure is taken for a slip.
 *
 * @source project-default: no group weighs more than ten thousand whale sharks, and none eats more than its own weight in a day
 */
export const feedLimits = {
  mostCount: 10_000_000,
  mostMeanWeightG: 20_000_000,
  mostBiomassKg: 200_000_000,
  mostFeedKg: 200_000_000,
  leastFeedConversion: 0.1,
  mostFeedConversion: 20,
  mostDoseMgPerKg: 10_000,
  mostRatePercent: 100,
  mostBatchG: 1_000_000_000,
  mostErrorPercent: 90,
} as const

export const biomassRules: NumberRules = {
  field: 'biomassKg',
  unit: 'kg',
  above: 0,
  max: feedLimits.mostBiomassKg,
}
/** Drug per body mass and day. */
export const feedDoseRules: NumberRules = {
  field: 'doseMgPerKg',
  unit: 'mg/kg',
  above: 0,
  max: feedLimits.mostDoseMgPerKg,
}
/** Feed per day in percent of the body mass; of gel, the gel as it is fed, with its water and binder. */
export const feedingRateRules: NumberRules = {
  field: 'feedingRatePercentBw',
  unit: 'percent',
  above: 0,
  max: feedLimits.mostRatePercent,
}
export const batchRules: NumberRules = { field: 'batchG', unit: 'g', above: 0, max: feedLimits.mostBatchG }
