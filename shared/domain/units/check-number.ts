import { ok, refuse, type Result } from '../result.ts'
import type { LimitRefusal } from './number-refusal.ts'
import type { UnitCode } from './unit-table.ts'

export interface NumberRules {
  /** The name of the input that a refusal points to, as the function names it: "temperatureC". */
  field: string
  /** Unit of the number, for the sentence of a refusal. */
  unit: UnitCode
  /** Exclusive lower limit; 0 asks for a positive number. */
  above?: number
  /** Inclusive lower limit. */
  min?: number
  /** Inclusive upper limit. */
  max?: number
}

/**
 * Asks of a number that an engine was handed whether it lies where the engine's formula holds.
 *
 * @returns the number itself
 * @refuses not-finite (also what is no number at all) · not-above-zero, below-least, above-most with params limit, unit
 */
export function checkNumber(value: number, rules: NumberRules): Result<number, LimitRefusal | 'not-finite'> {
  const { field, unit, above, min, max } = rules
  if (typeof value !== 'number' || !Number.isFinite(value)) return refuse('not-finite', field, { unit })
  if (above !== undefined && value <= above)
    return refuse(above === 0 ? 'not-above-zero' : 'below-least', field, { limit: String(above), unit })
  if (min !== undefined && value < min) return refuse('below-least', field, { limit: String(min), unit })
  if (max !== undefined && value > max) return refuse('above-most', field, { limit: String(max), unit })
  return ok(value)
}
