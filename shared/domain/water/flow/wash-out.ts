import { ok, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import { checkNumber } from '../../units/check-number.ts'
import { finiteOrRefuse } from '../../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import { volumeRules } from './flow-limits.ts'

type FlowRefusal = LimitRefusal | 'not-finite'
const fractionRules = (field: string) => ({ field, unit: 'ratio', above: 0, max: 1 }) as const

/**
 * How many turnovers of well-mixed water leave a share of what was in it: −ln f. One leaves 36.8 %, three leave 5 %.
 *
 * @param fraction what is left, above 0 and at most 1
 * @returns turnovers, 0 or more
 * @refuses not-finite · not-above-zero, above-most (field fraction)
 * @source  stirred-tank · check values wash.01 to wash.04
 */
export function turnoversToFraction(fraction: number): Result<number, FlowRefusal> {
  const checked = checkNumber(fraction, fractionRules('fraction'))
  // a logarithm of 1 is a negative nothing
  return checked.ok ? ok(0 - Math.log(fraction)) : checked
}

/**
 * How long a flow takes to leave a share of what was in well-mixed water: −(V ÷ Q) ln f. Dead corners make it longer:
 * a lower bound, which a test confirms.
 *
 * @returns minutes
 * @refuses not-finite (flowLPerMin, where the time is beyond any number) · not-above-zero (volume, flow, fraction) · above-most
 * @source  stirred-tank · check value wash.05
 */
export function minutesToFraction(input: {
  fraction: number
  volumeLitres: number
  flowLPerMin: number
}): Result<number, FlowRefusal> {
  const { fraction, volumeLitres, flowLPerMin } = input
  const refused = checkNumbers([
    [fraction, fractionRules('fraction')],
    [volumeLitres, volumeRules('volumeLitres')],
    [flowLPerMin, { ...volumeRules('flowLPerMin'), unit: 'L/min' }],
  ])
  if (refused) return refused
  return finiteOrRefuse((volumeLitres * (0 - Math.log(fraction))) / flowLPerMin, 'flowLPerMin')
}

/**
 * The share of well-mixed water that a number of turnovers has replaced: 100 (1 − e^−n).
 *
 * @param turnovers 0…1,000,000
 * @returns percent, 0…100
 * @refuses not-finite · below-least, above-most
 * @source  stirred-tank · check value wash.06
 */
export function percentReplaced(turnovers: number): Result<number, FlowRefusal> {
  const checked = checkNumber(turnovers, { field: 'turnovers', unit: 'ratio', min: 0, max: 1_000_000 })
  // of few turnovers 1 − e^−n keeps no digits when it is taken in two steps
  return checked.ok ? ok(100 * (0 - Math.expm1(-turnovers))) : checked
}
