import { refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import type { FeedRefusal } from './feed-refusal.ts'

/** 1 % w/w is 10 g in a kilogram. */
const gPerKgOfOnePercent = 10
const kilogramsPerTonne = 1000

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
