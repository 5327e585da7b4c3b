import { ok, refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import { batchRules } from './feed-limits.ts'
import type { FeedRefusal } from './feed-refusal.ts'

/** 1 % w/w is 10 g in a kilogram. */
const gPerKgOfOnePercent = 10
const kilogramsPerTonne = 1000
const gramsPerKilogram = 1000
const gramsPerTonne = 1_000_000

/**
 * Premix in a tonne of the finished feed, the premix itself weighed in: target ÷ (10 × % w/w).
 *
 * @param input.targetGPerTonne  active substance, above 0, at most 1,000,000
 * @param input.premixPercentWw  active substance in the premix, above 0, at most 100
 * @returns kg
 * @refuses not-finite · not-above-zero, above-most · target-above-premix (targetGPerTonne)
 * @source  feed-arithmetic · check value feed.08
 */
export function premixKgPerTonne(input: {
  targetGPerTonne: number
  premixPercentWw: number
}): Result<number, FeedRefusal> {
  const { targetGPerTonne, premixPercentWw } = input
  const refused = checkNumbers([
    [targetGPerTonne, { field: 'targetGPerTonne', unit: 'mg/kg_w_w', above: 0, max: 1_000_000 }],
    [premixPercentWw, { field: 'premixPercentWw', unit: 'percent_w_w', above: 0, max: 100 }],
  ])
  if (refused) return refused
  const kilograms = targetGPerTonne / (gPerKgOfOnePercent * premixPercentWw)
  if (kilograms > kilogramsPerTonne) return refuse('target-above-premix', 'targetGPerTonne')
  return finiteOrRefuse(kilograms, 'premixPercentWw')
}

/**
 * Premix to weigh into a batch of feed: what a tonne takes, for the batch. The batch is the finished feed, the premix in it.
 *
 * @param input.batchG the finished batch, above 0, at most 1,000,000,000
 * @returns g
 * @refuses as premixKgPerTonne · not-above-zero, above-most (batchG)
 * @source  feed-arithmetic · premixKgPerTonne for a batch; held by its law
 */
export function premixForBatch(input: {
  targetGPerTonne: number
  premixPercentWw: number
  batchG: number
}): Result<number, FeedRefusal> {
  const perTonne = premixKgPerTonne(input)
  if (!perTonne.ok) return perTonne
  const refused = checkNumbers([[input.batchG, batchRules]])
  return refused ?? ok((perTonne.value * gramsPerKilogram * input.batchG) / gramsPerTonne)
}
