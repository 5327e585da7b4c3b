import { ok, refuse, type Result } from '../result.ts'
import { isUnitCode } from './is-unit-code.ts'
import type { ConversionRefusal } from './number-refusal.ts'
import { unitOf } from './unit-of.ts'
import type { UnitCode } from './unit-table.ts'

const absoluteZeroC = -273.15

/**
 * A value in another unit of the same dimension.
 *
 * @param value any finite number in `from`
 * @returns the value in `to`, double precision, at most two roundings away from exact; unchanged when the units are one
 * @refuses not-finite (also when the answer overflows) | unknown-unit | dimensions-differ (mg/L to kg, PSS-78 to g/kg,
 *          a temperature to a difference of temperatures) | below-absolute-zero
 * @source  nist-sp-811 · check values unit.*, alk.*
 */
export function convert(value: number, from: UnitCode, to: UnitCode): Result<number, ConversionRefusal> {
  if (typeof value !== 'number' || !Number.isFinite(value)) return refuse('not-finite', 'value')
  if (!isUnitCode(from)) return refuse('unknown-unit', 'from', { typed: String(from) })
  if (!isUnitCode(to)) return refuse('unknown-unit', 'to', { typed: String(to) })
  const source = unitOf(from)
  const target = unitOf(to)
  if (source.dimension !== target.dimension) return refuse('dimensions-differ', 'to', { from, to })
  if (source.dimension === 'temperature') {
    const celsius = ((value + source.offset) * source.numerator) / source.denominator
    if (celsius < absoluteZeroC) return refuse('below-absolute-zero', 'value', { unit: from })
  }
  if (from === to) return ok(value)
  // One multiplication and one division by whole numbers, so that 2.5 g is 2500 mg and not 2500.0000000000005.
  const above = greatestCommonDivisor(source.numerator, target.numerator)
  const below = greatestCommonDivisor(source.denominator, target.denominator)
  const numerator = (source.numerator / above) * (target.denominator / below)
  const denominator = (source.denominator / below) * (target.numerator / above)
  const common = greatestCommonDivisor(numerator, denominator)
  const converted = ((value + source.offset) * (numerator / common)) / (denominator / common) - target.offset
  return Number.isFinite(converted) ? ok(converted) : refuse('not-finite', 'value')
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b)
}
