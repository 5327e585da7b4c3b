import { ok, refuse, type Result } from '../result.ts'
import { aligned, decimalOf, decimalText } from './decimal.ts'

/**
 * A computed amount rounded to what a balance or a measure can read; halves go up (away from zero), in decimal:
 * 1.005 to 0.01 is 1.01 although the double nearest 1.005 lies below it.
 *
 * @param value    amount in the unit of the division
 * @param division smallest step of the instrument as printed on it: "0.01", "0.5", "5"
 * @returns text with the places of the division: "0.440"
 * @refuses not-finite (value) | division-not-positive (division)
 */
export function roundToDivision(
  value: number | string,
  division: string,
): Result<string, 'not-finite' | 'division-not-positive'> {
  const amount = decimalOf(value)
  if (!amount) return refuse('not-finite', 'value')
  const step = decimalOf(division)
  if (!step || step.digits <= 0n) return refuse('division-not-positive', 'division')
  const { a, b, scale } = aligned(amount, step)
  const negative = a < 0n
  const size = negative ? -a : a
  const steps = (2n * size + b) / (2n * b)
  const rounded = { digits: (negative ? -steps : steps) * b, scale }
  const surplus = 10n ** BigInt(scale - step.scale)
  return ok(decimalText({ digits: rounded.digits / surplus, scale: step.scale }))
}
