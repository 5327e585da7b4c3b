import { ok, refuse, type Result } from '../result.ts'
import { compareInstants, hoursBetween, minutesBetween } from '../time/instant-arithmetic.ts'
import { isInstant, type Instant } from '../time/instant.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import type { BathDose } from './bath-dose.ts'
import { computeBathDose, type BathDoseInput } from './compute-bath-dose.ts'
import { doseLimits } from './dose-limits.ts'
import type { DoseRefusal } from './dose-refusal.ts'

/** An amount of the product that went into the water. */
export interface Addition {
  amount: Quantity
  at: Instant
}

export interface ReadingStepInput extends Omit<BathDoseInput, 'present'> {
  /** The newest reading of what the target is of. */
  reading: { concentration: Quantity; readAt: Instant }
  /** The moment of the addition. */
  asOf: Instant
  /** Signed limits of the order, in amounts of the product. */
  largestSingle: Quantity
  largestInDay: Quantity
  /** How long a reading counts; 120 minutes unless the facility asks for less. */
  readingValidMinutes?: number
  /** Earliest reading that may follow an addition, hours after it. */
  retestAfterHours?: number
  /** What was added before, at least of the last 24 hours. */
  additions: readonly Addition[]
}

export interface ReadingStep extends BathDose {
  /** Added in the 24 hours before, in `unit`, without this step. */
  addedInDay: number
}

const sameAmount = 1 + 1e-9

/**
 * The next addition of a reading-driven order (copper): (target − newest reading) × volume, inside the limits that were
 * signed. Nothing is worked out from a reading that is too old, lies in the future, or was taken too soon after the
 * last addition; and nothing that passes a limit is offered as an amount.
 *
 * @returns the step, measured as the balance can; limits are compared with what would really be weighed
 * @refuses as computeBathDose, reading-at-or-above-target among them: nothing to add · time-not-readable ·
 *          reading-in-future · reading-too-old (params minutes, most) · retest-too-early (hours, least) ·
 *          addition-above-single-limit, addition-above-day-limit (amount, limit, unit) · limit-of-other-kind
 * @source  project-default; check value: 0.15 mg/L from 0.11 in 2,400 L is
 *          96 mg of copper, 0.377 g of the pentahydrate
 */
export function readingDrivenStep(input: ReadingStepInput): Result<ReadingStep, DoseRefusal> {
  const { reading, asOf, largestSingle, largestInDay, additions, ...bath } = input
  const timely = timelyReading(input)
  if (!timely.ok) return timely
  const dose = computeBathDose({ ...bath, present: reading.concentration })
  if (!dose.ok) return dose
  const dimension = dose.value.unit === 'g' ? 'mass' : 'volume'
  const sizeOf = (quantity: Quantity, field: string): Result<number, DoseRefusal> => {
    const parsed = parseQuantity(quantity, { dimension, min: 0, field })
    if (parsed.ok) return dimension === 'mass' ? ok(parsed.value.value) : ok(parsed.value.value * 1000)
    return parsed.refusal.code === 'dimensions-differ' ? refuse('limit-of-other-kind', field) : parsed
  }
  const single = sizeOf(largestSingle, 'largestSingle')
  if (!single.ok) return single
  const day = sizeOf(largestInDay, 'largestInDay')
  if (!day.ok) return day
  let addedInDay = 0
  for (const addition of additions) {
    if (typeof addition.at !== 'string' || !isInstant(addition.at))
      return refuse('time-not-readable', 'additions')
    const size = sizeOf(addition.amount, 'additions')
    if (!size.ok) return size
    if (hoursBetween(addition.at, asOf) < 24) addedInDay += size.value
  }
  const weighed =
    dose.value.measured === undefined ? ok(dose.value.amount) : sizeOf(dose.value.measured, 'division')
  if (!weighed.ok) return weighed
  const { unit } = dose.value
  const over = (
    code: 'addition-above-single-limit' | 'addition-above-day-limit',
    amount: number,
    limit: number,
  ) => refuse(code, undefined, { amount: tidy(amount), limit: tidy(limit), unit })
  if (weighed.value > single.value * sameAmount)
    return over('addition-above-single-limit', weighed.value, single.value)
  if (addedInDay + weighed.value > day.value * sameAmount)
    return over('addition-above-day-limit', addedInDay + weighed.value, day.value)
  return ok({ ...dose.value, addedInDay })
}

function timelyReading(input: ReadingStepInput): Result<undefined, DoseRefusal> {
  const { reading, asOf, additions, retestAfterHours } = input
  for (const at of [reading.readAt, asOf])
    if (typeof at !== 'string' || !isInstant(at)) return refuse('time-not-readable', 'readAt')
  const most = input.readingValidMinutes ?? doseLimits.readingValidMinutes
  const minutes = minutesBetween(reading.readAt, asOf)
  if (minutes < 0) return refuse('reading-in-future', 'readAt')
  if (!(minutes <= most)) return refuse('reading-too-old', 'readAt', { minutes: Math.floor(minutes), most })
  const last = additions
    .map((addition) => addition.at)
    .filter((at) => typeof at === 'string' && isInstant(at))
    .sort(compareInstants)
    .at(-1)
  if (last === undefined || retestAfterHours === undefined) return ok(undefined)
  const hours = hoursBetween(last, reading.readAt)
  if (hours < retestAfterHours)
    return refuse('retest-too-early', 'readAt', { hours: tidy(Math.max(hours, 0)), least: retestAfterHours })
  return ok(undefined)
}

/** Six digits are enough for a sentence. */
function tidy(value: number): number {
  return Number(value.toPrecision(6))
}
