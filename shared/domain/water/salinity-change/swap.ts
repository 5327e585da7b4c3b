import { readsAsSpecificGravity } from '../../seawater/specific-gravity.ts'
import { ok, refuse, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import { finiteOrRefuse } from '../../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import { volumeRules } from '../flow/flow-limits.ts'

export type SalinityChangeRefusal =
  | LimitRefusal
  | 'not-finite'
  | 'specific-gravity-as-salinity'
  | 'target-beyond-replacement'
  | 'target-behind-start'

/** Salinities of the water, of what is wanted, and of the water that comes in; one scale for all three. */
export interface SalinityChange {
  startSalinity: number
  targetSalinity: number
  replacementSalinity: number
}

const salinity = (field: string) => ({ field, unit: 'PSS-78', min: 0, max: 42 }) as const

/**
 * Refuses what is no salinity, and a target beyond the replacement water. The replacement's own salinity is reached by
 * swapping all of the water.
 */
export function checkSalinityChange(input: SalinityChange): Result<SalinityChange, SalinityChangeRefusal> {
  const { startSalinity, targetSalinity, replacementSalinity } = input
  const refused = checkNumbers([
    [startSalinity, salinity('startSalinity')],
    [targetSalinity, salinity('targetSalinity')],
    [replacementSalinity, salinity('replacementSalinity')],
  ])
  if (refused) return refused
  for (const [field, value] of Object.entries({ startSalinity, targetSalinity, replacementSalinity }))
    if (readsAsSpecificGravity(value)) return refuse('specific-gravity-as-salinity', field)
  if (startSalinity === targetSalinity) return ok(input)
  const toGo = startSalinity - targetSalinity
  const towards = startSalinity - replacementSalinity
  if (Math.sign(toGo) !== Math.sign(towards)) return refuse('target-behind-start', 'targetSalinity')
  return Math.abs(toGo) > Math.abs(towards)
    ? refuse('target-beyond-replacement', 'targetSalinity')
    : ok(input)
}

/**
 * The share of the water to swap at once: (S1 − S2) ÷ (S1 − Sr). Density is left out: for 35 → 16 the exact balance gives
 * 0.549 instead of 0.543, well inside the error of measuring; measure again before the next step.
 *
 * @returns a fraction, 0…1
 * @refuses not-finite, limits 0…42 · specific-gravity-as-salinity · target-beyond-replacement · target-behind-start
 * @source  salt-balance · check values sal.01 to sal.04, sal.refuse1, sal.refuse2
 */
export function swapFraction(input: SalinityChange): Result<number, SalinityChangeRefusal> {
  const checked = checkSalinityChange(input)
  if (!checked.ok) return checked
  const { startSalinity, targetSalinity, replacementSalinity } = input
  if (startSalinity === targetSalinity) return ok(0)
  return ok((startSalinity - targetSalinity) / (startSalinity - replacementSalinity))
}

/**
 * Litres to take out and replace at once.
 *
 * @refuses as swapFraction · not-above-zero, above-most (volumeLitres)
 * @source  salt-balance · check value sal.05
 */
export function swapLitres(
  input: SalinityChange & { volumeLitres: number },
): Result<number, SalinityChangeRefusal> {
  const refused = checkNumbers([[input.volumeLitres, volumeRules('volumeLitres')]])
  if (refused) return refused
  const fraction = swapFraction(input)
  return fraction.ok ? ok(fraction.value * input.volumeLitres) : fraction
}

/**
 * Litres that have to run through at a constant level: V ln((S1 − Sr) ÷ (S2 − Sr)). The salinity of the replacement
 * water itself is never quite reached.
 *
 * @refuses as swapLitres · target-beyond-replacement also where the target is the replacement's own · not-finite
 *          (targetSalinity) so near to it that no volume reaches it
 * @source  salt-balance · check value sal.06
 */
export function continuousExchangeLitres(
  input: SalinityChange & { volumeLitres: number },
): Result<number, SalinityChangeRefusal> {
  const refused = checkNumbers([[input.volumeLitres, volumeRules('volumeLitres')]])
  if (refused) return refused
  const checked = checkSalinityChange(input)
  if (!checked.ok) return checked
  const { startSalinity, targetSalinity, replacementSalinity, volumeLitres } = input
  if (startSalinity === targetSalinity) return ok(0)
  if (targetSalinity === replacementSalinity) return refuse('target-beyond-replacement', 'targetSalinity')
  return finiteOrRefuse(
    volumeLitres * Math.log((startSalinity - replacementSalinity) / (targetSalinity - replacementSalinity)),
    'targetSalinity',
  )
}
