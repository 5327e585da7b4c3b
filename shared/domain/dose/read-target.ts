import { ok, refuse, type Result } from '../result.ts'
import { concentrationBases, type ConcentrationBasis } from '../units/basis.ts'
import { findUnit } from '../units/find-unit.ts'
import { parseQuantity, type ParsedQuantity } from '../units/parse-quantity.ts'
import { unitOf } from '../units/unit-of.ts'
import type { BathTarget } from './bath-product.ts'
import { doseLimits } from './dose-limits.ts'
import type { DoseRefusal } from './dose-refusal.ts'

export type ReadTarget =
  | { by: 'mass'; basis: ConcentrationBasis; concentration: ParsedQuantity<'massConcentration'> }
  | { by: 'volume'; basis: 'product'; concentration: ParsedQuantity<'volumeConcentration'> }

/**
 * Reads what is wanted in the water: above zero, at most 100 g/L or 100 mL/L, and of a stated basis.
 *
 * @param most another upper limit, in mg/L or µL/L
 * @refuses as parseQuantity (bare-ppm among them) · basis-missing · basis-not-of-unit when a volume of product per
 *          litre (µL/L) is said to be of anything but the product; field target or basis
 */
export function readTarget(target: BathTarget, most?: number): Result<ReadTarget, DoseRefusal> {
  const unit = findUnit(target.concentration?.unit)
  const byVolume = unit.ok && unitOf(unit.value).dimension === 'volumeConcentration'
  const common = { above: 0, field: 'target' }
  const basis = concentrationBases.find((each) => each === target.basis)
  if (byVolume) {
    const rules = {
      ...common,
      dimension: 'volumeConcentration',
      max: most ?? doseLimits.mostTargetUlPerL,
    } as const
    const concentration = parseQuantity(target.concentration, rules)
    if (!concentration.ok) return concentration
    if (basis === undefined) return refuse('basis-missing', 'basis')
    if (basis !== 'product') return refuse('basis-not-of-unit', 'basis')
    return ok({ by: 'volume', basis, concentration: concentration.value })
  }
  const rules = {
    ...common,
    dimension: 'massConcentration',
    max: most ?? doseLimits.mostTargetMgPerL,
  } as const
  const concentration = parseQuantity(target.concentration, rules)
  if (!concentration.ok) return concentration
  if (basis === undefined) return refuse('basis-missing', 'basis')
  return ok({ by: 'mass', basis, concentration: concentration.value })
}
