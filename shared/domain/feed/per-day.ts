import { ok, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { biomassRules, feedDoseRules, feedingRateRules } from './feed-limits.ts'
import type { FeedRefusal } from './feed-refusal.ts'

/**
 * Drug that a group is to take in one day: biomass × dose.
 *
 * @param input.biomassKg   above 0, at most 200,000,000
 * @param input.doseMgPerKg per kg of body mass and day, above 0, at most 10,000
 * @returns mg
 * @refuses not-finite · not-above-zero, above-most
 * @source  feed-arithmetic · check value feed.02
 */
export function drugPerDay(input: { biomassKg: number; doseMgPerKg: number }): Result<number, FeedRefusal> {
  const { biomassKg, doseMgPerKg } = input
  const refused = checkNumbers([
    [biomassKg, biomassRules],
    [doseMgPerKg, feedDoseRules],
  ])
  return refused ?? ok(biomassKg * doseMgPerKg)
}

/**
 * Feed that a group eats in one day: biomass × feeding rate ÷ 100.
 *
 * @param input.biomassKg            above 0, at most 200,000,000
 * @param input.feedingRatePercentBw % of the body mass a day, above 0, at most 100
 * @returns kg
 * @refuses not-finite · not-above-zero, above-most
 * @source  feed-arithmetic · check value feed.03
 */
export function feedPerDay(input: {
  biomassKg: number
  feedingRatePercentBw: number
}): Result<number, FeedRefusal> {
  const { biomassKg, feedingRatePercentBw } = input
  const refused = checkNumbers([
    [biomassKg, biomassRules],
    [feedingRatePercentBw, feedingRateRules],
  ])
  return refused ?? ok((biomassKg * feedingRatePercentBw) / 100)
}
