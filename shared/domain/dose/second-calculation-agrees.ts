import { aligned, decimalOf, type Decimal } from '../quantities/decimal.ts'
import { ok, refuse, type Result } from '../result.ts'
import { convert } from '../units/convert.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import type { Dimension } from '../units/unit-table.ts'
import { unitOf } from '../units/unit-of.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { doseLimits } from './dose-limits.ts'

export interface Agreement {
  agrees: boolean
  /** Signed, second less first, relative to the first. */
  differencePercent: number
}

/**
 * Whether a blind second calculation agrees with the first: within ± 2 % of the first, or one division of the balance,
 * whichever is larger. Compared in decimals, so that 12.75 against 12.50 is exactly 2 %.
 *
 * @param first, second amounts as worked out; the second may be in another unit of the same dimension
 * @param division      smallest step of the balance or measure
 * @refuses as parseQuantity, field first, second or division · division-not-positive
 * @source  project-default, rule R39 · check values 12.50 and 12.75 agree, 1.3 and 1.4 on 0.1 agree, 12.50 and
 *          12.80 on 0.01 do not
 */
export function secondCalculationAgrees(
  first: Quantity,
  second: Quantity,
  division: Quantity,
): Result<Agreement, DoseRefusal> {
  const dimension: Dimension = unitOf(first.unit).dimension
  const one = parseQuantity(first, { dimension, above: 0, field: 'first' })
  if (!one.ok) return one
  const other = parseQuantity(second, { dimension, min: 0, field: 'second' })
  if (!other.ok) return other
  const step = parseQuantity(division, { dimension, field: 'division' })
  if (!step.ok) return step
  if (step.value.value <= 0) return refuse('division-not-positive', 'division')
  const [a, b, s] = [one, other, step].map((each) => inUnitOf(each.value.entered, one.value.entered))
  if (!a || !b || !s) return refuse('not-finite', 'second')
  const sides = aligned(b, a)
  const gap: Decimal = {
    digits: sides.a > sides.b ? sides.a - sides.b : sides.b - sides.a,
    scale: sides.scale,
  }
  // gap × 100 ≤ 2 × first, in whole numbers
  const byShare = aligned(
    { ...gap, digits: gap.digits * 100n },
    { ...a, digits: a.digits * BigInt(doseLimits.agreementPercent) },
  )
  const byDivision = aligned(gap, s)
  const differencePercent = ((other.value.value - one.value.value) / one.value.value) * 100
  return ok({ agrees: byShare.a <= byShare.b || byDivision.a <= byDivision.b, differencePercent })
}

/** The digits as they stand where the unit is the same; converted to twelve digits where it is not. */
function inUnitOf(quantity: Quantity, like: Quantity): Decimal | undefined {
  if (quantity.unit === like.unit) return decimalOf(quantity.value)
  const converted = convert(Number(quantity.value), quantity.unit, like.unit)
  return converted.ok ? decimalOf(converted.value) : undefined
}
