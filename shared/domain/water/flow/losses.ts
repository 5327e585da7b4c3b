import { ok, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import { concentrationRules } from './flow-limits.ts'

type LossRefusal = LimitRefusal | 'not-finite'

/** After more half-lives than these what is left has no digits in a double. */
const mostHalfLives = 1000
const hours = (field: string) => ({ field, unit: 'h', min: 0, max: 1_000_000 }) as const

/**
 * The share that a loss of first order leaves in a time: 2^(−t ÷ half-life).
 *
 * @param input.halfLifeHours above 0, at most 1,000,000
 * @param input.hours         0…1,000,000, at most a thousand half-lives
 * @returns a fraction above 0, at most 1
 * @refuses not-finite · below-least, above-most · not-above-zero (half-life)
 * @source  stirred-tank · check value decay.01
 */
export function shareKept(input: { halfLifeHours: number; hours: number }): Result<number, LossRefusal> {
  const refused = checkNumbers([
    [input.halfLifeHours, { field: 'halfLifeHours', unit: 'h', above: 0, max: 1_000_000 }],
    [input.hours, hours('hours')],
  ])
  if (refused) return refused
  const max = Number((mostHalfLives * input.halfLifeHours).toPrecision(6))
  const countable = checkNumbers([[input.hours, { ...hours('hours'), max }]])
  return countable ?? ok(2 ** (-input.hours / input.halfLifeHours))
}

/**
 * What a loss of first order has left: C0 × 2^(−t ÷ half-life).
 *
 * @returns mg/L
 * @refuses not-finite · below-least, above-most · not-above-zero (half-life)
 * @source  stirred-tank · check value decay.01
 */
export function concentrationAfterLoss(input: {
  initialMgPerL: number
  halfLifeHours: number
  hours: number
}): Result<number, LossRefusal> {
  const refused = checkNumbers([[input.initialMgPerL, concentrationRules('initialMgPerL')]])
  if (refused) return refused
  const kept = shareKept(input)
  return kept.ok ? ok(input.initialMgPerL * kept.value) : kept
}

/**
 * Where repeated doses lead: with a dose D every interval and a share r = (1 − f) e^(−kτ) left of it, the peak comes to
 * D ÷ (1 − r) and the trough to D r ÷ (1 − r).
 *
 * @param input.changeFraction f, the share of water changed in each interval, 0…1
 * @returns mg/L of both
 * @refuses not-finite · limits · above-most (changeFraction) where nothing at all is lost and the peak has no end
 * @source  stirred-tank · check value wc.09
 */
export function repeatDoseSteadyState(input: {
  doseMgPerL: number
  changeFraction: number
  lossPerHour: number
  intervalHours: number
}): Result<{ peakMgPerL: number; troughMgPerL: number }, LossRefusal | 'nothing-is-lost'> {
  const { doseMgPerL, changeFraction, lossPerHour, intervalHours } = input
  const refused = checkNumbers([
    [doseMgPerL, concentrationRules('doseMgPerL')],
    [changeFraction, { field: 'changeFraction', unit: 'ratio', min: 0, max: 1 }],
    [lossPerHour, { field: 'lossPerHour', unit: 'per_h', min: 0, max: 1000 }],
    [intervalHours, { field: 'intervalHours', unit: 'h', above: 0, max: 1_000_000 }],
  ])
  if (refused) return refused
  const left = (1 - changeFraction) * Math.exp(-lossPerHour * intervalHours)
  if (left > 1 - 1e-9) return { ok: false, refusal: { code: 'nothing-is-lost', field: 'changeFraction' } }
  const peakMgPerL = doseMgPerL / (1 - left)
  return ok({ peakMgPerL, troughMgPerL: peakMgPerL * left })
}
