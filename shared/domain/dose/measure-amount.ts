import { ok, refuse, type Result } from '../result.ts'
import { roundToDivision } from '../quantities/round-to-division.ts'
import { convert } from '../units/convert.ts'
import { isUnitCode } from '../units/is-unit-code.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import type { Measure } from './bath-product.ts'
import { doseLimits } from './dose-limits.ts'
import type { DoseRefusal } from './dose-refusal.ts'

/**
 * The amount as the named balance or measure can take it, in the unit of its division, halves up.
 *
 * @param amount in grams or millilitres
 * @returns undefined without a measure
 * @refuses division-not-positive · division-of-other-kind: a balance for a liquid by volume · too-little-to-measure
 *          below 10 divisions (params: least, unit): make a stock solution
 * @source  check values of rounding: decimal halves · the ten divisions: project-default
 */
export function measureAmount(
  amount: number,
  unit: 'g' | 'mL',
  measure: Measure | undefined,
): Result<Quantity | undefined, DoseRefusal> {
  if (measure === undefined) return ok(undefined)
  const field = 'division'
  const { division } = measure
  const kind = unit === 'g' ? 'mass' : 'volume'
  const size = parseQuantity(division, { dimension: kind, field })
  if (!size.ok)
    return size.refusal.code === 'dimensions-differ' ? refuse('division-of-other-kind', field) : size
  const { entered } = size.value
  if (!isUnitCode(entered.unit) || size.value.value <= 0) return refuse('division-not-positive', field)
  const there = convert(amount, unit, entered.unit)
  if (!there.ok) return refuse(there.refusal.code, field)
  const least = Number(entered.value) * doseLimits.leastDivisions
  // exactly ten divisions are enough, however their binary form came out
  if (there.value * (1 + 1e-9) < least)
    return refuse('too-little-to-measure', field, {
      least: Number(least.toPrecision(12)),
      unit: entered.unit,
    })
  const rounded = roundToDivision(there.value, entered.value)
  return rounded.ok ? ok({ value: rounded.value, unit: entered.unit }) : refuse(rounded.refusal.code, field)
}
