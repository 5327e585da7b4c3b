import type { Result } from '../result.ts'
import { checkNumber, type NumberRules } from './check-number.ts'
import type { LimitRefusal } from './number-refusal.ts'

/** Asks of several numbers at once whether they lie where a formula holds: the first refusal, or nothing. */
export function checkNumbers(
  numbers: readonly (readonly [value: number, rules: NumberRules])[],
): Extract<Result<never, LimitRefusal | 'not-finite'>, { ok: false }> | undefined {
  for (const [value, rules] of numbers) {
    const checked = checkNumber(value, rules)
    if (!checked.ok) return checked
  }
  return undefined
}
