import { ok, refuse, type Result } from '../result.ts'
import { convert } from './convert.ts'
import { findUnit } from './find-unit.ts'
import type { QuantityRefusal } from './number-refusal.ts'
import { parseNumber } from './parse-number.ts'
import type { Quantity } from './quantity.ts'
import { unitOf } from './unit-of.ts'
import { canonicalUnit, type Dimension, type UnitCode, type UnitOf } from './unit-table.ts'

export interface QuantityRules<D extends Dimension> {
  dimension: D
  /** Exclusive lower limit, canonical unit; 0 asks for a positive quantity. */
  above?: number
  /** Inclusive lower limit, canonical unit. */
  min?: number
  /** Inclusive upper limit, canonical unit. */
  max?: number
  /** The name of the input that a refusal points to. */
  field?: string
  gallon?: 'us' | 'imperial'
}

export interface ParsedQuantity<D extends Dimension = Dimension> {
  /** In the canonical unit of the dimension. */
  value: number
  unit: (typeof canonicalUnit)[D]
  /** As entered: their digits, their unit. */
  entered: Quantity<UnitOf<D>>
}

/**
 * Reads what stands in a field with a number and a unit.
 *
 * @param entered `{ value, unit }` from a form or the wire; the unit may be a code or what a person types
 * @returns the canonical number and the quantity as entered
 * @refuses every code of parseNumber, findUnit and convert · not-above-zero, below-least, above-most with the limit in
 *          the unit typed (params: limit, unit); `field` is `rules.field`
 */
export function parseQuantity<D extends Dimension>(
  entered: { value: unknown; unit: unknown } | null | undefined,
  rules: QuantityRules<D>,
): Result<ParsedQuantity<D>, QuantityRefusal> {
  const field = rules.field ?? 'value'
  const canonical: UnitCode = canonicalUnit[rules.dimension]
  const number = parseNumber(entered?.value ?? '', field)
  if (!number.ok) return refuse(number.refusal.code, field, { unit: canonical, ...number.refusal.params })
  const unit = findUnit(entered?.unit, rules)
  if (!unit.ok) return refuse(unit.refusal.code, field, { unit: canonical, ...unit.refusal.params })
  if (unitOf(unit.value).dimension !== rules.dimension)
    return refuse('dimensions-differ', field, { from: unit.value, to: canonical })
  const converted = convert(number.value.value, unit.value, canonical)
  if (!converted.ok) return refuse(converted.refusal.code, field, { unit: unit.value })
  const value = onTheLimit(converted.value, rules)

  const limit = (code: 'not-above-zero' | 'below-least' | 'above-most', limitValue: number) => {
    const shown = convert(limitValue, canonical, unit.value)
    const text = shown.ok ? String(Number(shown.value.toPrecision(6))) : String(limitValue)
    return refuse(code, field, { limit: text, unit: unit.value })
  }
  if (rules.above !== undefined && value <= rules.above)
    return limit(rules.above === 0 ? 'not-above-zero' : 'below-least', rules.above)
  if (rules.min !== undefined && value < rules.min) return limit('below-least', rules.min)
  if (rules.max !== undefined && value > rules.max) return limit('above-most', rules.max)
  return ok({
    value,
    unit: canonicalUnit[rules.dimension],
    entered: { value: number.value.text, unit: unit.value as UnitOf<D> },
  })
}

/** The arithmetic of two scales differs in its last digit: 28.4 °F is −2.0000000000000004 °C, and no colder than −2. */
const lastDigit = 1e-14

/** A value that a conversion put just outside an inclusive limit is that limit. */
function onTheLimit(
  value: number,
  { min, max }: { min?: number | undefined; max?: number | undefined },
): number {
  for (const limit of [min, max])
    if (limit !== undefined && Math.abs(value - limit) <= lastDigit * Math.max(1, Math.abs(limit)))
      return limit
  return value
}
