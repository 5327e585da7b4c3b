import { ok, refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { feedLimits } from './feed-limits.ts'
import type { FeedRefusal } from './feed-refusal.ts'

/** What a group weighs, with the two parts that a person would show. */
export interface GroupBiomass {
  /** Weighed and grown together. */
  biomassKg: number
  /** Count × mean weight, when it was weighed. */
  weighedKg: number
  /** What the feed since then has made of it. */
  gainKg: number
}

const gramsPerKilogram = 1000

/**
 * What a group weighs: count × mean weight, and what it has grown since by the feed it was given.
 *
 * The feed conversion ratio is kilograms of feed for one kilogram of growth, so the growth is the feed divided by it. To
 * multiply instead would make 40 kg of feed at 1.5 into 60 kg of fish, and overdose the group.
 *
 * @param input.count          a whole number, 1…10,000,000
 * @param input.meanWeightG    at the last weighing, above 0, at most 20,000,000
 * @param input.feedGivenKg    since the last weighing, 0 where none
 * @param input.feedConversion kg of feed for 1 kg of growth, 0.1…20
 * @returns kg
 * @refuses not-finite · not-above-zero, below-least, above-most · count-not-whole
 * @source  feed-arithmetic · check values feed.01, feed.11
 */
export function groupBiomass(input: {
  count: number
  meanWeightG: number
  feedGivenKg: number
  feedConversion: number
}): Result<GroupBiomass, FeedRefusal> {
  const { count, meanWeightG, feedGivenKg, feedConversion } = input
  const { leastFeedConversion: min, mostFeedConversion: max } = feedLimits
  const refused = checkNumbers([
    [count, { field: 'count', unit: 'ratio', above: 0, max: feedLimits.mostCount }],
    [meanWeightG, { field: 'meanWeightG', unit: 'g', above: 0, max: feedLimits.mostMeanWeightG }],
    [feedGivenKg, { field: 'feedGivenKg', unit: 'kg', min: 0, max: feedLimits.mostFeedKg }],
    [feedConversion, { field: 'feedConversion', unit: 'ratio', min, max }],
  ])
  if (refused) return refused
  if (!Number.isInteger(count)) return refuse('count-not-whole', 'count')
  const weighedKg = (count * meanWeightG) / gramsPerKilogram
  const gainKg = feedGivenKg / feedConversion
  return ok({ biomassKg: weighedKg + gainKg, weighedKg, gainKg })
}

/** A group's weight with both ends of it. */
export interface GroupBiomassRange extends GroupBiomass {
  lowKg: number
  highKg: number
}

/**
 * A group's weight and what errors of the count and of the mean weight make of it: the widest range they can make together.
 * The growth by feed has no error here, so the range is of the weighing alone.
 *
 * @param input.countErrorPercent      of the count, 0…90; an estimated count has a large one
 * @param input.meanWeightErrorPercent of the mean weight, 0…90
 * @returns kg; both ends are the weight itself where both errors are 0
 * @refuses as groupBiomass · below-least, above-most (countErrorPercent, meanWeightErrorPercent)
 * @source  both ends of each factor; held by its law
 */
export function groupBiomassRange(
  input: Parameters<typeof groupBiomass>[0] & { countErrorPercent: number; meanWeightErrorPercent: number },
): Result<GroupBiomassRange, FeedRefusal> {
  const group = groupBiomass(input)
  if (!group.ok) return group
  const { countErrorPercent, meanWeightErrorPercent } = input
  const error = { unit: 'percent', min: 0, max: feedLimits.mostErrorPercent } as const
  const refused = checkNumbers([
    [countErrorPercent, { ...error, field: 'countErrorPercent' }],
    [meanWeightErrorPercent, { ...error, field: 'meanWeightErrorPercent' }],
  ])
  if (refused) return refused
  const { weighedKg, gainKg } = group.value
  const [count, mean] = [countErrorPercent / 100, meanWeightErrorPercent / 100]
  return ok({
    ...group.value,
    lowKg: weighedKg * (1 - count) * (1 - mean) + gainKg,
    highKg: weighedKg * (1 + count) * (1 + mean) + gainKg,
  })
}
