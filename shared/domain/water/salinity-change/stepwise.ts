import { ok, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import { wholeSteps } from '../../units/whole-steps.ts'
import { volumeRules } from '../flow/flow-limits.ts'
import { checkSalinityChange, type SalinityChange, type SalinityChangeRefusal } from './swap.ts'

export interface SalinityStep {
  /** From 1 on; one a day. */
  day: number
  fromSalinity: number
  toSalinity: number
  /** To take out and replace on that day. */
  swapLitres: number
}

/** Of a schedule longer than this nobody means the rate. */
const mostDays = 400

/**
 * How many days a change of salinity takes at a limit a day: |S1 − S2| ÷ limit, the next whole number.
 *
 * @param input.mostPerDay above 0
 * @refuses as checkSalinityChange · not-above-zero (mostPerDay) · below-least (mostPerDay) where it would take over 400 days
 * @source  salt-balance · check value sal.07
 */
export function stepwiseDays(
  input: SalinityChange & { mostPerDay: number },
): Result<number, SalinityChangeRefusal> {
  const { startSalinity, targetSalinity, mostPerDay } = input
  const rules = { field: 'mostPerDay', unit: 'PSS-78', above: 0, max: 42 } as const
  const refused = checkNumbers([[mostPerDay, rules]])
  if (refused) return refused
  const checked = checkSalinityChange(input)
  if (!checked.ok) return checked
  const change = Math.abs(startSalinity - targetSalinity)
  const least = checkNumbers([[mostPerDay, { ...rules, min: change / mostDays }]])
  return least ?? ok(wholeSteps(change / mostPerDay))
}

/**
 * Equal daily steps from one salinity to another, each with its litres: V (Si − Si+1) ÷ (Si − Sr). The litres differ from
 * day to day, since the water that comes in finds less to thin.
 *
 * @refuses as stepwiseDays · not-above-zero (volumeLitres)
 * @source  salt-balance · check values sal.08, sal.09
 */
export function stepwiseSchedule(
  input: SalinityChange & { mostPerDay: number; volumeLitres: number },
): Result<SalinityStep[], SalinityChangeRefusal> {
  const refused = checkNumbers([[input.volumeLitres, volumeRules('volumeLitres')]])
  if (refused) return refused
  const days = stepwiseDays(input)
  if (!days.ok) return days
  const { startSalinity, targetSalinity, replacementSalinity, volumeLitres } = input
  const at = (day: number) =>
    day === days.value
      ? targetSalinity
      : startSalinity + ((targetSalinity - startSalinity) * day) / days.value
  return ok(
    Array.from({ length: days.value }, (_, before) => {
      const [fromSalinity, toSalinity] = [at(before), at(before + 1)]
      const swapLitres = (volumeLitres * (fromSalinity - toSalinity)) / (fromSalinity - replacementSalinity)
      return { day: before + 1, fromSalinity, toSalinity, swapLitres }
    }),
  )
}
