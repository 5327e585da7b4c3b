import { ok, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import { concentrationRules } from './flow-limits.ts'

type LossRefusal = LimitRefusal | 'not-finite'

const hours = (field: string) => ({ field, unit: 'h', min: 0, max: 1_000_000 }) as const

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
  const refused = checkNumbers([
    [input.initialMgPerL, concentrationRules('initialMgPerL')],
    [input.halfLifeHours, { field: 'halfLifeHours', unit: 'h', above: 0, max: 1_000_000 }],
    [input.hours, hours('hours')],
  ])
  return refused ?? ok(input.initialMgPerL * 2 ** (-input.hours / input.halfLifeHours))
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
