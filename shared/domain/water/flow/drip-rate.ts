import { ok, refuse, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import { finiteOrRefuse } from '../../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import { waterLimits } from '../water-limits.ts'
import { concentrationRules, flowRules, timeRules, volumeRules } from './flow-limits.ts'

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

/**
 * What a drip makes of a flow, the other way round from dripRate: s q ÷ (Q + q).
 *
 * @param input.dripMlPerMin above 0, at most 100,000,000 mL/min
 * @returns mg/L, below the stock
 * @refuses not-finite (also where flow and drip together are nothing) · below-least, above-most, not-above-zero
 * @source  stirred-tank · the way back from drip.01
 */
export function dripConcentration(input: {
  inflowLPerMin: number
  dripMlPerMin: number
  stockMgPerMl: number
}): Result<number, DripRefusal> {
  const { inflowLPerMin, dripMlPerMin, stockMgPerMl } = input
  const dripRules = { ...volumeRules('dripMlPerMin'), unit: 'mL/min' } as const
  const refused = checkNumbers([
    [inflowLPerMin, flowRules('inflowLPerMin')],
    [dripMlPerMin, dripRules],
    [stockMgPerMl, stockRules],
  ])
  if (refused) return refused
  const dripLPerMin = dripMlPerMin / perThousand
  return finiteOrRefuse(
    (stockMgPerMl * perThousand * dripLPerMin) / (inflowLPerMin + dripLPerMin),
    'dripMlPerMin',
  )
}

/**
 * What a drip takes over its whole time, with what primed the tank: q t + priming, and the drug in it.
 *
 * @returns mL of stock, and mg of drug
 * @refuses not-finite · below-least, above-most · not-above-zero (stock)
 * @source  stirred-tank
 */
export function dripTotal(input: {
  dripMlPerMin: number
  minutes: number
  primingMl: number
  stockMgPerMl: number
}): Result<{ stockMl: number; drugMg: number }, DripRefusal> {
  const { dripMlPerMin, minutes, primingMl, stockMgPerMl } = input
  const most = waterLimits.mostLitres * perThousand
  const refused = checkNumbers([
    [dripMlPerMin, { field: 'dripMlPerMin', unit: 'mL/min', min: 0, max: most }],
    [minutes, timeRules('minutes')],
    [primingMl, { field: 'primingMl', unit: 'mL', min: 0, max: most }],
    [stockMgPerMl, stockRules],
  ])
  if (refused) return refused
  const stockMl = dripMlPerMin * minutes + primingMl
  return ok({ stockMl, drugMg: stockMl * stockMgPerMl })
}
