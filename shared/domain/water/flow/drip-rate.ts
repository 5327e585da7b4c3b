import { ok, refuse, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import { concentrationRules, flowRules, volumeRules } from './flow-limits.ts'

export type DripRefusal = LimitRefusal | 'not-finite' | 'target-above-strength'

const perThousand = 1000
const stockRules = { field: 'stockMgPerMl', unit: 'mg/mL', above: 0, max: 2000 } as const

/**
 * How fast a stock solution has to drip into a flow for a target: Q C ÷ (s − C), with s and C in one unit. The drip itself
 * thins what it brings; left out, the answer differs by C ÷ s.
 *
 * @returns mL/min
 * @refuses not-finite · below-least, above-most, not-above-zero · target-above-strength
 * @source  stirred-tank · check value drip.01
 */
export function dripRate(input: {
  inflowLPerMin: number
  targetMgPerL: number
  stockMgPerMl: number
}): Result<number, DripRefusal> {
  const { inflowLPerMin, targetMgPerL, stockMgPerMl } = input
  const refused = checkNumbers([
    [inflowLPerMin, flowRules('inflowLPerMin')],
    [targetMgPerL, concentrationRules('targetMgPerL')],
    [stockMgPerMl, stockRules],
  ])
  if (refused) return refused
  const stockMgPerL = stockMgPerMl * perThousand
  if (targetMgPerL >= stockMgPerL) return refuse('target-above-strength', 'targetMgPerL')
  return ok(((inflowLPerMin * targetMgPerL) / (stockMgPerL - targetMgPerL)) * perThousand)
}

/**
 * What primes the tank before the drip: C V ÷ s. Without it the water has 63 % of the target after one turnover.
 *
 * @returns mL of stock
 * @refuses as dripRate · not-above-zero (volume)
 * @source  stirred-tank · check value drip.03
 */
export function primingVolume(input: {
  volumeLitres: number
  targetMgPerL: number
  stockMgPerMl: number
}): Result<number, DripRefusal> {
  const { volumeLitres, targetMgPerL, stockMgPerMl } = input
  const refused = checkNumbers([
    [volumeLitres, volumeRules('volumeLitres')],
    [targetMgPerL, concentrationRules('targetMgPerL')],
    [stockMgPerMl, stockRules],
  ])
  if (refused) return refused
  if (targetMgPerL >= stockMgPerMl * perThousand) return refuse('target-above-strength', 'targetMgPerL')
  return ok((targetMgPerL * volumeLitres) / stockMgPerMl)
}
