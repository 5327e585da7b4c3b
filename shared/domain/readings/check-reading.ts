import { ok, refuse, type Result } from '../result.ts'
import type { QuantityRefusal } from '../units/number-refusal.ts'
import type { Quantity } from '../units/quantity.ts'
import type { UnitCode } from '../units/unit-table.ts'
import { parameterOf, phScales, type PhScale, type ReadingParameter } from './parameters.ts'
import { readParameterValue } from './read-parameter-value.ts'

/** A reading as somebody entered it. */
export interface EnteredReading {
  parameter: ReadingParameter
  value: { value: unknown; unit: unknown }
  /** "below 0.05": the lowest mark of the kit, with nothing seen */
  below?: boolean
  scale?: string | null
}

/** A reading that can be kept. */
export interface CheckedReading {
  parameter: ReadingParameter
  entered: Quantity
  canonicalValue: number
  canonicalUnit: UnitCode
  below: boolean
  scale: PhScale | null
}

export type ReadingRefusal = QuantityRefusal | 'ph-scale-missing' | 'scale-only-for-ph' | 'cannot-be-below'

/**
 * Whether a reading can be kept, and its value in the canonical unit.
 *
 * @refuses as readParameterValue (field value) · ph-scale-missing, scale-only-for-ph (field scale) ·
 *          cannot-be-below (a thermometer has no lowest mark; field below)
 */
export function checkReading(reading: EnteredReading): Result<CheckedReading, ReadingRefusal> {
  const { parameter } = reading
  const below = reading.below ?? false
  const value = readParameterValue(parameter, reading.value)
  if (!value.ok) return value
  const scale = phScales.find((one) => one === reading.scale) ?? null
  if (parameter === 'ph' && scale === null) return refuse('ph-scale-missing', 'scale')
  if (parameter !== 'ph' && reading.scale) return refuse('scale-only-for-ph', 'scale')
  if (below && !parameterOf(parameter).mayBeBelow) return refuse('cannot-be-below', 'below')
  return ok({
    parameter,
    entered: value.value.entered,
    canonicalValue: value.value.value,
    canonicalUnit: value.value.unit,
    below,
    scale,
  })
}
