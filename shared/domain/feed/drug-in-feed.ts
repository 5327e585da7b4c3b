import { ok, refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { convert } from '../units/convert.ts'
import { feedDoseRules, feedingRateRules } from './feed-limits.ts'
import type { FeedRefusal } from './feed-refusal.ts'

const mgPerKilogram = 1_000_000

/** How strong a feed has to be, in the two units that orders and labels print. */
export interface DrugInFeed {
  /** Of drug in a kilogram of feed; the same number is grams in a tonne. */
  mgPerKg: number
  /** In a US short ton of 2,000 lb, which is 907.18474 kg and not a tonne. */
  gPerShortTon: number
}

/**
 * How strong a feed has to be that a dose comes with the daily feed: dose × 100 ÷ feeding rate. Animals that eat less take
 * less: what was taken is this times what was eaten.
 *
 * @param input.doseMgPerKg          per kg of body mass and day, above 0, at most 10,000
 * @param input.feedingRatePercentBw % of the body mass a day, above 0, at most 100; of gel, the gel as it is fed
 * @refuses not-finite · not-above-zero, above-most · more-drug-than-feed (feedingRatePercentBw)
 * @source  feed-arithmetic · short ton: nist-sp-811 · check values feed.04, feed.05, feed.refuse1; feed.06 and feed.07 are
 *          of cfr-558-261, from memory
 */
export function drugInFeed(input: {
  doseMgPerKg: number
  feedingRatePercentBw: number
}): Result<DrugInFeed, FeedRefusal> {
  const { doseMgPerKg, feedingRatePercentBw } = input
  const refused = checkNumbers([
    [doseMgPerKg, feedDoseRules],
    [feedingRatePercentBw, feedingRateRules],
  ])
  if (refused) return refused
  const mgPerKg = (doseMgPerKg * 100) / feedingRatePercentBw
  if (mgPerKg > mgPerKilogram) return refuse('more-drug-than-feed', 'feedingRatePercentBw')
  const ton = convert(mgPerKg, 'mg/kg_w_w', 'g/ton_us')
  return ton.ok ? ok({ mgPerKg, gPerShortTon: ton.value }) : refuse('not-finite', 'doseMgPerKg')
}
