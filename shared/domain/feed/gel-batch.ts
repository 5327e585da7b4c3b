import { ok, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import { drugInFeed } from './drug-in-feed.ts'
import { batchRules, biomassRules, feedingRateRules } from './feed-limits.ts'
import type { FeedRefusal } from './feed-refusal.ts'

const gramsPerKilogram = 1000

/**
 * Drug to weigh into a batch of gel food: mg per kg of feed × the batch. The rate is of the gel as it is fed, so the batch is
 * weighed after water and binder are in it.
 *
 * @param input.doseMgPerKg          per kg of body mass and day, above 0, at most 10,000
 * @param input.feedingRatePercentBw % of the body mass a day, of the gel, above 0, at most 100
 * @param input.batchG               the finished batch, above 0, at most 1,000,000,000
 * @returns mg of active substance
 * @refuses as drugInFeed · not-above-zero, above-most (batchG)
 * @source  feed-arithmetic · check value feed.09
 */
export function gelBatchDrug(input: {
  doseMgPerKg: number
  feedingRatePercentBw: number
  batchG: number
}): Result<number, FeedRefusal> {
  const strength = drugInFeed(input)
  if (!strength.ok) return strength
  const refused = checkNumbers([[input.batchG, batchRules]])
  return refused ?? ok((strength.value.mgPerKg * input.batchG) / gramsPerKilogram)
}

/**
 * How many days a batch of gel food feeds a group: batch ÷ (biomass × rate).
 *
 * @param input.batchG               the finished batch, above 0, at most 1,000,000,000
 * @param input.feedingRatePercentBw % of the body mass a day, of the gel, above 0, at most 100
 * @param input.biomassKg            above 0, at most 200,000,000
 * @returns days, not rounded: 3.9 is three whole days and a part
 * @refuses not-finite · not-above-zero, above-most
 * @source  feed-arithmetic · check value feed.10
 */
export function gelBatchDays(input: {
  batchG: number
  feedingRatePercentBw: number
  biomassKg: number
}): Result<number, FeedRefusal> {
  const { batchG, feedingRatePercentBw, biomassKg } = input
  const refused = checkNumbers([
    [batchG, batchRules],
    [feedingRatePercentBw, feedingRateRules],
    [biomassKg, biomassRules],
  ])
  if (refused) return refused
  const feedGPerDay = (biomassKg * gramsPerKilogram * feedingRatePercentBw) / 100
  return finiteOrRefuse(batchG / feedGPerDay, 'biomassKg')
}
