import { ok, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import { biomassRules, feedDoseRules, feedingRateRules, feedLimits } from './feed-limits.ts'
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

/**
 * The dose that a group has taken in a day by what it ate: strength × feed eaten ÷ biomass. Of a group only the mean is
 * known; the animal that ate nothing has taken nothing.
 *
 * @param input.mgPerKgFeed of drug in the feed, 0…1,000,000
 * @param input.eatenKg     eaten in the day, what was left taken off; 0…200,000,000
 * @param input.biomassKg   above 0, at most 200,000,000
 * @returns mg per kg of body mass
 * @refuses not-finite · not-above-zero, below-least, above-most
 * @source  feed-arithmetic turned round; held by its law
 */
export function doseTaken(input: {
  mgPerKgFeed: number
  eatenKg: number
  biomassKg: number
}): Result<number, FeedRefusal> {
  const { mgPerKgFeed, eatenKg, biomassKg } = input
  const refused = checkNumbers([
    [mgPerKgFeed, { field: 'mgPerKgFeed', unit: 'mg/kg_w_w', min: 0, max: 1_000_000 }],
    [eatenKg, { field: 'eatenKg', unit: 'kg', min: 0, max: feedLimits.mostFeedKg }],
    [biomassKg, biomassRules],
  ])
  return refused ?? finiteOrRefuse((mgPerKgFeed * eatenKg) / biomassKg, 'biomassKg')
}
