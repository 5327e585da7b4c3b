import { ok, refuse, type Result } from '../result.ts'
import type { QuantityRefusal } from '../units/number-refusal.ts'
import type { UnitCode } from '../units/unit-table.ts'
import type { ReadingParameter } from './parameters.ts'
import { readParameterValue } from './read-parameter-value.ts'
import { rangeLimits, type RangeLimit, type WaterRange } from './water-range.ts'

/** Limits as typed, all in one unit; an absent or empty one does not exist. */
export type EnteredRange = { unit: string } & Partial<Record<RangeLimit, string | null>>

export interface CheckedRange {
  range: WaterRange
  enteredUnit: UnitCode
  entered: Record<RangeLimit, string | null>
}

export type RangeRefusal = QuantityRefusal | 'range-empty' | 'range-out-of-order'

/**
 * Reads the limits wanted of a parameter.
 *
 * @refuses as readParameterValue, with the limit as field · range-empty when no limit is given ·
 *          range-out-of-order (field names the limit that is not above the one before it; an outer limit may equal
 *          the inner one beside it)
 */
export function checkRange(
  parameter: ReadingParameter,
  given: EnteredRange,
): Result<CheckedRange, RangeRefusal> {
  const entered: Record<RangeLimit, string | null> = {
    outerLow: null,
    innerLow: null,
    innerHigh: null,
    outerHigh: null,
  }
  const values: Record<RangeLimit, number | null> = { ...entered } as Record<RangeLimit, number | null>
  let enteredUnit: UnitCode | null = null
  let unit: UnitCode | null = null
  for (const limit of rangeLimits) {
    const typed = given[limit]?.trim()
    if (!typed) continue
    const read = readParameterValue(parameter, { value: typed, unit: given.unit }, limit)
    if (!read.ok) return read
    values[limit] = read.value.value
    entered[limit] = read.value.entered.value
    enteredUnit = read.value.entered.unit
    unit = read.value.unit
  }
  if (enteredUnit === null || unit === null) return refuse('range-empty', 'innerLow')
  const wrong = limitOutOfOrder(values)
  if (wrong) return refuse('range-out-of-order', wrong)
  return ok({ range: { unit, ...values }, enteredUnit, entered })
}

function limitOutOfOrder(values: Record<RangeLimit, number | null>): RangeLimit | null {
  let before: { limit: RangeLimit; value: number } | null = null
  for (const limit of rangeLimits) {
    const value = values[limit]
    if (value === null) continue
    const sameSide = before?.limit.endsWith('Low') === limit.endsWith('Low')
    if (before && (value < before.value || (value === before.value && !sameSide))) return limit
    before = { limit, value }
  }
  return null
}
