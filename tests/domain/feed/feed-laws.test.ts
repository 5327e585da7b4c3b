import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { drugInFeed } from '../../../shared/domain/feed/drug-in-feed.ts'
import { gelBatchDays, gelBatchDrug } from '../../../shared/domain/feed/gel-batch.ts'
import { groupBiomass, groupBiomassRange } from '../../../shared/domain/feed/group-biomass.ts'
import { doseTaken, drugPerDay, feedPerDay } from '../../../shared/domain/feed/per-day.ts'
import { premixForBatch, premixKgPerTonne } from '../../../shared/domain/feed/premix.ts'
import { between, expectNear, expectTotal, refusalOf, valueOf } from '../../support/engine-laws.ts'

const days = fc.record({
  biomassKg: between(0.1, 100_000),
  doseMgPerKg: between(0.1, 500),
  feedingRatePercentBw: between(0.1, 20),
})

describe('laws of medicated feed', () => {
  it('the feed of a day holds the drug of a day', () => {
    fc.assert(
      fc.property(days, (day) => {
        expectNear(valueOf(drugInFeed(day)).mgPerKg * valueOf(feedPerDay(day)), valueOf(drugPerDay(day)))
      }),
    )
  })

  it('a group that eats all of its feed has taken its dose, and half of it by half of the feed', () => {
    fc.assert(
      fc.property(days, (day) => {
        const { mgPerKg: mgPerKgFeed } = valueOf(drugInFeed(day))
        const eatenKg = valueOf(feedPerDay(day))
        const taken = (eaten: number) => valueOf(doseTaken({ ...day, mgPerKgFeed, eatenKg: eaten }))
        expectNear(taken(eatenKg), day.doseMgPerKg)
        expectNear(taken(eatenKg / 2), day.doseMgPerKg / 2)
        expect(taken(0)).toBe(0)
      }),
    )
  })

  it('a short ton holds less than a tonne, by exactly 2,000 pounds of it', () => {
    fc.assert(
      fc.property(days, (day) => {
        const { mgPerKg, gPerShortTon } = valueOf(drugInFeed(day))
        expectNear(gPerShortTon, (mgPerKg * 2000 * 0.45359237) / 1000)
      }),
    )
  })

  it('the premix in a tonne holds what the tonne is to hold', () => {
    fc.assert(
      fc.property(between(1, 10_000), between(1, 100), (targetGPerTonne, premixPercentWw) => {
        const kilograms = valueOf(premixKgPerTonne({ targetGPerTonne, premixPercentWw }))
        expectNear((kilograms * 1000 * premixPercentWw) / 100, targetGPerTonne)
      }),
    )
  })

  it('the premix in a batch holds what the batch is to hold, and a tonne takes what a tonne takes', () => {
    const strengths = fc.record({ targetGPerTonne: between(1, 10_000), premixPercentWw: between(1, 100) })
    fc.assert(
      fc.property(strengths, between(1, 1_000_000), (strength, batchG) => {
        const grams = valueOf(premixForBatch({ ...strength, batchG }))
        expectNear(grams * (strength.premixPercentWw / 100) * 1e6, strength.targetGPerTonne * batchG)
        const tonne = valueOf(premixForBatch({ ...strength, batchG: 1_000_000 }))
        expectNear(tonne, valueOf(premixKgPerTonne(strength)) * 1000)
      }),
    )
  })

  it('a batch of gel holds the drug of as many days as it feeds', () => {
    fc.assert(
      fc.property(days, between(1, 100_000), (day, batchG) => {
        const batchDays = valueOf(gelBatchDays({ ...day, batchG }))
        expectNear(valueOf(gelBatchDrug({ ...day, batchG })), batchDays * valueOf(drugPerDay(day)))
      }),
    )
  })

  it('needs a stronger feed where less is eaten', () => {
    fc.assert(
      fc.property(days, between(1.001, 4), (day, factor) => {
        const more = { ...day, feedingRatePercentBw: day.feedingRatePercentBw * factor }
        expect(valueOf(drugInFeed(more)).mgPerKg).toBeLessThan(valueOf(drugInFeed(day)).mgPerKg)
      }),
    )
  })

  it('a group weighs what its halves weigh, and no less for the feed it was given', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 100_000 }),
        between(0.1, 10_000),
        between(0.001, 1000),
        between(0.5, 5),
        (half, meanWeightG, feedGivenKg, feedConversion) => {
          const weigh = (count: number, feed: number) =>
            valueOf(groupBiomass({ count, meanWeightG, feedGivenKg: feed, feedConversion }))
          expectNear(weigh(2 * half, 2 * feedGivenKg).biomassKg, 2 * weigh(half, feedGivenKg).biomassKg)
          const { biomassKg, weighedKg, gainKg } = weigh(half, feedGivenKg)
          expect(biomassKg).toBe(weighedKg + gainKg)
          expect(weigh(half, 0).biomassKg).toBe(weighedKg)
          expectNear(gainKg * feedConversion, feedGivenKg)
        },
      ),
    )
  })

  it('lies within its range, which is one figure without errors and wider with larger ones', () => {
    const group = fc.record({
      count: fc.integer({ min: 1, max: 100_000 }),
      meanWeightG: between(0.1, 10_000),
      feedGivenKg: between(0, 1000),
      feedConversion: between(0.5, 5),
    })
    fc.assert(
      fc.property(group, between(0.1, 40), between(0.1, 40), (given, count, mean) => {
        const { biomassKg, gainKg } = valueOf(groupBiomass(given))
        const range = (countErrorPercent: number, meanWeightErrorPercent: number) =>
          valueOf(groupBiomassRange({ ...given, countErrorPercent, meanWeightErrorPercent }))
        expect(range(0, 0)).toMatchObject({ lowKg: biomassKg, highKg: biomassKg })
        const { lowKg, highKg } = range(count, mean)
        expect(lowKg).toBeLessThan(biomassKg)
        expect(highKg).toBeGreaterThan(biomassKg)
        expect(lowKg).toBeGreaterThanOrEqual(gainKg)
        expect(range(2 * count, mean).highKg).toBeGreaterThan(highKg)
      }),
    )
  })

  it('takes a conversion of 1.5 as kilograms of feed for one of growth', () => {
    const grown = groupBiomass({ count: 5000, meanWeightG: 10, feedGivenKg: 60, feedConversion: 1.5 })
    expect(valueOf(grown)).toEqual({ biomassKg: 90, weighedKg: 50, gainKg: 40 })
  })

  it('refuses half an animal, a feed of more drug than feed, and one stronger than its premix', () => {
    const group = { count: 2.5, meanWeightG: 10, feedGivenKg: 0, feedConversion: 1 }
    expect(refusalOf(groupBiomass(group))).toEqual(['count-not-whole', 'count'])
    const starved = { doseMgPerKg: 500, feedingRatePercentBw: 0.01 }
    expect(refusalOf(drugInFeed(starved))).toEqual(['more-drug-than-feed', 'feedingRatePercentBw'])
    expect(refusalOf(gelBatchDrug({ ...starved, batchG: 400 }))).toEqual([
      'more-drug-than-feed',
      'feedingRatePercentBw',
    ])
    const strong = { targetGPerTonne: 10_001, premixPercentWw: 1 }
    expect(refusalOf(premixKgPerTonne(strong))).toEqual(['target-above-premix', 'targetGPerTonne'])
    expect(valueOf(premixKgPerTonne({ ...strong, targetGPerTonne: 10_000 }))).toBe(1000)
  })

  it('answers nonsense with a refusal or a finite number', () => {
    expectTotal([
      [groupBiomass, ['count', 'meanWeightG', 'feedGivenKg', 'feedConversion']],
      [
        groupBiomassRange,
        [
          ...['count', 'meanWeightG', 'feedGivenKg', 'feedConversion'],
          ...['countErrorPercent', 'meanWeightErrorPercent'],
        ],
      ],
      [drugPerDay, ['biomassKg', 'doseMgPerKg']],
      [feedPerDay, ['biomassKg', 'feedingRatePercentBw']],
      [doseTaken, ['mgPerKgFeed', 'eatenKg', 'biomassKg']],
      [drugInFeed, ['doseMgPerKg', 'feedingRatePercentBw']],
      [premixKgPerTonne, ['targetGPerTonne', 'premixPercentWw']],
      [premixForBatch, ['targetGPerTonne', 'premixPercentWw', 'batchG']],
      [gelBatchDrug, ['doseMgPerKg', 'feedingRatePercentBw', 'batchG']],
      [gelBatchDays, ['batchG', 'feedingRatePercentBw', 'biomassKg']],
    ])
  })
})
